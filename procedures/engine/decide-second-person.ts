import type { Step } from '../document';
import { CannotDo, type Drafting } from './drafting';
import type { RunCommand } from './run-command';
import { waitsForSomebody } from './waits-for-somebody';

type Release = Extract<RunCommand, { do: 'release' }>;
type Verify = Extract<RunCommand, { do: 'verify' }>;

/** Throws `CannotDo` while somebody else has to look or to let the run go on. */
export function requireSomebody(drafting: Drafting, step: Step): void {
  const waits = waitsForSomebody(step, drafting.state.current);
  if (waits === 'release') {
    const who = step.release?.by === 'manager' ? 'The manager' : 'The lead';
    throw new CannotDo(
      'release-first',
      `${who} lets the run go on from here, on this: ${step.release?.evidence ?? ''}`,
    );
  }
  if (waits === 'verification') {
    throw new CannotDo('verify-first', `A second person looks first: ${step.verify?.what ?? ''}`);
  }
}

/** Lets the run go on: only the role that the author named, with what it rests on. */
export function release(drafting: Drafting, step: Step, { role, evidence }: Release): void {
  const point = step.release;
  if (point === undefined) throw new CannotDo('no-release', 'This step waits for nobody.');
  const mayRelease = role === point.by || (point.by === 'lead' && role === 'manager');
  if (!mayRelease) {
    throw new CannotDo(
      'other-role',
      `Only ${point.by === 'lead' ? 'a lead or a manager' : 'a manager'} can release this step.`,
    );
  }
  const words = evidence.trim();
  if (words === '') throw new CannotDo('say-what', `Say what it rests on: ${point.evidence}`, 'evidence');
  drafting.add({
    type: 'released',
    data: { step: step.id, evidence: words, by: role },
  });
}

/** A second person looked; not the one who does the step. */
export function verify(drafting: Drafting, step: Step, { by }: Verify): void {
  if (step.verify === undefined) throw new CannotDo('no-verification', 'This step asks for no second person.');
  if (by === drafting.state.current?.claimedBy) {
    throw new CannotDo('same-person', 'Whoever does the step cannot be the second person. Ask somebody else.', 'by');
  }
  drafting.add({ type: 'verified', data: { step: step.id, by } });
}
