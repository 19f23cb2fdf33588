import { ChangeDetectionStrategy, Component, computed, effect, input, linkedSignal, output } from '@angular/core';
import { previewListening, type RunCommand, type Series } from '../../../../procedures/engine';
import type { PlotMark } from '../../shared/ramp-plot-options';
import { BigAction } from '../frame/big-action';
import { JudgedLine } from '../readings/judged-line';
import { ReadingDisplay } from '../readings/reading-display';
import type { RunProblem, RunView } from '../run-view';
import type { StepOf } from '../step-entry';
import type { ListenDone } from './listen-requests';
import { SureButton } from './sure-button';
import { valueAt, withMark } from './live-series';
import { plotMarks } from './plot-marks';

/**
 * Marking a series that came as a file: the calculation offers the moment at which the level falls, a person accepts or
 * moves it. Nothing is recorded while the mark is moved.
 */
@Component({
  selector: 'bay-mark-controls',
  imports: [BigAction, JudgedLine, ReadingDisplay, SureButton],
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

  private readonly recorded = computed(() => this.run().state.series[this.step().name]?.marks['noise-stops']?.timeS);
  protected readonly suggestion = computed(() => {
    const { procedure, state } = this.run();
    return previewListening(procedure, state, this.series())?.suggestion;
  });
  private readonly start = computed(() => {
    const suggestion = this.suggestion();
    return this.recorded() ?? (suggestion?.ok === true ? suggestion.timeS : undefined);
  });
  /** Where the mark stands now; undefined while there is none. */
  protected readonly at = linkedSignal(() => this.start());
  /** Whether the mark stands where the calculation put it. */
  protected readonly isSuggested = computed(() => {
    const suggestion = this.suggestion();
    return suggestion?.ok === true && this.at() === suggestion.timeS;
  });
  protected readonly preview = computed(() => {
    const at = this.at();
    if (at === undefined || this.series().timeS.length < 3) return undefined;
    const { procedure, state } = this.run();
    const marked = withMark(state, this.step().name, 'noise-stops', at, this.isSuggested() ? 'suggested' : 'tap');
    return previewListening(procedure, marked, this.series());
  });
  protected readonly found = computed(() => this.preview()?.values.find(({ judgement }) => judgement !== undefined));
  protected readonly gaugeAt = computed(() => {
    const at = this.at();
    const value = at === undefined ? undefined : valueAt(this.series(), 'gauge', at);
    return value === undefined ? '' : value.toFixed(1);
  });
  protected readonly unit = computed(() => this.series().channels.find(({ name }) => name === 'gauge')?.unit ?? '');
  protected readonly remark = computed(() => {
    const suggestion = this.suggestion();
    if (this.at() === undefined) {
      const why = suggestion !== undefined && !suggestion.ok ? suggestion.reason : '';
      return `${why} Move the mark to where the noise stopped, or say below that there was none.`.trim();
    }
    return this.preview()?.problems[0] ?? (this.isSuggested() ? 'Found where the level falls for good.' : '');
  });
  protected readonly notes = computed(() => {
    const at = this.at();
    return [at === undefined ? 'no mark yet' : `at ${at.toFixed(1)} s`];
  });

  constructor() {
    // Towards the plot on the other side of the step.
    effect(() => {
      const at = this.at();
      const label = this.found()?.text === undefined ? undefined : `noise stops: ${this.found()?.text} ${this.unit()}`;
      this.movedMarks.emit(
        plotMarks(
          this.run().state,
          this.step(),
          at === undefined ? undefined : { mark: 'noise-stops', timeS: at, ...(label === undefined ? {} : { label }) },
        ),
      );
    });
  }

  protected move(byS: number): void {
    const { timeS } = this.series();
    const first = (timeS[0] ?? 0) + 1;
    const last = timeS.at(-1) ?? 0;
    const from = this.at() ?? (first + last) / 2;
    this.at.set(Math.round(Math.min(last, Math.max(first, from + byS)) * 100) / 100);
  }

  protected takeAway(): void {
    if (this.recorded() !== undefined) this.commanded.emit({ do: 'unmark', mark: 'noise-stops' });
    this.at.set(undefined);
  }

  protected keep(): void {
    const timeS = this.at();
    if (timeS === undefined) return;
    const by = this.isSuggested() ? 'suggested' : 'tap';
    this.finished.emit({
      series: this.series(),
      marks: timeS === this.recorded() ? [] : [{ mark: 'noise-stops', timeS, by }],
    });
  }

  /** The step once more, for another log; the one that is left behind stays in the record. */
  protected takeAnotherFile(): void {
    this.commanded.emit({ do: 'redo', step: this.step().id, reason: 'another file is taken' });
  }

  protected finishSilent(): void {
    this.finished.emit({ series: this.series(), marks: [] });
  }

  protected finishNeverStopped(): void {
    const timeS = this.series().timeS[0] ?? 0;
    this.finished.emit({ series: this.series(), marks: [{ mark: 'noise-begins', timeS, by: 'tap' }] });
  }
}
