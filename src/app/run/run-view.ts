import type { CompiledProcedure } from '../../../procedures/document';
import type { RunEvent, RunHeader, RunState } from '../../../procedures/engine/showing';

/** A run as its screens see it. */
export interface RunView {
  readonly procedure: CompiledProcedure;
  readonly header: RunHeader;
  readonly events: readonly RunEvent[];
  readonly state: RunState;
}

/** Why the last command was not done, in words that say how to go on. */
export interface RunProblem {
  readonly code: string;
  readonly message: string;
  /** The field that it stands beside. */
  readonly field?: string;
  /** The step whose reading no longer holds and has to be taken again. */
  readonly takeAgain?: string;
}
