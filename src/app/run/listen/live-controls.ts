import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  output,
  signal,
} from '@angular/core';
import { isUnit } from '../../../../procedures/calculations/for-a-run';
import { previewListening } from '../../../../procedures/engine';
import { shownUnit, type RunCommand, type Series } from '../../../../procedures/engine/showing';
import { BigAction } from '../frame/big-action';
import { JudgedLine } from '../readings/judged-line';
import { NumberPad } from '../readings/number-pad';
import { pressKey, type PadKey } from '../readings/number-text';
import { RampQueue } from '../ramp-queue';
import { ReadingDisplay } from '../readings/reading-display';
import type { RunProblem, RunView } from '../run-view';
import type { StepOf } from '../step-entry';
import { BounceGuard, bounceMs } from '../tap-guard';
import { FoundDisplay } from './found-display';
import type { ListenDone } from './listen-requests';
import { SureButton } from './sure-button';
import { tappedRamp } from './tapped-ramp';
import { raised, rampSince, riseRate, stepsFor, timeBase, type MarkName } from './live-series';

/** What the gauge is raised to, and what it must never go over. */
export interface Aim {
  readonly label: string;
  readonly unit: string;
  readonly target: number;
  readonly ceiling: string | undefined;
}

/**
 * Typing a ramp while it happens: each tap on a step says what the gauge shows at that moment, or its exact figure is
 * entered on the pad. The one large button marks where the noise begins and where it stops. Every tap belongs to its own
 * moment: none waits for the one before to be written, and only a bounce on the same control is left out.
 */
@Component({
  selector: 'bay-live-controls',
  imports: [BigAction, FoundDisplay, JudgedLine, NumberPad, ReadingDisplay, SureButton],
  templateUrl: './live-controls.html',
  styleUrl: './listen-controls.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LiveControls {
  readonly run = input.required<RunView>();
  readonly step = input.required<StepOf<'listen' | 'ramp'>>();
  readonly series = input.required<Series>();
  readonly aim = input.required<Aim>();
  readonly elapsed = input.required<() => number>();
  readonly problem = input<RunProblem>();
  readonly isBusy = input(false);
  readonly commanded = output<RunCommand>();
  readonly finished = output<ListenDone>();
  readonly fileAsked = output();

  private readonly queue = inject(RampQueue);
  private readonly bounce = new BounceGuard(() => this.elapsed()());
  /** When the ramp was begun here, until that is written; the run's monotonic time, milliseconds. */
  private begunAt: number | undefined;

  private readonly gauge = computed(() => this.step().channels.find(({ name }) => name === 'gauge'));
  private readonly unit = computed(() => {
    const unit = this.gauge()?.unit ?? 'kPa';
    return isUnit(unit) ? unit : 'kPa';
  });
  private readonly resolution = computed(() => {
    const gear = this.gauge()?.gear;
    const range =
      gear === undefined ? undefined : this.run().state.gear[gear]?.shows.find(({ unit }) => unit === this.unit());
    return range?.resolution ?? 0.1;
  });
  protected readonly steps = computed(() => stepsFor(this.resolution()));
  private readonly written = computed(() => {
    const { current, series } = this.run().state;
    return { points: current?.takes['gauge'] ?? [], marks: series[this.step().name]?.marks ?? {} };
  });
  private readonly tapped = computed(() => tappedRamp(this.written(), this.queue.commands()));
  protected readonly hasBegun = computed(() => this.tapped().points.length > 0);
  protected readonly now = computed(() => this.tapped().points.at(-1)?.text);
  protected readonly stopsAt = computed(() => this.tapped().marks['noise-stops']?.timeS);
  protected readonly beginsAt = computed(() => this.tapped().marks['noise-begins']?.timeS);
  /** When the figure on the pad was entered as a point, seconds in the ramp. */
  private readonly entered = signal<number | undefined>(undefined);
  /** Whether the gauge's exact figure is being entered; done once its point counts. */
  protected readonly isTyping = linkedSignal<boolean, boolean>({
    source: () => {
      const { points } = this.written();
      return points.length === 0 || points.some(({ timeS }) => timeS === this.entered());
    },
    computation: (isDone, before) => !isDone && before?.value === true,
  });
  protected readonly typed = linkedSignal({ source: this.isTyping, computation: () => '' });
  /** The noise has stopped, and no point was typed since: without one nobody knows the pressure at that moment. */
  protected readonly lacksPointAfter = computed(() => {
    const stops = this.stopsAt();
    return stops !== undefined && (this.series().timeS.at(-1) ?? 0) <= stops;
  });
  /** Whether the noise is listened to; what is found in a ramp without marks needs its points alone. */
  protected readonly hasMarks = computed(() => this.step().kind === 'listen');
  protected readonly preview = computed(() => {
    if ((this.hasMarks() && this.stopsAt() === undefined) || this.lacksPointAfter() || this.series().timeS.length < 3)
      return undefined;
    const { procedure, state } = this.run();
    return previewListening(procedure, state, this.series());
  });
  /** Whether it was raised too fast so far, by the step's own band. */
  protected readonly isTooFast = computed(() => {
    const name = this.step().finds.find(({ what }) => what === 'rise-rate')?.name;
    if (name === undefined || this.lacksPointAfter() || this.series().timeS.length < 3) return false;
    const { procedure, state } = this.run();
    const rise = previewListening(procedure, state, this.series())?.values.find((value) => value.name === name);
    return rise?.judgement?.result === 'out' && rise.value > (rise.judgement.high ?? Infinity);
  });
  /** The quantity that is found, judged. */
  protected readonly found = computed(() => {
    const values = this.preview()?.values ?? [];
    const judged = values.find(({ judgement }) => judgement !== undefined);
    return judged ?? (this.hasMarks() ? undefined : values[0]);
  });
  protected readonly remark = computed(() => {
    if (!this.hasBegun()) return 'One tap a point: raise slowly, and tap what the gauge has risen by.';
    if (this.lacksPointAfter()) return 'Raise on, and tap one more point: it tells where the noise stopped.';
    const problem = this.preview()?.problems[0];
    if (problem !== undefined && this.found() === undefined) return problem;
    const rate = riseRate(this.series());
    const beginsAt = this.beginsAt();
    return [
      this.isTooFast() ? 'raised too fast' : undefined,
      rate === undefined ? undefined : `rising ${rate.toFixed(2)} ${shownUnit(this.unit())} a second`,
      beginsAt === undefined ? undefined : `noise since ${beginsAt.toFixed(0)} s`,
    ]
      .filter((words) => words !== undefined)
      .join(', ');
  });
  protected readonly notes = computed(() => {
    const { target, ceiling } = this.aim();
    return [`towards ${target},${ceiling === undefined ? '' : ` never over ${ceiling}`}`];
  });
  protected readonly canFinish = computed(() => this.series().timeS.length >= 3);

  protected begin(): void {
    if (!this.bounce.admit('mark', bounceMs.mark)) return;
    this.begunAt = this.elapsed()();
    this.record(raised('0', 0, this.resolution()), 0);
  }

  protected raise(step: number): void {
    if (!this.bounce.admit(`raise ${step}`)) return;
    this.record(raised(this.now() ?? '0', step, this.resolution()), this.seconds());
  }

  protected press(key: PadKey): void {
    this.typed.update((text) => pressKey(text, key));
  }

  protected erase(): void {
    if (this.typed() === '') this.isTyping.set(false);
    else this.press('erase');
  }

  /** The point is timed at this tap: when the figure was read, not when its first digit was entered. */
  protected recordTyped(): void {
    if (this.typed() === '' || !this.bounce.admit('record', bounceMs.mark)) return;
    const timeS = this.seconds();
    this.entered.set(timeS);
    this.record(this.typed(), timeS);
  }

  protected takeBack(): void {
    if (!this.bounce.admit('undo', bounceMs.mark)) return;
    this.commanded.emit({ do: 'take-back', name: 'gauge', reason: 'taken back' });
  }

  protected mark(mark: MarkName): void {
    if (!this.bounce.admit('mark', bounceMs.mark)) return;
    this.commanded.emit({ do: 'mark', mark, timeS: this.seconds(), by: 'tap' });
  }

  protected unmark(mark: MarkName): void {
    if (!this.bounce.admit('unmark', bounceMs.mark)) return;
    this.commanded.emit({ do: 'unmark', mark });
  }

  /** The whole ramp once more; what was typed stays in the record as left behind. */
  protected beginAnew(): void {
    this.commanded.emit({ do: 'redo', step: this.step().id, reason: 'the ramp is begun anew' });
  }

  /** Nothing was heard, or it never stopped: the marks as they are say so. */
  protected finish(): void {
    this.finished.emit({ series: this.series(), marks: [] });
  }

  protected finishNeverStopped(): void {
    const timeS = this.series().timeS[0] ?? 0;
    const marks = this.beginsAt() === undefined ? [{ mark: 'noise-begins' as const, timeS, by: 'tap' as const }] : [];
    this.finished.emit({ series: this.series(), marks });
  }

  /** Moves the mark by half a second. */
  protected move(byS: number): void {
    const stops = this.stopsAt();
    if (stops === undefined || !this.bounce.admit(`move ${byS}`)) return;
    this.commanded.emit({ do: 'mark', mark: 'noise-stops', timeS: tenth(Math.max(0, stops + byS)), by: 'tap' });
  }

  private seconds(): number {
    const { events, state } = this.run();
    const base = timeBase(events, rampSince(state)) ?? this.begunAt;
    const last = this.tapped().points.at(-1)?.timeS;
    const now = base === undefined ? 0 : (this.elapsed()() - base) / 1000;
    return tenth(last === undefined ? Math.max(0, now) : Math.max(now, last + 0.1));
  }

  private record(text: string, timeS: number): void {
    this.commanded.emit({ do: 'record', name: 'gauge', text, unit: this.unit(), timeS });
  }
}

const tenth = (seconds: number): number => Math.round(seconds * 10) / 10;
