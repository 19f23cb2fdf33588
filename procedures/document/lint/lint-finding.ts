import type { Expression } from '../expression/expression';
import type { ProcedureDocument, Step } from '../procedure-document';
import type { PublishedVersions } from './called';
import type { RunGraph } from './run-graph';

export type LintRule =
  | 'schema'
  | 'names'
  | 'expression'
  | 'references'
  | 'start'
  | 'reachable'
  | 'ends-in-a-finding'
  | 'verdict-named'
  | 'bounded-loops'
  | 'value-before-use'
  | 'restored'
  | 'band-and-gear'
  | 'limit-and-band'
  | 'picture-parts'
  | 'one-connective'
  | 'cautions'
  | 'called'
  | 'unused-reading'
  | 'one-action'
  | 'caution-place'
  | 'caution-work'
  | 'note-work'
  | 'limit-and-gear'
  | 'limit-in-words'
  | 'two-ends'
  | 'one-exit';

/** One thing that keeps a document from being published, or that its author should know. */
export interface LintFinding {
  readonly rule: LintRule;
  /** The step's id. */
  readonly step?: string;
  /** JSON pointer (RFC 6901) to the place. */
  readonly pointer?: string;
  /** What is wrong, where, and how to mend it, as one or two sentences. */
  readonly message: string;
}

/** What the rules look at. */
export interface LintSubject {
  readonly document: ProcedureDocument;
  /** The trees of the expressions that could be read, by text. */
  readonly trees: ReadonlyMap<string, Expression>;
  /** One for a procedure that stands alone, one for each half of a pair. */
  readonly graphs: readonly RunGraph[];
  /** The parts that each drawn sheet has; without it pictures are not checked against the drawings. */
  readonly parts?: Readonly<Record<string, readonly string[]>>;
  /** What may be called; without it calls are not held against what is published. */
  readonly published?: PublishedVersions;
}

/** A step as a lead names it. */
export function stepWords({ number }: Pick<Step, 'number'>): string {
  return `Step ${number}`;
}

/** A way through steps by their numbers: `1, 2, 4`. */
export function wayWords(steps: readonly Step[]): string {
  return steps.map(({ number }) => number).join(', ');
}
