import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { shownUnit, type NamedValue, type RunState, type WalkedStep } from '../../../../procedures/engine/showing';
import { howLong } from '../../core/time-words';
import { ResultMark } from '../../shared/result-mark';
import { clockText, readHold, type ClocksNow } from '../hold-clock';
import { PrimaryButton } from '../primary-action';
import type { RunProblem, RunView } from '../run-view';
import { latestValue, valuesOf } from '../walked-steps';
import { SheetHand } from './sheet-hand';
import { SheetWide } from './sheet-wide';

/**
 * Where the run stands, after anything that may have cost the place: what was done last with its value, the current
 * step, clocks, and what is disturbed. It offers to repeat the last step first, and nothing else is taken before it is
 * answered.
 */
@Component({
  selector: 'bay-resume-card',
  imports: [PrimaryButton, ResultMark, SheetHand, SheetWide],
  templateUrl: './resume-card.html',
  styleUrl: './resume-card.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ResumeCard {
  readonly run = input.required<RunView>();
  /** The device's clock. */
  readonly now = input.required<number>();
  readonly clocks = input.required<ClocksNow>();
  readonly problem = input<RunProblem>();
  readonly isBusy = input(false);
  readonly resumed = output();
  readonly repeated = output<string>();
  readonly leftForBench = output();

  protected readonly state = computed(() => this.run().state);
  protected readonly title = computed(() => titles[this.state().status] ?? 'Go on here?');
  protected readonly pause = computed(() => this.state().pause);
  protected readonly since = computed(() => {
    const at = this.pause()?.at ?? this.state().lastAt;
    return this.now() - at < 60_000 ? 'just now' : `${howLong(this.now() - at)} ago`;
  });
  protected readonly makeSafe = computed(() =>
    this.state().status === 'lead-called' ? this.run().procedure.document.stop.makeSafe : [],
  );
  protected readonly current = computed(() => {
    const { current, finding } = this.state();
    const id = current?.id ?? finding;
    return id === undefined ? undefined : this.run().procedure.step(id);
  });
  protected readonly last = computed(() => {
    const walked = lastDone(this.state());
    const step = walked === undefined ? undefined : this.run().procedure.step(walked.step);
    if (walked === undefined || step === undefined) return undefined;
    return { step, walked, said: saidBy(this.state(), walked) };
  });
  /** The value that was recorded last, where the step done last gave none. */
  protected readonly lastValue = computed(() => {
    const value = (this.last()?.said.values.length ?? 0) > 0 ? undefined : latestValue(this.run());
    return value === undefined
      ? undefined
      : { value, number: this.run().procedure.step(value.step)?.number ?? value.step };
  });
  protected readonly timer = computed(() => {
    const timer = this.state().current?.timer;
    if (timer === undefined || timer.ended) return undefined;
    const { leftS, isCertain } = readHold(timer, this.clocks());
    if (!isCertain) return 'The clock of the hold: time not certain, hold again';
    return leftS > 0 ? `The clock of the hold: ${clockText(leftS)} left` : 'The clock of the hold is over';
  });

  protected readonly figure = (value: NamedValue): string => `${value.text} ${shownUnit(value.unit)}`;
}

const titles: Partial<Record<RunState['status'], string>> = {
  'set-aside': 'Set aside',
  'lead-called': 'The lead is asked',
};

function lastDone(state: RunState): WalkedStep | undefined {
  return [...state.walked]
    .reverse()
    .find(({ doneSeq, isLeft, step }) => doneSeq !== undefined && isLeft !== true && step !== state.finding);
}

/** What a walked step left behind: its values, or what was chosen in it. */
function saidBy(state: RunState, { step }: WalkedStep): { values: readonly NamedValue[]; words: readonly string[] } {
  return {
    values: valuesOf(state, step),
    words: [
      ...Object.values(state.choices).flatMap((choice) => (choice.step === step ? choice.labels : [])),
      ...Object.values(state.codes).flatMap((entry) =>
        entry.step === step ? [entry.codes.map(({ code }) => code).join(', ') || 'no code'] : [],
      ),
    ],
  };
}
