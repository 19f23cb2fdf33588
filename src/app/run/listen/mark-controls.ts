import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  input,
  linkedSignal,
  output,
  signal,
} from '@angular/core';
import { previewListening } from '../../../../procedures/engine';
import type { RunCommand, Series } from '../../../../procedures/engine/showing';
import type { PlotMark } from '../../shared/ramp-plot-options';
import { BigAction } from '../frame/big-action';
import { ReadingDisplay } from '../readings/reading-display';
import type { RunProblem, RunView } from '../run-view';
import type { StepOf } from '../step-entry';
import { FoundDisplay } from './found-display';
import { anotherFile, type ListenDone } from './listen-requests';
import { SureButton } from './sure-button';
import { valueAt, withMark, type MarkName } from './live-series';
import { plotMarks } from './plot-marks';

type Places = Readonly<Record<MarkName, number | undefined>>;

const names: readonly MarkName[] = ['noise-begins', 'noise-stops'];
/** Noise stops lies after noise begins, by a sample of a quick log at least. */
const apartS = 0.05;

/**
 * Marking a series that came as a file: the calculation offers the moments at which the level rises and falls, a person
 * accepts or moves them. Nothing is recorded while a mark is moved.
 */
@Component({
  selector: 'bay-mark-controls',
  imports: [BigAction, FoundDisplay, ReadingDisplay, SureButton],
  templateUrl: './mark-controls.html',
  styleUrl: './listen-controls.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MarkControls {
  readonly run = input.required<RunView>();
  readonly step = input.required<StepOf<'listen'>>();
  readonly series = input.required<Series>();
  readonly problem = input<RunProblem>();
  readonly isBusy = input(false);
  readonly commanded = output<RunCommand>();
  readonly finished = output<ListenDone>();
  /** The marks as they are being moved, for the plot. */
  readonly movedMarks = output<readonly PlotMark[] | undefined>();

  protected readonly choices = [
    { mark: 'noise-begins', label: 'Noise begins' },
    { mark: 'noise-stops', label: 'Noise stops' },
  ] as const;
  /** The mark that is moved. */
  protected readonly chosen = signal<MarkName>('noise-stops');

  private readonly recorded = computed<Places>(() => {
    const marks = this.run().state.series[this.step().name]?.marks;
    return { 'noise-begins': marks?.['noise-begins']?.timeS, 'noise-stops': marks?.['noise-stops']?.timeS };
  });
  private readonly offered = computed(() => {
    const { procedure, state } = this.run();
    return previewListening(procedure, state, this.series());
  });
  private readonly suggested = computed<Places>(() => {
    const suggestion = this.offered()?.suggestion;
    const stops = suggestion?.ok === true ? suggestion.timeS : undefined;
    const begins = this.offered()?.suggestedBeginS;
    const isBefore = begins !== undefined && (stops === undefined || begins < stops);
    return { 'noise-begins': isBefore ? begins : undefined, 'noise-stops': stops };
  });
  /** Where the marks stand now; undefined while there is none. */
  protected readonly places = linkedSignal<Places>(() => {
    const [recorded, suggested] = [this.recorded(), this.suggested()];
    const begins = recorded['noise-begins'] ?? suggested['noise-begins'];
    const stops = recorded['noise-stops'] ?? suggested['noise-stops'];
    return { 'noise-begins': begins, 'noise-stops': stops };
  });
  protected readonly at = computed(() => this.places()[this.chosen()]);
  protected readonly stopsAt = computed(() => this.places()['noise-stops']);
  protected readonly hasAny = computed(() => names.some((name) => this.places()[name] !== undefined));
  protected readonly preview = computed(() => {
    if (this.stopsAt() === undefined || this.series().timeS.length < 3) return undefined;
    const { procedure, state } = this.run();
    const marked = this.standing().reduce(
      (marks, { mark, timeS, by }) => withMark(marks, this.step().name, mark, timeS, by),
      state,
    );
    return previewListening(procedure, marked, this.series());
  });
  protected readonly found = computed(() => this.preview()?.values.find(({ judgement }) => judgement !== undefined));
  protected readonly gaugeAt = computed(() => {
    const at = this.at();
    const value = at === undefined ? undefined : valueAt(this.series(), 'gauge', at);
    return value === undefined ? '' : value.toFixed(1);
  });
  protected readonly unit = computed(() => this.series().channels.find(({ name }) => name === 'gauge')?.unit ?? '');
  protected readonly time = computed(() => {
    const at = this.at();
    return at === undefined ? 'no mark yet' : `at ${at.toFixed(1)} s`;
  });
  protected readonly remark = computed(() => {
    const suggestion = this.offered()?.suggestion;
    if (this.stopsAt() === undefined) {
      const why = suggestion !== undefined && !suggestion.ok ? suggestion.reason : '';
      return `${why} Move the mark to where the noise stopped, or say below that there was none.`.trim();
    }
    return this.preview()?.problems[0] ?? '';
  });
  protected readonly atMark = computed(() => {
    const gauge = this.gaugeAt() === '' ? this.time() : `${this.gaugeAt()} ${this.unit()} ${this.time()}`;
    const isOffered = this.at() !== undefined && this.at() === this.suggested()[this.chosen()];
    return `Gauge at the mark ${gauge}${isOffered ? ', offered' : ''}`;
  });

  /** The marks that stand, and whether each is where the calculation put it. */
  private readonly standing = computed(() =>
    names.flatMap((mark) => {
      const timeS = this.places()[mark];
      if (timeS === undefined) return [];
      return [{ mark, timeS, by: timeS === this.suggested()[mark] ? ('suggested' as const) : ('tap' as const) }];
    }),
  );

  constructor() {
    // Towards the plot on the other side of the step.
    effect(() => {
      const found = this.found()?.text;
      this.movedMarks.emit(
        plotMarks(this.run().state, this.step(), {
          'noise-begins': { timeS: this.places()['noise-begins'] },
          'noise-stops': {
            timeS: this.stopsAt(),
            label: found === undefined ? undefined : `noise stops: ${found} ${this.unit()}`,
          },
        }),
      );
    });
  }

  protected move(byS: number): void {
    const { timeS } = this.series();
    const [first, last] = [timeS[0] ?? 0, timeS.at(-1) ?? 0];
    const [begins, stops] = [this.places()['noise-begins'], this.stopsAt()];
    const isBegin = this.chosen() === 'noise-begins';
    const least = isBegin ? first : Math.max(first + 1, (begins ?? first) + apartS);
    const most = isBegin ? Math.min(last, (stops ?? last) - apartS) : last;
    const from = this.at() ?? (first + 1 + last) / 2;
    this.place(Math.round(Math.min(most, Math.max(least, from + byS)) * 100) / 100);
  }

  protected takeAway(): void {
    const mark = this.chosen();
    if (this.recorded()[mark] !== undefined) this.commanded.emit({ do: 'unmark', mark });
    this.place(undefined);
  }

  protected keep(): void {
    if (this.stopsAt() !== undefined) this.finish(this.standing());
  }

  protected takeAnotherFile(): void {
    this.commanded.emit(anotherFile(this.step().id));
  }

  protected finishSilent(): void {
    this.finish([]);
  }

  protected finishNeverStopped(): void {
    const begins = this.standing().filter(({ mark }) => mark === 'noise-begins');
    const fromStart = { mark: 'noise-begins', timeS: this.series().timeS[0] ?? 0, by: 'tap' } as const;
    this.finish(begins.length > 0 ? begins : [fromStart]);
  }

  private finish(marks: ListenDone['marks']): void {
    const isNew = marks.filter(({ mark, timeS }) => timeS !== this.recorded()[mark]);
    this.finished.emit({ series: this.series(), marks: isNew });
  }

  private place(timeS: number | undefined): void {
    this.places.update((places) => ({ ...places, [this.chosen()]: timeS }));
  }
}
