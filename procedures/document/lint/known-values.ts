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
  /** By way, and by the finding that the run heads for where that matters. */
  private readonly plans = new Map<Way, Map<string | undefined, EdgePlan>>();
  private readonly asking = new Map<Step, boolean>();

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
    this.goThrough([first]);
    // What rests on a truth rests on the steps that set it: it is looked at again until nothing changes.
    const resting = graph.places.filter((place) => place.out.some((edge) => this.planOf(edge).resting.length > 0));
    while (this.goThrough(resting.filter((place) => this.known.has(place))));
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

  /** Carries what is known onwards from places, and from those that change by it; whether anything changed. */
  private goThrough(places: readonly RunPlace[]): boolean {
    let isChanged = false;
    const waiting = new Set(places);
    for (const place of waiting) {
      waiting.delete(place);
      for (const edge of place.out) {
        if (!this.pass(edge)) continue;
        isChanged = true;
        waiting.add(edge.to);
      }
    }
    return isChanged;
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
  private after(edge: RunEdge): bigint | undefined {
    const { from } = edge;
    const { implied, resting } = this.planOf(edge);
    if (implied === undefined) return this.at(from, 'before');
    let known = this.at(from, 'at-ways') | implied;
    for (const setters of resting) {
      const set = this.knownAtAll(setters);
      if (set === undefined) return undefined;
      known |= set;
    }
    return known;
  }

  /** A way that needs a truth is taken after a step that sets it, and what was known there is known still. */
  private knownAtAll(setters: readonly RunPlace[]): bigint | undefined {
    return setters
      .filter((setter) => this.known.has(setter))
      .map((setter) => this.at(setter, 'at-ways'))
      .reduce<bigint | undefined>((all, set) => (all === undefined ? set : all & set), undefined);
  }

  /** What an edge tells by itself: it depends on the finding that the run heads for only where a condition asks. */
  private planOf({ from, way }: RunEdge): EdgePlan {
    const givesNothing = way.kind === 'stop' || (way.kind === 'cannot-measure' && this.counts === 'measured');
    if (givesNothing) return tellsNothing;
    const plans = this.plans.get(way) ?? new Map<string | undefined, EdgePlan>();
    this.plans.set(way, plans);
    const verdict = this.asksForFinding(from.step) ? from.verdict : undefined;
    const plan = plans.get(verdict) ?? this.newPlan(from, way);
    plans.set(verdict, plan);
    return plan;
  }

  private newPlan(from: RunPlace, way: Way): EdgePlan {
    let implied = 0n;
    const resting: (readonly RunPlace[])[] = [];
    for (const { tree, isTaken } of this.conditionsPassed(from, way)) {
      for (const name of namesIn(tree)) {
        if (isImplied(this.truthWithout(tree, name, from), isTaken)) implied |= this.bits.of([name]);
        const setters = isTaken ? this.settersOf.get(name) : undefined;
        if (setters !== undefined && this.truthUnset(tree, name, from) === 'fails') resting.push(setters);
      }
    }
    return { implied, resting };
  }

  private asksForFinding(step: Step): boolean {
    const known = this.asking.get(step);
    if (known !== undefined) return known;
    const asks = conditionsOf(step).some((when) => {
      const tree = this.subject.trees.get(when);
      return tree !== undefined && namesIn(tree).some((name) => this.graph.isFinding(name));
    });
    this.asking.set(step, asks);
    return asks;
  }

  private truthUnset(tree: Expression, name: string, { verdict }: RunPlace): PartialTruth {
    const truth = (asked: string): boolean | undefined =>
      asked === name ? false : this.graph.settledTruth(asked, verdict);
    return partialTruth(tree, { truth, isMissing: () => false });
  }

  /** The conditions that were tried before this way, and its own. */
  private conditionsPassed({ step }: RunPlace, way: Way): readonly { tree: Expression; isTaken: boolean }[] {
    if (way.kind === 'cannot-measure') return [];
    const last = way.branch ?? Number.POSITIVE_INFINITY;
    return conditionsOf(step)
      .slice(0, last + 1)
      .flatMap((when, index) => {
        const tree = this.subject.trees.get(when);
        return tree === undefined ? [] : [{ tree, isTaken: index === last }];
      });
  }
}

/** What the conditions on the way tell; `implied` is undefined where the step gives nothing. */
interface EdgePlan {
  readonly implied: bigint | undefined;
  /** For each truth that the way needs, the places that can set it. */
  readonly resting: readonly (readonly RunPlace[])[];
}

const tellsNothing: EdgePlan = { implied: undefined, resting: [] };

function conditionsOf(step: Step): readonly string[] {
  return step.kind === 'finding' ? [] : (step.next ?? []).map(({ when }) => when);
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
