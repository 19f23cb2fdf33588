import type { Caution, Step } from '../../../procedures/document';
import type { RunView } from './run-view';

/** A step's cautions in the order in which they are numbered: on the start card those that hold throughout come first. */
export function cautionsOf({ procedure }: Pick<RunView, 'procedure'>, step: Step): readonly Caution[] {
  const own = step.cautions ?? [];
  return step.kind === 'start' ? [...procedure.document.start.throughout, ...own] : own;
}

/** The place of the first caution that was not acknowledged in this claim; undefined when none is left. */
export function cautionToRead(run: RunView, step: Step): number | undefined {
  const acknowledged = run.state.current?.id === step.id ? run.state.current.acknowledged : [];
  const place = cautionsOf(run, step).findIndex((_, index) => !acknowledged.includes(index));
  return place < 0 ? undefined : place;
}
