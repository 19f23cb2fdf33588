import type { Exit, ProcedureDocument, Step } from '../../../procedures/document';
import { conditionWords, type NameBook } from './condition-words';

/** One way on from a step, for reading. */
export interface StepWay {
  /** `if`, `else`, `if it cannot be measured`, `if the test is stopped`. */
  readonly lead: string;
  /** The condition in words; empty where the lead says it all. */
  readonly condition: string;
  /** The condition as it is written. */
  readonly source: string | undefined;
  readonly to: WayTarget;
  readonly because: string;
  /** The finding that the run heads for from here on. */
  readonly verdict: string | undefined;
  /** How often it may be taken, and what then. */
  readonly bound: string | undefined;
}

export interface WayTarget {
  /** The step's id; undefined where the way ends at whichever finding the run heads for, or leads nowhere. */
  readonly id: string | undefined;
  readonly label: string;
  /** Whether the document has no such step. */
  readonly isMissing: boolean;
}

/** Every way on of a step, in the order in which they are tried; a finding has none. */
export function waysOf(document: ProcedureDocument, names: NameBook, step: Step): readonly StepWay[] {
  if (step.kind === 'finding') return [];
  const way = (lead: string, exit: Exit, when?: string, bound?: string): StepWay => ({
    lead,
    condition: when === undefined ? '' : conditionWords(when, names),
    source: when,
    to: targetOf(document, step, exit.to),
    because: exit.because,
    verdict: exit.verdict === undefined ? undefined : titleOf(document, exit.verdict),
    bound,
  });
  const branches = (step.next ?? []).map((branch) => way('if', branch, branch.when, boundOf(document, step, branch)));
  const honest = 'cannotMeasure' in step ? [way('if it cannot be measured', step.cannotMeasure)] : [];
  return [...branches, way(branches.length > 0 ? 'else' : 'then', step.otherwise), ...honest];
}

function boundOf(
  document: ProcedureDocument,
  step: Step,
  { atMost, thenceforth }: { readonly atMost?: number; readonly thenceforth?: Exit },
): string | undefined {
  if (atMost === undefined) return undefined;
  const times = `At most ${atMost === 1 ? 'once' : `${atMost} times`}`;
  if (thenceforth === undefined) return times;
  const verdict = thenceforth.verdict === undefined ? '' : `, as ${titleOf(document, thenceforth.verdict)}`;
  return `${times}, then ${targetOf(document, step, thenceforth.to).label}${verdict}`;
}

function targetOf(document: ProcedureDocument, from: Step, to: string): WayTarget {
  if (to === 'verdict') return { id: undefined, label: 'the finding it heads for', isMissing: false };
  const target = document.steps.find(({ id }) => id === to);
  if (target === undefined) return { id: undefined, label: to, isMissing: true };
  if (target === from) return { id: target.id, label: `${target.number} again`, isMissing: false };
  return { id: target.id, label: target.kind === 'finding' ? target.title : target.number, isMissing: false };
}

function titleOf(document: ProcedureDocument, id: string): string {
  return document.steps.find((step) => step.id === id)?.title ?? id;
}
