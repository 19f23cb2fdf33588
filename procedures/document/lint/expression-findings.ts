import { compileProcedure } from '../compile-procedure';
import { expressionPlaces } from '../expression-places';
import type { ProcedureDocument } from '../procedure-document';
import type { LintFinding } from './lint-finding';

/** So much of an expression is shown with what is wrong with it. */
const mostShown = 80;

/** What is wrong with names and expressions: the step, what it says there, what is wrong and how to mend it. */
export function expressionFindings(document: ProcedureDocument): readonly LintFinding[] {
  const compiled = compileProcedure(document);
  if (compiled.ok) return [];
  const numbers = new Map(document.steps.map(({ id, number }) => [id, number]));
  const sources = new Map(expressionPlaces(document).map(({ pointer, source }) => [pointer, source]));
  return compiled.problems.map(({ step, where, pointer, message, at }): LintFinding => {
    const place = step === undefined ? '' : `Step ${numbers.get(step) ?? step}, `;
    const source = pointer === undefined ? undefined : sources.get(pointer);
    const shown = source === undefined ? '' : ` It reads: \`${shownPart(source, at?.start ?? 0)}\`.`;
    return {
      rule: pointer === undefined ? 'names' : 'expression',
      ...(step === undefined ? {} : { step }),
      ...(pointer === undefined ? {} : { pointer }),
      message: `${place}${where}: ${message}${shown}`,
    };
  });
}

/** The whole expression, or the part of it round the place that is wrong. */
function shownPart(source: string, at: number): string {
  if (source.length <= mostShown) return source;
  const start = Math.max(0, Math.min(at - mostShown / 2, source.length - mostShown));
  const end = start + mostShown;
  return `${start > 0 ? '…' : ''}${source.slice(start, end)}${end < source.length ? '…' : ''}`;
}
