import { expandCalls, type CallBlock, type Expansion, type ProcedureLibrary } from './call/expand-calls';
import { declarationsOf, kindOfDeclaration, type Declaration } from './declarations';
import { expressionPlaces, type ExpressionPlace } from './expression-places';
import type { Environment, Evaluation } from './expression/environment';
import { compileEvaluation } from './expression/evaluate';
import { expandedUncertaintyOf } from './expression/expanded-uncertainty';
import type { Expression, ExpressionProblem } from './expression/expression';
import { inferKind, type KindOfName } from './expression/infer-kind';
import { pressure, type Kind } from './expression/kinds';
import { namesIn } from './expression/names-in';
import { parseExpression } from './expression/parse';
import { problemWithQuestion, problemWithUse } from './expression-use';
import type { ProcedureDocument, Step } from './procedure-document';

/** A document whose every expression was read, checked and compiled once. */
export interface CompiledProcedure {
  /** With the steps of the procedures that it calls written in. */
  readonly document: ProcedureDocument;
  /** As it was published: what a run's header has the hash of. */
  readonly authored: ProcedureDocument;
  readonly step: (id: string) => Step | undefined;
  /** The expression with exactly this text. Throws RangeError on a text that the document does not hold. */
  readonly expression: (source: string) => CompiledExpression;
  /** The called procedure that a step or finding belongs to, the innermost one. */
  readonly blockOf: (id: string) => CallBlock | undefined;
  /** The called procedure that a limit belongs to; undefined where it holds throughout the run. */
  readonly blockOfLimit: (id: string) => CallBlock | undefined;
  /** What a name stands for; undefined where no input, quantity, option or finding has it. */
  readonly declared: (name: string) => Declaration | undefined;
}

export interface CompiledExpression {
  readonly source: string;
  readonly tree: Expression;
  readonly kind: Kind;
  /** The names that it reads, each once, in the order of the text. */
  readonly names: readonly string[];
  /** A number in base units, a truth, or what is missing. */
  readonly evaluate: (environment: Environment) => Evaluation;
  /**
   * Expanded uncertainty (k = 2) in base units of a number that evaluates (JCGM 100:2008, 5.1.2). Throws RangeError
   * on a truth and where there is no value.
   */
  readonly expandedUncertainty: (environment: Environment) => number;
}

export interface CompileProblem {
  readonly step?: string;
  /** `branch 2`, `result sensorGap`, `name seals`. */
  readonly where: string;
  readonly message: string;
  /** JSON pointer into the document, where the problem is an expression's. */
  readonly pointer?: string;
  /** The place in the expression's text. */
  readonly at?: { readonly start: number; readonly end: number };
}

export type Compilation =
  | { readonly ok: true; readonly procedure: CompiledProcedure }
  | { readonly ok: false; readonly problems: readonly CompileProblem[] };

/**
 * Reads every expression of a document once, checks what it gives against where it stands, and compiles it. The
 * document has the schema's shape already (`validateDocument`). All problems come back together. With a library the steps
 * of called procedures are written in first, which a run needs; without one a call stays one step.
 */
export function compileProcedure(authored: ProcedureDocument, library?: ProcedureLibrary): Compilation {
  const expanded = library === undefined ? standingAlone(authored) : expandCalls(authored, library);
  if (!expanded.ok) return expanded;
  const { document, blocks } = expanded;
  const { declarations, problems: nameProblems } = declarationsOf(document);
  const problems: CompileProblem[] = [...nameProblems];
  const expressions = new Map<string, CompiledExpression>();
  for (const place of expressionPlaces(document)) {
    const compiled = compileAt(place, declarations);
    if (compiled.ok) expressions.set(place.source, compiled.expression);
    else problems.push(problemAt(place, compiled.problem));
  }
  if (problems.length > 0) return { ok: false, problems };
  const steps = new Map(document.steps.map((step) => [step.id, step]));
  return {
    ok: true,
    procedure: {
      document,
      authored,
      step: (id) => steps.get(id),
      blockOf: (id) => blocks.find((block) => block.steps.has(id)),
      blockOfLimit: (id) => blocks.find((block) => block.limits.has(id)),
      expression: (source) => {
        const known = expressions.get(source);
        if (known === undefined) throw new RangeError(`expression is ${source}; allowed: one of the document's own`);
        return known;
      },
      declared: (name) => declarations.get(name),
    },
  };
}

function standingAlone(document: ProcedureDocument): Expansion {
  return { ok: true, document, blocks: [] };
}

type Compiled =
  | { readonly ok: true; readonly expression: CompiledExpression }
  | { readonly ok: false; readonly problem: ExpressionProblem };

function compileAt(place: ExpressionPlace, declarations: ReadonlyMap<string, Declaration>): Compiled {
  const parsed = parseExpression(place.source);
  if (!parsed.ok) return parsed;
  const inferred = inferKind(parsed.expression, kindsSeenFrom(place, declarations));
  if (!inferred.ok) return inferred;
  const { kind } = inferred;
  const problem =
    problemWithUse(parsed.expression, kind, place) ?? problemWithQuestion(parsed.expression, place, declarations);
  if (problem !== undefined) return { ok: false, problem };
  return { ok: true, expression: compiledExpression(place.source, parsed.expression, kind) };
}

function kindsSeenFrom(place: ExpressionPlace, declarations: ReadonlyMap<string, Declaration>): KindOfName {
  if (place.sees === 'gauge') return (name) => (name === 'gauge' ? pressure('gauge') : undefined);
  return (name) => {
    const declared = declarations.get(name);
    return declared === undefined ? undefined : kindOfDeclaration(declared);
  };
}

function compiledExpression(source: string, tree: Expression, kind: Kind): CompiledExpression {
  return {
    source,
    tree,
    kind,
    names: namesIn(tree),
    evaluate: compileEvaluation(tree, kind.kind),
    expandedUncertainty:
      kind.kind === 'quantity'
        ? expandedUncertaintyOf(tree)
        : () => {
            throw new RangeError(`${source} gives a truth; allowed: an expression that gives a number`);
          },
  };
}

function problemAt(place: ExpressionPlace, { start, end, message }: ExpressionProblem): CompileProblem {
  const { pointer, where } = place;
  return { ...(place.step === undefined ? {} : { step: place.step }), where, message, pointer, at: { start, end } };
}
