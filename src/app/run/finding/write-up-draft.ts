import { composeWriteUp, writeUpParts } from '../../../../procedures/engine';
import type { RunView } from '../run-view';

/** A part of the write-up: what was complained of, why, what to do, and the one sentence for the customer. */
export type WriteUpPartName = (typeof writeUpParts)[number];

export const partWords: Readonly<Record<WriteUpPartName, string>> = {
  concern: 'Concern',
  cause: 'Cause',
  correction: 'Correction',
  customer: 'For the customer',
};

/** What a person wrote instead of what the record composes. */
export type WriteUpEdits = Readonly<Partial<Record<WriteUpPartName, string>>>;

/** The edits of a kept draft, or none. */
export function editsIn(draft: unknown): WriteUpEdits {
  return typeof draft === 'object' && draft !== null && !Array.isArray(draft) ? (draft as WriteUpEdits) : {};
}

/** One part as it stands: the text, what the record itself gives, and whether the two differ. */
export interface DraftPart {
  readonly name: WriteUpPartName;
  readonly text: string;
  readonly composed: string;
  readonly isEdited: boolean;
}

/** The write-up: what was edited here over what was kept over what the record composes. */
export function draftOf(
  { procedure, state }: Pick<RunView, 'procedure' | 'state'>,
  edits: WriteUpEdits,
): readonly DraftPart[] {
  const composed = composeWriteUp(procedure, state);
  return writeUpParts.map((name) => {
    const text = edits[name] ?? state.writeUp?.[name] ?? composed[name].text;
    return { name, text, composed: composed[name].text, isEdited: text.trim() !== composed[name].text.trim() };
  });
}

/** Whether the text that stands here was kept already. */
export function isKept({ state }: Pick<RunView, 'state'>, draft: readonly DraftPart[]): boolean {
  const { writeUp } = state;
  return writeUp !== undefined && draft.every(({ name, text }) => writeUp[name] === text.trim());
}
