import type { Step } from '../document';
import type { CurrentStep } from './run-state';

/** What a step still waits for from somebody else; undefined when nothing. */
export function waitsForSomebody(step: Step, current: CurrentStep | undefined): 'release' | 'verification' | undefined {
  if (step.verify !== undefined && current?.verifiedBy === undefined) return 'verification';
  return step.release !== undefined && current?.releasedBy === undefined ? 'release' : undefined;
}
