import type { PublishedProcedure, Visit } from './wire';

/** A procedure that may be run, and why it fits a visit; nothing when it does not. */
export interface ProcedureFit {
  readonly procedure: PublishedProcedure;
  readonly codes: readonly string[];
  readonly symptoms: readonly string[];
}

/**
 * The newest version of each procedure that may start a run: withdrawn ones may not. Sorted by title.
 */
export function startable(procedures: readonly PublishedProcedure[]): readonly PublishedProcedure[] {
  const newest = new Map<string, PublishedProcedure>();
  for (const procedure of procedures) {
    if (procedure.status !== 'published') continue;
    const known = newest.get(procedure.id);
    if (!known || known.version < procedure.version) newest.set(procedure.id, procedure);
  }
  return [...newest.values()].sort((a, b) => (a.document.title < b.document.title ? -1 : 1));
}

/** Those of the startable that can be run without a network: every version that they call is here too, at any depth. */
export function readyOffline(procedures: readonly PublishedProcedure[]): readonly PublishedProcedure[] {
  const here = new Map(procedures.map((procedure) => [`${procedure.id}@${procedure.version}`, procedure]));
  const isWhole = ({ document }: PublishedProcedure, seen: ReadonlySet<string>): boolean =>
    document.steps.every((step) => {
      if (step.kind !== 'call') return true;
      const key = `${step.procedure}@${step.version}`;
      const called = here.get(key);
      // Calls that come back to one another are for publishing to refuse.
      return called !== undefined && (seen.has(key) || isWhole(called, new Set([...seen, key])));
    });
  return startable(procedures).filter((procedure) => isWhole(procedure, new Set()));
}

/** Each startable procedure with what of the visit it fits, the best first. */
export function fitsOf(
  procedures: readonly PublishedProcedure[],
  visit: Pick<Visit, 'codes' | 'concern'>,
): readonly ProcedureFit[] {
  return startable(procedures)
    .map((procedure) => fitOf(procedure, visit))
    .sort((a, b) => strength(b) - strength(a));
}

/** Whether a code or a symptom of the visit points to the procedure. */
export const isFit = (fit: ProcedureFit): boolean => strength(fit) > 0;

function fitOf(procedure: PublishedProcedure, { codes, concern }: Pick<Visit, 'codes' | 'concern'>): ProcedureFit {
  const { appliesTo } = procedure.document;
  const said = wordsOf(concern);
  return {
    procedure,
    codes: appliesTo.codes.filter((code) => codes.includes(code)),
    symptoms: appliesTo.symptoms.filter((symptom) => isSaid(wordsOf(symptom), said)),
  };
}

const strength = ({ codes, symptoms }: ProcedureFit): number => codes.length * 2 + symptoms.length;

/** A symptom is said when all its telling words begin words of the concern, or the other way round. */
function isSaid(symptom: readonly string[], said: readonly string[]): boolean {
  return symptom.length > 0 && symptom.every((word) => said.some((other) => isSameStem(word, other)));
}

/** `hesitates` and `hesitation` share their first five letters. */
const isSameStem = (a: string, b: string): boolean => a.slice(0, 5) === b.slice(0, 5);

const smallWords = new Set(['with', 'when', 'under', 'from', 'that', 'the', 'and', 'does', 'not', 'its', 'has']);

const wordsOf = (text: string): readonly string[] =>
  text
    .toLowerCase()
    .split(/[^a-z0-9]+/)
    .filter((word) => word.length > 2 && !smallWords.has(word));
