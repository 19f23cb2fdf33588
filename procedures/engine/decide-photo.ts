import type { Step } from '../document';
import type { Drafting } from './drafting';
import type { RunCommand } from './run-command';
import { wrongKind } from './wrong-kind';

/** Keeps a photo with its step; `confirm` goes on. */
export function attachPhoto(
  drafting: Drafting,
  step: Step,
  { sha256, bytes, mediaType }: Extract<RunCommand, { do: 'attach-photo' }>,
): void {
  if (step.kind !== 'photo') throw wrongKind(step);
  drafting.add({
    type: 'photo-attached',
    data: { step: step.id, sha256, bytes, mediaType },
  });
}
