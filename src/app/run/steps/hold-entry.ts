import { ChangeDetectionStrategy, Component, computed, DestroyRef, inject, input, output, signal } from '@angular/core';
import { BigAction } from '../frame/big-action';
import { HandSide } from '../frame/hand-side';
import { WideSide } from '../frame/wide-side';
import { clockText, readHold, type ClocksNow } from '../hold-clock';
import { secondsOf } from '../../../../procedures/engine';
import { StepEntry } from '../step-entry';

const tickMs = 100;

const clockWords = {
  hold: {
    over: 'Held to the end',
    running: 'Left to hold',
    before: 'To be held',
    on: 'Hold on',
    done: 'Held,\ngo on',
    again: 'Hold again',
  },
  wait: {
    over: 'The time is over',
    running: 'Left to wait',
    before: 'At least to wait',
    on: 'Wait',
    done: 'Waited,\ngo on',
    again: 'Wait again',
  },
} as const;

/**
 * The clock of a hold, or of a wait that has a least time: what is left in large figures, a tone at the end, the same
 * time after a reload.
 */
@Component({
  selector: 'bay-hold-entry',
  imports: [BigAction, HandSide, WideSide],
  templateUrl: './hold-entry.html',
  styleUrl: './hold-entry.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HoldEntry extends StepEntry<'hold' | 'wait'> {
  /** Reads the run's clocks. */
  readonly clocks = input.required<() => ClocksNow>();
  /** The time is over: a tone sounds. */
  readonly over = output();

  protected readonly words = computed(() => clockWords[this.step().kind]);
  /** What there is to do while a wait goes on. */
  protected readonly meanwhile = computed(() => {
    const step = this.step();
    return step.kind === 'wait' ? step.meanwhile : undefined;
  });
  private readonly seconds = computed(() => secondsOf(this.step()) ?? 0);
  private readonly now = signal<ClocksNow | undefined>(undefined);
  private wasOver = false;

  protected readonly timer = computed(() => this.run().state.current?.timer);
  protected readonly reading = computed(() => {
    const timer = this.timer();
    if (timer === undefined || (timer.ended && timer.certain)) return undefined;
    return readHold(timer, this.now() ?? this.clocks()());
  });
  protected readonly isUncertain = computed(() => {
    const timer = this.timer();
    return timer !== undefined && ((timer.ended && !timer.certain) || this.reading()?.isCertain === false);
  });
  protected readonly isRunning = computed(
    () => this.timer() !== undefined && !this.isUncertain() && this.reading()?.isOver === false,
  );
  protected readonly isOver = computed(() => !this.isUncertain() && this.reading()?.isOver === true);
  protected readonly left = computed(() => {
    const reading = this.isUncertain() ? undefined : this.reading();
    return clockText(reading?.leftS ?? this.seconds());
  });
  /** The share of the time that is over, 0 to 1. */
  protected readonly share = computed(() => {
    const reading = this.isUncertain() ? undefined : this.reading();
    return reading === undefined ? 0 : 1 - reading.leftS / this.seconds();
  });

  constructor() {
    super();
    const timer = setInterval(() => this.tick(), tickMs);
    inject(DestroyRef).onDestroy(() => clearInterval(timer));
  }

  protected start(): void {
    this.wasOver = false;
    this.commanded.emit({ do: 'start-timer' });
  }

  protected end(): void {
    this.commanded.emit({ do: 'end-timer', certain: true });
  }

  private tick(): void {
    if (this.timer() === undefined) return;
    this.now.set(this.clocks()());
    if (this.isOver() && !this.wasOver) this.over.emit();
    this.wasOver = this.isOver();
  }
}
