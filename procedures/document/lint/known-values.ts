import type { Expression } from '../expression/expression';
import { namesIn } from '../expression/names-in';
import type { Step } from '../procedure-document';
import type { LintSubject } from './lint-finding';
import { NameBits } from './name-bits';
import { askedFor, startingNames, truthsSetBy, valueNamesOf } from './named-values';
import { partialTruth, type PartialTruth } from './partial-truth';
import type { RunEdge, RunGraph, RunPlace } from './run-graph';
import type { Way } from './ways';

/** At which moment of a step: as it is claimed, when its own readings are in, when its ways are tried. */
export type Moment = 'before' | 'within' | 'at-ways';

/** What a step adds to the names with a value: what it asks for, and the results of what they need. */
interface Giving {
  readonly asked: bigint;
  readonly results: readonly { readonly needs: bigint; readonly gives: bigint }[];
}

/**
 * For every place of a graph the names that can have a value there, whatever way the run came: the intersection over
 * all ways in, gone through until nothing changes. Each set only shrinks, so this ends.
 */
export class KnownValues {
  private readonly known = new Map<RunPlace, bigint>();
  private readonly bits: NameBits;
  private readonly givings: ReadonlyMap<Step, Giving>;
  private readonly settersOf: ReadonlyMap<string, readonly RunPlace[]>;

  constructor(
    private readonly graph: RunGraph,
    private readonly subject: Pick<LintSubject, 'document' | 'trees'>,
    /** Whether what could not be measured counts as known: it was asked for, and the author gave it a way on. */
    private readonly counts: 'asked-for' | 'measured' = 'asked-for',
  ) {
    const { document } = subject;
    this.bits = new NameBits([...document.inputs.map(({ name }) => name), ...document.steps.flatMap(valueNamesOf)]);
    this.givings = new Map(document.steps.map((step) => [step, this.givingOf(step)]));
    this.settersOf = settersIn(graph);
    const first = graph.places[0];
    if (first === undefined) return;
    this.known.set(first, this.bits.of(startingNames(document)));
    for (let isChanged = true; isChanged;) {
      isChanged = false;
      for (const place of graph.places) {
        if (!this.known.has(place)) continue;
        for (const edge of place.out) isChanged = this.pass(edge) || isChanged;
      }
    }
  }

  /** Whether a run can come here at all, as far as truths tell: they are false until a step sets them. */
  isReached(place: RunPlace): boolean {
    return this.known.has(place);
  }

  /** Whether the name can have a value at that moment of the step. */
  knows(name: string, place: RunPlace, moment: Moment): boolean {
    return this.bits.has(this.at(place, moment), name);
  }

  /** What a condition comes to where one of its names has no value. */
  truthWithout(tree: Expression, name: string, { verdict }: RunPlace): PartialTruth {
    return partialTruth(tree, {
      truth: (asked) => this.graph.settledTruth(asked, verdict),
      isMissing: (asked) => asked === name,
    });
  }

  private at(place: RunPlace, moment: Moment): bigint {
    const before = this.known.get(place) ?? 0n;
    const giving = this.givings.get(place.step);
    if (moment === 'before' || giving === undefined) return before;
    const within = before | giving.asked;
    if (moment === 'within') return within;
    return giving.results.reduce((set, { needs, gives }) => ((set & needs) === needs ? set | gives : set), within);
  }

  private givingOf(step: Step): Giving {
    const results = step.kind === 'finding' ? [] : (step.results ?? []);
    return {
      asked: this.bits.of(askedFor(step)),
      results: results.map(({ name, is }) => {
        const tree = this.subject.trees.get(is);
        return { needs: tree === undefined ? 0n : this.bits.of(namesIn(tree)), gives: this.bits.of([name]) };
      }),
    };
  }

  /** Carries what is known over an edge; whether that changed anything. */
  private pass(edge: RunEdge): boolean {
    const coming = this.after(edge);
    if (coming === undefined) return false;
    const before = this.known.get(edge.to);
    const both = before === undefined ? coming : before & coming;
    this.known.set(edge.to, both);
    return both !== before;
  }

  /** What is known after an edge: a step that is stopped gives nothing. Undefined where it cannot be taken yet. */
  private after({ from, way }: RunEdge): bigint | undefined {
    const givesNothing = way.kind === 'stop' || (way.kind === 'cannot-measure' && this.counts === 'measured');
    if (givesNothing) return this.at(from, 'before');
    let known = this.at(from, 'at-ways');
    for (const { tree, isTaken } of this.conditionsPassed(from, way)) {
      for (const name of namesIn(tree)) {
        const isNew = !this.bits.has(known, name);
        if (isNew && isImplied(this.truthWithout(tree, name, from), isTaken)) known |= this.bits.of([name]);
        const needed = isTaken ? this.knownWithTruth(tree, name, from) : 0n;
        if (needed === undefined) return undefined;
        known |= needed;
      }
    }
    return known;
  }

  /**
   * A way that needs a truth is taken after a step that sets it, and what was known there is known still. Undefined as
   * long as no such step was come to.
   */
  private knownWithTruth(tree: Expression, name: string, from: RunPlace): bigint | undefined {
    const setters = this.settersOf.get(name);
    if (setters === undefined || this.truthUnset(tree, name, from) !== 'fails') return 0n;
    return setters
      .filter((setter) => this.known.has(setter))
      .map((setter) => this.at(setter, 'at-ways'))
      .reduce<bigint | undefined>((all, set) => (all === undefined ? set : all & set), undefined);
  }

  private truthUnset(tree: Expression, name: string, { verdict }: RunPlace): PartialTruth {
    const truth = (asked: string): boolean | undefined =>
      asked === name ? false : this.graph.settledTruth(asked, verdict);
    return partialTruth(tree, { truth, isMissing: () => false });
  }

  /** The conditions that were tried before this way, and its own. */
  private conditionsPassed({ step }: RunPlace, way: Way): readonly { tree: Expression; isTaken: boolean }[] {
    if (step.kind === 'finding' || way.kind === 'cannot-measure') return [];
    const last = way.branch ?? Number.POSITIVE_INFINITY;
    return (step.next ?? []).slice(0, last + 1).flatMap(({ when }, index) => {
      const tree = this.subject.trees.get(when);
      return tree === undefined ? [] : [{ tree, isTaken: index === last }];
    });
  }
}

function settersIn({ places }: RunGraph): ReadonlyMap<string, readonly RunPlace[]> {
  const setters = new Map<string, RunPlace[]>();
  for (const place of places) {
    for (const name of truthsSetBy(place.step)) {
      const known = setters.get(name);
      if (known === undefined) setters.set(name, [place]);
      else known.push(place);
    }
  }
  return setters;
}

/** A branch that cannot be taken without the name, or cannot be passed over without it, tells that it is there. */
function isImplied(without: PartialTruth, isTaken: boolean): boolean {
  return isTaken ? without === 'fails' || without === 'missing' : without === 'holds';
}
