import type { EntityManager } from 'typeorm';
import type { RunEvent, RunState } from '../../procedures/engine';
import type { BranchEnds, KeptEvent } from './event-place';
import { withoutNul } from '../http/plain-text';
import { RunBranch } from './sync.entity';

/** An event to be kept, with its canonical text. */
export interface NewEvent {
  readonly branch: string;
  readonly event: RunEvent;
  readonly text: string;
}

/** The rows of one run, inside the transaction that holds its lock. */
export class RunRows {
  constructor(
    private readonly manager: EntityManager,
    private readonly runId: string,
  ) {}

  /** Locks the run's row; undefined when there is none. Events are append-only and can not be locked themselves. */
  async lockedHeader(): Promise<string | undefined> {
    const [row] = await this.manager.query<{ header: string }[]>(
      'SELECT header FROM run WHERE run_id = $1 FOR UPDATE',
      [this.runId],
    );
    return row?.header;
  }

  branches(): Promise<RunBranch[]> {
    return this.manager.findBy(RunBranch, { runId: this.runId });
  }

  /** The kept events from one seq to another, on all branches. */
  async kept(branches: readonly BranchEnds[], fromSeq: number, toSeq: number): Promise<readonly KeptEvent[]> {
    // With the branches named, the primary key leads straight to the rows.
    return this.manager.query<KeptEvent[]>(
      `SELECT branch, seq, hash FROM run_event
       WHERE run_id = $1 AND branch = ANY($2) AND seq BETWEEN $3 AND $4`,
      [this.runId, branches.map(({ branch }) => branch), fromSeq, toSeq],
    );
  }

  /** A branch's events from the run's first on, those of its parents included, through a seq. */
  async lineage(branches: readonly BranchEnds[], branch: string, throughSeq: number): Promise<readonly RunEvent[]> {
    const texts: string[][] = [];
    let own = branches.find((candidate) => candidate.branch === branch);
    let through = throughSeq;
    while (own !== undefined) {
      const rows = await this.manager.query<{ event: string }[]>(
        `SELECT event FROM run_event WHERE run_id = $1 AND branch = $2 AND seq <= $3 ORDER BY seq`,
        [this.runId, own.branch, through],
      );
      texts.unshift(rows.map(({ event }) => event));
      const { parent, fromSeq } = own;
      through = Math.min(through, fromSeq - 1);
      own = parent === null ? undefined : branches.find((candidate) => candidate.branch === parent);
    }
    return texts.flat().map((text) => JSON.parse(text) as RunEvent);
  }

  async insertEvents(events: readonly NewEvent[], receivedAt: Date): Promise<void> {
    await this.manager.query(
      `INSERT INTO run_event (run_id, branch, seq, hash, event, received_at)
       SELECT $1, branch, seq, hash, event, $6
       FROM unnest($2::text[], $3::int[], $4::text[], $5::text[]) AS new (branch, seq, hash, event)`,
      [
        this.runId,
        events.map(({ branch }) => branch),
        events.map(({ event }) => event.seq),
        events.map(({ event }) => event.hash),
        events.map(({ text }) => text),
        receivedAt,
      ],
    );
  }

  async putBranch(ends: BranchEnds, state: RunState, build: string): Promise<void> {
    await this.manager.query(
      `INSERT INTO run_branch (run_id, branch, parent, from_seq, head_seq, head, state, state_build)
       VALUES ($1, $2, $3, $4, $5, $6, $7, $8)
       ON CONFLICT (run_id, branch) DO UPDATE SET head_seq = $5, head = $6, state = $7, state_build = $8`,
      [this.runId, ends.branch, ends.parent, ends.fromSeq, ends.headSeq, ends.head, JSON.stringify(state), build],
    );
  }

  async insertDiscrepancies(branch: string, state: RunState, events: readonly NewEvent[], by: string, at: Date) {
    const written = new Map(events.map(({ event }) => [event.seq, event.build]));
    const found = state.discrepancies.filter(({ seq }) => written.has(seq));
    if (found.length === 0) return;
    await this.manager.query(
      `INSERT INTO discrepancy (run_id, branch, seq, what, computed_by, recorded_by, recorded, computed, found_at)
       SELECT $1, $2, seq, what, $3, recorded_by, recorded, computed, $4
       FROM unnest($5::int[], $6::text[], $7::text[], $8::text[], $9::text[])
         AS new (seq, what, recorded_by, recorded, computed)
       ON CONFLICT DO NOTHING`,
      [
        this.runId,
        branch,
        by,
        at,
        found.map(({ seq }) => seq),
        found.map(({ what }) => what),
        found.map(({ seq }) => withoutNul(written.get(seq) ?? '')),
        found.map(({ recorded }) => withoutNul(recorded)),
        found.map(({ computed }) => computed),
      ],
    );
  }

  async insertAttachments(events: readonly NewEvent[]): Promise<void> {
    const named = events.flatMap(({ event }) => attachmentsOf(event));
    if (named.length === 0) return;
    await this.manager.query(
      `INSERT INTO run_attachment (run_id, sha256) SELECT $1, sha256 FROM unnest($2::text[]) AS new (sha256)
       ON CONFLICT DO NOTHING`,
      [this.runId, named],
    );
  }

  async missingAttachments(): Promise<string[]> {
    const rows = await this.manager.query<{ sha256: string }[]>(
      `SELECT sha256 FROM run_attachment named WHERE run_id = $1
       AND NOT EXISTS (SELECT FROM attachment kept WHERE kept.sha256 = named.sha256) ORDER BY sha256`,
      [this.runId],
    );
    return rows.map(({ sha256 }) => sha256);
  }

  async keepRefused(event: RunEvent, text: string, tabletId: string, reason: string, receivedAt: Date): Promise<void> {
    await this.manager.query(
      `INSERT INTO refused_event (run_id, seq, hash, event, tablet_id, code, reason, received_at)
       VALUES ($1, $2, $3, $4, $5, 'not-allowed', $6, $7) ON CONFLICT DO NOTHING`,
      [this.runId, event.seq, event.hash, text, tabletId, reason, receivedAt],
    );
  }

  /** Takes back the row of a run of which nothing was kept. */
  async forgetEmpty(): Promise<void> {
    await this.manager.query('DELETE FROM run WHERE run_id = $1', [this.runId]);
  }
}

function attachmentsOf(event: RunEvent): readonly string[] {
  if (event.type !== 'series-recorded' && event.type !== 'photo-attached') return [];
  const { sha256 } = event.data;
  return typeof sha256 === 'string' && /^[0-9a-f]{64}$/.test(sha256) ? [sha256] : [];
}
