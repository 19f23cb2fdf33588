import type { Expression } from '../expression/expression';
import type { ProcedureDocument, Step } from '../procedure-document';
import { truthsSetBy } from './named-values';
import { partialTruth, type PartialTruth } from './partial-truth';
import { waysOf, type Way } from './ways';

/** Where a run can be: a step, and the finding that it heads for. */
export interface RunPlace {
  readonly step: Step;
  /** The step's index in the document. */
  readonly place: number;
  readonly verdict: string | undefined;
  readonly out: RunEdge[];
  /** The edge by which the way that is shown comes here. */
  readonly cameBy: RunEdge | undefined;
  /** The edges on that way, and how many of them are stops. */
  readonly depth: number;
  readonly stops: number;
  /** The truths that steps on that way can have set. */
  readonly settable: ReadonlySet<string>;
}

export interface RunEdge {
  readonly from: RunPlace;
  readonly to: RunPlace;
  readonly way: Way;
}

/** A way that is open from a place. */
type OpenWay = Pick<RunEdge, 'from' | 'way'>;

/** A way to `verdict` where no finding was named before. */
export interface LooseEnd {
  readonly from: RunPlace;
  readonly way: Way;
}

type Trees = ReadonlyMap<string, Expression>;

/**
 * Everywhere that a run can get, as far as can be told without its readings: conditions count as open, but for the
 * finding that the run heads for and the half that it is, which are known. Its size is steps times findings at most.
 */
export class RunGraph {
  /** In the order in which they were found: nearest first, those that only a stop leads to last. */
  readonly places: readonly RunPlace[];
  readonly looseEnds: readonly LooseEnd[];
  private readonly byKey = new Map<string, RunPlace>();
  private readonly stepPlaces = new Map<string, number>();
  private readonly ways: (readonly Way[])[] = [];

  constructor(
    private readonly document: ProcedureDocument,
    private readonly trees: Trees,
    /** The half of a pair that the run is. */
    readonly half?: 'cold' | 'warm',
  ) {
    document.steps.forEach(({ id }, place) => {
      if (!this.stepPlaces.has(id)) this.stepPlaces.set(id, place);
    });
    const looseEnds: LooseEnd[] = [];
    this.places = this.explore(looseEnds);
    this.looseEnds = looseEnds;
  }

  /** The steps from the first one to a place, both included, on the shortest way. */
  wayTo(place: RunPlace): readonly Step[] {
    const steps: Step[] = [place.step];
    let edge = place.cameBy;
    while (edge !== undefined) {
      steps.unshift(edge.from.step);
      edge = edge.from.cameBy;
    }
    return steps;
  }

  /**
   * Breadth first. Ways that need a truth which no step before could set, and ways that need a stop, are followed when
   * no other is left, so that a way that is shown has one only if it must; and again the nearest ones first.
   */
  private explore(looseEnds: LooseEnd[]): readonly RunPlace[] {
    const places: RunPlace[] = [];
    const first = this.document.steps[0];
    if (first === undefined) return places;
    const later: Record<'unset' | 'stop', OpenWay[]> = { unset: [], stop: [] };
    let waiting: readonly OpenWay[] = [];
    let followed = 0;
    this.reach(first, 0, undefined, undefined, places);
    for (let index = 0; ;) {
      const from = places[index];
      const next = waiting[followed];
      if (next !== undefined && (from === undefined || next.from.depth <= from.depth)) {
        followed += 1;
        this.follow(next, places, looseEnds);
      } else if (from !== undefined) {
        index += 1;
        for (const way of this.openWays(from)) {
          const open = { from, way };
          if (way.kind === 'stop') later.stop.push(open);
          else if (this.needsUnset(way, from)) later.unset.push(open);
          else this.follow(open, places, looseEnds);
        }
      } else {
        waiting = (later.unset.length > 0 ? later.unset : later.stop).splice(0);
        if (waiting.length === 0) return places;
        waiting = [...waiting].sort((a, b) => a.from.depth - b.from.depth);
        followed = 0;
      }
    }
  }

  private needsUnset(way: Way, from: RunPlace): boolean {
    const tree = way.when === undefined ? undefined : this.trees.get(way.when);
    if (tree === undefined) return false;
    const settable = settableAfter(from);
    const truth = (name: string): boolean | undefined => {
      const settled = this.settledTruth(name, from.verdict);
      return settled ?? (settable.has(name) ? undefined : false);
    };
    return partialTruth(tree, { truth, isMissing: () => false }) === 'fails';
  }

  private follow({ from, way }: OpenWay, places: RunPlace[], looseEnds: LooseEnd[]): void {
    const verdict = way.exit.verdict ?? from.verdict;
    const id = way.exit.to === 'verdict' ? verdict : way.exit.to;
    if (id === undefined) {
      looseEnds.push({ from, way });
      return;
    }
    const index = this.stepPlaces.get(id);
    const step = index === undefined ? undefined : this.document.steps[index];
    // A way into nothing is the references' rule.
    if (index === undefined || step === undefined) return;
    this.reach(step, index, verdict, { from, way }, places);
  }

  private reach(
    step: Step,
    place: number,
    verdict: string | undefined,
    by: OpenWay | undefined,
    places: RunPlace[],
  ): void {
    const key = `${place}/${verdict ?? ''}`;
    const known = this.byKey.get(key);
    const to = known ?? newPlace(step, place, verdict, by);
    if (known === undefined) {
      this.byKey.set(key, to);
      places.push(to);
    }
    if (by !== undefined)
      by.from.out.push(to.cameBy?.from === by.from && to.cameBy.way === by.way ? to.cameBy : { ...by, to });
  }

  /** The ways whose conditions do not already fail; after one that surely holds there is no further branch. */
  private openWays(from: RunPlace): readonly Way[] {
    const ways: Way[] = [];
    let isDecided = false;
    for (const way of this.waysAt(from.place)) {
      const isTried = way.kind === 'branch' || way.kind === 'thenceforth' || way.kind === 'otherwise';
      if (isTried && isDecided && way.kind !== 'thenceforth') continue;
      const truth = this.truthOf(way, from.verdict);
      if (truth === 'fails') continue;
      if (way.kind === 'thenceforth' && isDecided && ways.at(-1)?.branch !== way.branch) continue;
      ways.push(way);
      if (way.kind === 'branch' && truth === 'holds') isDecided = true;
    }
    return ways;
  }

  /** A step's ways are the same whatever the run heads for. */
  private waysAt(place: number): readonly Way[] {
    const known = this.ways[place];
    if (known !== undefined) return known;
    const ways = waysOf(this.document, place);
    this.ways[place] = ways;
    return ways;
  }

  private truthOf(way: Way, verdict: string | undefined): PartialTruth {
    const tree = way.when === undefined ? undefined : this.trees.get(way.when);
    if (tree === undefined) return 'open';
    return partialTruth(tree, { truth: (name) => this.settledTruth(name, verdict), isMissing: () => false });
  }

  /** Of the truths only findings and halves are settled before the run. */
  settledTruth(name: string, verdict: string | undefined): boolean | undefined {
    if (this.half !== undefined && (name === 'cold' || name === 'warm')) return name === this.half;
    return this.isFinding(name) ? name === verdict : undefined;
  }

  isFinding(name: string): boolean {
    const place = this.stepPlaces.get(name);
    return place !== undefined && this.document.steps[place]?.kind === 'finding';
  }
}

function newPlace(step: Step, place: number, verdict: string | undefined, by: OpenWay | undefined): RunPlace {
  const settable = by === undefined ? new Set<string>() : settableAfter(by.from);
  const made: { -readonly [K in keyof RunPlace]: RunPlace[K] } = {
    step,
    place,
    verdict,
    out: [],
    cameBy: undefined,
    depth: by === undefined ? 0 : by.from.depth + 1,
    stops: by === undefined ? 0 : by.from.stops + (by.way.kind === 'stop' ? 1 : 0),
    settable,
  };
  if (by !== undefined) made.cameBy = { ...by, to: made };
  return made;
}

/** The set itself where the step adds nothing: most steps share one. */
function settableAfter({ step, settable }: RunPlace): ReadonlySet<string> {
  const added = truthsSetBy(step).filter((name) => !settable.has(name));
  return added.length === 0 ? settable : new Set([...settable, ...added]);
}

/** A pair is run twice, each half on its own ways. */
export function runGraphs(document: ProcedureDocument, trees: Trees): readonly RunGraph[] {
  if (document.pair !== true) return [new RunGraph(document, trees)];
  return [new RunGraph(document, trees, 'cold'), new RunGraph(document, trees, 'warm')];
}
