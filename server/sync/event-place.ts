import type { RunEvent } from '../../procedures/engine';

/** The first line of a run's events. */
export const mainBranch = 'main';

/** Where one line of a run's events begins and ends. */
export interface BranchEnds {
  readonly branch: string;
  readonly parent: string | null;
  readonly fromSeq: number;
  readonly headSeq: number;
  readonly head: string;
}

/** An event that is kept: on which branch, where, and which. */
export interface KeptEvent {
  readonly branch: string;
  readonly seq: number;
  readonly hash: string;
}

/** What to do with an event that a tablet sends. */
export type EventPlace =
  | { readonly what: 'kept'; readonly branch: string }
  | { readonly what: 'append'; readonly branch: string }
  | { readonly what: 'fork'; readonly branch: string; readonly parent: string }
  | { readonly what: 'gap' | 'broken-chain' };

/**
 * Finds the place of events in what is kept of a run. An event that is kept already stays as it is; a new one goes after
 * the head that it follows on; one that follows on an event inside of a branch begins a branch of its own, named by its
 * hash, so that the same fork sent twice is the same branch.
 */
export class EventPlaces {
  private readonly branches = new Map<string, BranchEnds>();
  /** seq -> the events that are kept there, one for each branch that has its own. */
  private readonly kept = new Map<number, KeptEvent[]>();

  constructor(
    private readonly headerHash: string,
    branches: readonly BranchEnds[],
    kept: readonly KeptEvent[],
  ) {
    for (const branch of branches) this.branches.set(branch.branch, branch);
    for (const event of kept) this.remember(event);
  }

  placeOf({ seq, hash, prev }: Pick<RunEvent, 'seq' | 'hash' | 'prev'>): EventPlace {
    const same = this.at(seq).find((event) => event.hash === hash);
    if (same !== undefined) return { what: 'kept', branch: same.branch };
    if (seq === 1) {
      if (prev !== this.headerHash) return { what: 'broken-chain' };
      return this.branches.size === 0
        ? { what: 'append', branch: mainBranch }
        : { what: 'fork', branch: hash, parent: mainBranch };
    }
    const before = this.at(seq - 1).find((event) => event.hash === prev);
    if (before === undefined) return { what: this.at(seq - 1).length === 0 ? 'gap' : 'broken-chain' };
    const isHead = this.branches.get(before.branch)?.headSeq === seq - 1;
    return isHead ? { what: 'append', branch: before.branch } : { what: 'fork', branch: hash, parent: before.branch };
  }

  /** Notes that the event now is where `placeOf` said. */
  put({ seq, hash }: Pick<RunEvent, 'seq' | 'hash'>, place: EventPlace): void {
    if (place.what !== 'append' && place.what !== 'fork') return;
    const before = this.branches.get(place.branch);
    const parent = place.what === 'fork' ? place.parent : null;
    const ends = before ?? { branch: place.branch, parent, fromSeq: seq };
    this.branches.set(place.branch, { ...ends, headSeq: seq, head: hash });
    this.remember({ branch: place.branch, seq, hash });
  }

  branch(name: string): BranchEnds | undefined {
    return this.branches.get(name);
  }

  private at(seq: number): readonly KeptEvent[] {
    return this.kept.get(seq) ?? [];
  }

  private remember(event: KeptEvent): void {
    const there = this.kept.get(event.seq);
    if (there === undefined) this.kept.set(event.seq, [event]);
    else there.push(event);
  }
}
