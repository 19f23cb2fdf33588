import { expressionPlaces } from './expression-places';
import type { Expression } from './expression/expression';
import { parseExpression } from './expression/parse';
import { narrowBands } from './lint/band-and-gear';
import { unboundedLoops } from './lint/bounded-loops';
import { unsoundCalls, type PublishedVersions } from './lint/called';
import { looseBounds } from './lint/bounds';
import { lateCautions } from './lint/caution-place';
import { cautionsWithWork, notesWithImperatives } from './lint/caution-work';
import { piledUpCautions } from './lint/cautions';
import { mixedConnectives } from './lint/conditions';
import { expressionFindings } from './lint/expression-findings';
import { exitFindings } from './lint/exits';
import { limitsBeyondGear } from './lint/limit-and-gear';
import { limitsInWords } from './lint/limit-in-words';
import { bandsBeyondLimits } from './lint/limit-and-band';
import type { LintFinding, LintSubject } from './lint/lint-finding';
import { doubleActions } from './lint/one-action';
import { missingParts } from './lint/pictures';
import { endlessSteps, unnamedVerdicts, unreachableSteps, waysToFindings } from './lint/reachable';
import { brokenReferences } from './lint/references';
import { neverRestored } from './lint/restored';
import { runGraphs } from './lint/run-graph';
import { startCardPlace } from './lint/start';
import { unknownTemplateNames } from './lint/template-names';
import { verdictsWithoutReading } from './lint/unmeasured-verdicts';
import { nominalsWithTolerance } from './lint/two-ends';
import { unusedReadings } from './lint/unused-readings';
import { valuesBeforeUse } from './lint/value-before-use';
import type { ProcedureDocument } from './procedure-document';
import { validateDocument } from './validate-document';

export interface LintReport {
  /** What publishing refuses. */
  readonly errors: readonly LintFinding[];
  /** What the author should know. */
  readonly warnings: readonly LintFinding[];
  /** For each finding that a run can reach, the ids of the steps on one shortest way to it. */
  readonly waysToFindings: Readonly<Record<string, readonly string[]>>;
}

export interface LintOptions {
  /** The parts that each drawn sheet has; without it pictures are not held against the drawings. */
  readonly parts?: Readonly<Record<string, readonly string[]>>;
  /** The published versions that may be called; without it calls are not held against them. */
  readonly published?: PublishedVersions;
}

const errorRules: readonly ((subject: LintSubject) => readonly LintFinding[])[] = [
  startCardPlace,
  brokenReferences,
  unknownTemplateNames,
  unreachableSteps,
  endlessSteps,
  unnamedVerdicts,
  unboundedLoops,
  looseBounds,
  valuesBeforeUse,
  verdictsWithoutReading,
  neverRestored,
  bandsBeyondLimits,
  limitsBeyondGear,
  limitsInWords,
  missingParts,
  mixedConnectives,
  piledUpCautions,
  unsoundCalls,
  unusedReadings,
  lateCautions,
  cautionsWithWork,
  notesWithImperatives,
  nominalsWithTolerance,
];

const warningRules: readonly ((subject: LintSubject) => readonly LintFinding[])[] = [narrowBands, doubleActions];

/**
 * Reads a document as its publisher would: shape, expressions, ways, decisions, values, restoring, limits, wording. Every
 * way is explored with its readings left open, so a way that is shown may need readings that no car has. Never throws on
 * a document's content; the work grows in line with steps and branches, times the findings that a run can head for.
 */
export function lintProcedure(document: ProcedureDocument, options: LintOptions = {}): LintReport {
  const validation = validateDocument(document);
  if (!validation.ok) {
    const errors = validation.problems.map((problem): LintFinding => ({ rule: 'schema', ...problem }));
    return { errors, warnings: [], waysToFindings: {} };
  }
  const trees = treesOf(document);
  const subject: LintSubject = { document, trees, graphs: runGraphs(document, trees), ...options };
  const exits = exitFindings(subject);
  return {
    errors: [...expressionFindings(document), ...errorRules.flatMap((rule) => rule(subject)), ...exits.errors],
    warnings: [...warningRules.flatMap((rule) => rule(subject)), ...exits.warnings],
    waysToFindings: waysToFindings(subject),
  };
}

/** What can be read; the rest is among the expression findings and counts as open. */
function treesOf(document: ProcedureDocument): ReadonlyMap<string, Expression> {
  const trees = new Map<string, Expression>();
  for (const { source } of expressionPlaces(document)) {
    if (trees.has(source)) continue;
    const parsed = parseExpression(source);
    if (parsed.ok) trees.set(source, parsed.expression);
  }
  return trees;
}
