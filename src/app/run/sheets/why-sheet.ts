import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import {
  exitsOf,
  shownUnit,
  type DecisionInput,
  type NamedExit,
  type RunCommand,
} from '../../../../procedures/engine/showing';
import { entryField } from '../entry-draft';
import { RefusalLine } from '../frame/refusal-line';
import { PrimaryButton } from '../primary-action';
import type { RunProblem, RunView } from '../run-view';
import { lastDecision } from '../walked-steps';
import { ReasonField } from '../../shared/reason-field';
import { SheetBody } from './sheet-body';
import { SheetHand } from './sheet-hand';
import { SheetWide } from './sheet-wide';

/**
 * Why this way: the rule, the numbers that it used and the author's reason for the step that was just left; and, with a
 * reason, another of the ways that the author wrote there.
 */
@Component({
  selector: 'bay-why-sheet',
  imports: [PrimaryButton, ReasonField, RefusalLine, SheetBody, SheetHand, SheetWide],
  templateUrl: './why-sheet.html',
  styleUrl: './why-sheet.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WhySheet {
  readonly run = input.required<RunView>();
  readonly problem = input<RunProblem>();
  readonly isBusy = input(false);
  readonly commanded = output<RunCommand>();
  readonly left = output();

  protected readonly isOverruling = signal(false);
  /** The exit that is taken instead; empty while none is chosen. */
  protected readonly chosen = entryField(this.run, 'overruled-by', '');
  protected readonly reason = entryField(this.run, 'overruled-because', '');

  /** What was missing at the last tap on *Take it*, and is missing still. */
  protected readonly missing = computed(() => {
    if (!this.wasTried()) return undefined;
    if (this.chosen() === '') return 'Choose one of the ways above first.';
    return this.reason().trim() === '' ? 'Say why this is right first.' : undefined;
  });
  protected readonly isComplete = computed(() => this.chosen() !== '' && this.reason().trim() !== '');
  private readonly wasTried = signal(false);

  protected readonly decision = computed(() => lastDecision(this.run()));
  protected readonly way = computed(() => this.decision()?.walked.way);
  /** Why it went this way though no rule of the step decided it. */
  protected readonly without = computed(() => {
    const decision = this.decision();
    const way = decision?.walked.way;
    if (decision === undefined || way === undefined) return undefined;
    const { step, walked } = decision;
    // The claim of a way that was overruled begins with that event.
    const isChosen = this.run().events.some(
      ({ seq, type }) => type === 'branch-overruled' && seq === walked.claimedSeq,
    );
    if (isChosen) return 'A person chose this way instead of the one that the rules led to.';
    if (way.exit === 'stop') return 'The test was stopped there.';
    if (way.exit === 'cannot-measure') return 'Somebody said that it could not be done there.';
    const isOnly = !('next' in step) || step.next === undefined || step.next.length === 0;
    return isOnly ? 'The author gave this step one way only.' : 'No other rule of this step held.';
  });
  protected readonly led = computed(() => {
    const to = this.way()?.to;
    return to === undefined ? undefined : this.run().procedure.step(to);
  });
  protected readonly here = computed(() => {
    const { procedure, state } = this.run();
    return state.current === undefined ? undefined : procedure.step(state.current.id)?.number;
  });
  /** The author's other ways from there. */
  protected readonly others = computed(() => {
    const decision = this.decision();
    if (decision === undefined) return [];
    const { procedure } = this.run();
    return exitsOf(procedure, decision.step)
      .filter(({ exit }) => exit !== 'stop' && exit !== decision.walked.way?.exit)
      .map((exit) => ({ ...exit, title: this.titleOf(exit) }));
  });

  protected readonly figure = ({ text, unit, uncertainty }: DecisionInput): string =>
    [text, uncertainty === undefined || uncertainty === '0' ? '' : `\u00b1 ${uncertainty}`, shownUnit(unit ?? '')]
      .filter((part) => part !== '')
      .join(' ');

  protected overrule(): void {
    const exit = this.chosen();
    this.wasTried.set(true);
    if (this.isComplete()) this.commanded.emit({ do: 'overrule', exit, reason: this.reason() });
  }

  private titleOf({ to, verdict }: NamedExit): string {
    const { procedure, state } = this.run();
    const target = procedure.step(to === 'verdict' ? (verdict ?? state.verdict ?? to) : to);
    if (target === undefined) return to;
    return target.kind === 'finding' ? `Finding: ${target.title}` : `${target.number}, ${target.title}`;
  }
}
