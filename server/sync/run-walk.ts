import type { CompiledProcedure } from '../../procedures/document';
import {
  applyEvent,
  brokenLink,
  canonicalJson,
  headerHash,
  replay,
  type ReplayResult,
  type RunEvent,
  type RunHeader,
  type RunState,
} from '../../procedures/engine';
import type { Role } from '../http/route';
import { EventPlaces, type BranchEnds, type EventPlace } from './event-place';
import { missingRight } from './event-rights';
import { runProblem } from './push-problem';
import type { NewEvent, RunRows } from './run-rows';
import type { RunBranch } from './sync.entity';
import type { PushProblem } from './sync.dto';

/** What the push as a whole knows. */
export interface PushFacts {
  readonly tabletId: string;
  readonly roles: ReadonlyMap<string, Role>;
  readonly tablets: ReadonlySet<string>;
}

export interface RefusedEvent {
  readonly event: RunEvent;
  readonly text: string;
  readonly reason: string;
}

/**
 * Walks a tablet's events into what is kept of their run, one by one: place, chain, structure (by replaying with the
 * core), rights. Stops at the first that may not be; what came before it stays.
 */
export class RunWalk {
  readonly added: NewEvent[] = [];
  readonly states = new Map<string, RunState>();
  acceptedThrough = 0;
  /** The branch of the last event that is kept. */
  branch: string | undefined;
  problem: PushProblem | undefined;
  refused: RefusedEvent | undefined;
  private readonly places: EventPlaces;
  private readonly root: string;

  constructor(
    private readonly procedure: CompiledProcedure,
    private readonly header: RunHeader,
    private readonly rows: RunRows,
    private readonly branches: readonly RunBranch[],
    kept: ConstructorParameters<typeof EventPlaces>[2],
    private readonly facts: PushFacts,
    private readonly build: string,
  ) {
    this.root = headerHash(header);
    this.places = new EventPlaces(this.root, branches, kept);
  }

  async through(events: readonly RunEvent[]): Promise<void> {
    for (const event of events) {
      this.problem = await this.take(event);
      if (this.problem !== undefined) return;
    }
  }

  ends(branch: string): BranchEnds | undefined {
    return this.places.branch(branch);
  }

  private async take(event: RunEvent): Promise<PushProblem | undefined> {
    const { seq } = event;
    const place = this.places.placeOf(event);
    switch (place.what) {
      case 'gap':
        return runProblem('gap', `event ${seq} came before the one that it follows on`, seq);
      case 'broken-chain':
        return runProblem('broken-chain', `event ${seq} does not follow on the one before it`, seq);
      case 'kept': {
        const broken = brokenLink(this.header, event, seq, event.prev);
        if (broken !== undefined) return runProblem('broken-chain', broken, seq);
        this.accept(event, place.branch);
        return undefined;
      }
      default:
        return this.add(event, place);
    }
  }

  private async add(
    event: RunEvent,
    place: Extract<EventPlace, { what: 'append' | 'fork' }>,
  ): Promise<PushProblem | undefined> {
    const { seq } = event;
    if (!this.facts.tablets.has(event.device)) {
      return runProblem('not-allowed', `event ${seq} was written by a tablet that is not enrolled`, seq);
    }
    const before = await this.stateBefore(seq, place);
    const result = apply(this.procedure, this.header, before, event);
    if (!result.ok) {
      const { code, what } = result.refusal;
      return runProblem(
        code === 'chain' ? 'broken-chain' : code === 'malformed' ? 'malformed' : 'structure',
        what,
        seq,
      );
    }
    const text = canonicalJson(event);
    const reason = missingRight(event, this.facts.roles.get(event.actor));
    if (reason !== undefined) {
      this.refused = { event, text, reason };
      return runProblem('not-allowed', reason, seq);
    }
    this.places.put(event, place);
    this.states.set(place.branch, result.state);
    this.added.push({ branch: place.branch, event, text });
    this.accept(event, place.branch);
    return undefined;
  }

  private accept({ seq }: RunEvent, branch: string): void {
    this.acceptedThrough = seq;
    this.branch = branch;
  }

  private async stateBefore(
    seq: number,
    place: Extract<EventPlace, { what: 'append' | 'fork' }>,
  ): Promise<RunState | undefined> {
    if (seq === 1) return undefined;
    const branch = place.what === 'append' ? place.branch : place.parent;
    const inMemory = this.states.get(branch);
    if (inMemory?.seq === seq - 1) return inMemory;
    const stored = this.branches.find((candidate) => candidate.branch === branch);
    if (stored?.headSeq === seq - 1 && stored.stateBuild === this.build) return JSON.parse(stored.state) as RunState;
    return this.replayed(branch, seq - 1);
  }

  private async replayed(branch: string, throughSeq: number): Promise<RunState> {
    const kept = (await this.rows.lineage(this.branches, branch, throughSeq)).slice();
    // Events of this very push are not among the rows yet.
    for (const added of this.added) {
      if (added.branch === branch && added.event.seq > kept.length && added.event.seq <= throughSeq)
        kept.push(added.event);
    }
    const result = replay(this.procedure, this.header, kept);
    if (!result.ok) throw new RangeError(`run ${this.header.runId}, branch ${branch}: ${result.refusal.what}`);
    return result.state;
  }
}

/** `applyEvent` for what nobody has vouched for: data of a wrong shape may make any rule of the core stumble. */
function apply(
  procedure: CompiledProcedure,
  header: RunHeader,
  state: RunState | undefined,
  event: RunEvent,
): ReplayResult {
  try {
    return applyEvent(procedure, header, state, event);
  } catch (error) {
    // TypeError or RangeError out of a rule that met what its types forbid; anything else is ours to know of.
    if (!(error instanceof TypeError) && !(error instanceof RangeError)) throw error;
    const what = `event ${event.seq} (${event.type}) holds data that can not be read`;
    return { ok: false, refusal: { seq: event.seq, code: 'malformed', what } };
  }
}
