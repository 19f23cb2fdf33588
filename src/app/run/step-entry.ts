import { Directive, input, output } from '@angular/core';
import type { Step, StepKind } from '../../../procedures/document';
import type { RunCommand } from '../../../procedures/engine/showing';
import type { RunProblem, RunView } from './run-view';

/** A step as its kind's views see it. */
export type StepOf<K extends StepKind> = Extract<Step, { readonly kind: K }>;

/** What the entry of every step kind takes and gives. */
@Directive()
export abstract class StepEntry<K extends StepKind> {
  readonly run = input.required<RunView>();
  readonly step = input.required<StepOf<K>>();
  /** Why the last command was refused; shown beside what it is about. */
  readonly problem = input<RunProblem>();
  /** Whether a command is being written: the primary action shows it, and nothing else is taken. */
  readonly isBusy = input(false);
  readonly commanded = output<RunCommand>();
}
