import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { ProcedureVersion } from '../procedures/procedures.entity';
import { Site } from '../sites/sites.entity';

/**
 * A run: its header, which never changes, and columns that its events give (a projection, rebuilt by `rebuild`).
 * A push locks this row; the events themselves are append-only and can not be locked by the serving role.
 */
@Entity('run')
@ForeignKey(() => ProcedureVersion, ['procedureId', 'version'], ['procedureId', 'version'], {
  name: 'run_procedure_version_fk',
})
@Index('run_opened', ['openedAt', 'runId'])
@Index('run_closed', ['closedAt', 'runId'])
@Index('run_finding_opened', ['finding', 'openedAt', 'runId'])
@Index('run_procedure_opened', ['procedureId', 'openedAt', 'runId'])
@Index('run_person_name', ['personName', 'runId'])
@Index('run_repair_order', ['repairOrder', 'runId'])
@Index('run_visit', ['visitId', 'procedureId'])
export class Run {
  @PrimaryColumn({ name: 'run_id', type: 'uuid' })
  declare runId: string;

  /** Canonical JSON: what the first event's `prev` is the SHA-256 of. */
  @Column({ name: 'header', type: 'text' })
  declare header: string;

  @Column({ name: 'procedure_id', type: 'text' })
  declare procedureId: string;

  @Column({ name: 'version', type: 'integer' })
  declare version: number;

  @Column({ name: 'procedure_title', type: 'text' })
  declare procedureTitle: string;

  @ForeignKey(() => Site, { name: 'run_site_fk' })
  @Column({ name: 'site_id', type: 'uuid' })
  declare siteId: string;

  @Column({ name: 'visit_id', type: 'uuid' })
  declare visitId: string;

  @Column({ name: 'received_at', type: 'timestamptz' })
  declare receivedAt: Date;

  /** Everything from here on is the projection of branch `main`. */
  @Column({ name: 'status', type: 'text' })
  declare status: 'open' | 'set-aside' | 'stopped' | 'lead-called' | 'closed' | 'signed';

  @Column({ name: 'repair_order', type: 'text' })
  declare repairOrder: string;

  @Column({ name: 'car', type: 'text' })
  declare car: string;

  @Column({ name: 'vin', type: 'text' })
  declare vin: string;

  @Column({ name: 'person_name', type: 'text' })
  declare personName: string;

  @Column({ name: 'opened_at', type: 'bigint' })
  declare openedAt: string;

  @Column({ name: 'closed_at', type: 'bigint', nullable: true })
  declare closedAt: string | null;

  @Column({ name: 'finding', type: 'text', nullable: true })
  declare finding: string | null;

  @Column({ name: 'verdict', type: 'text', nullable: true })
  declare verdict: string | null;

  @Column({ name: 'result', type: 'text', nullable: true })
  declare result: 'in' | 'out' | 'too-close' | 'not-judged' | null;

  /** What the search looks through, in small letters. */
  @Column({ name: 'searched', type: 'text' })
  declare searched: string;
}

/**
 * One line of a run's events. The first is `main`; a fork's is named by the hash of its first own event and holds, up
 * to the one before that, the events of its parent.
 */
@Entity('run_branch')
export class RunBranch {
  @ForeignKey(() => Run, { name: 'run_branch_run_fk' })
  @PrimaryColumn({ name: 'run_id', type: 'uuid' })
  declare runId: string;

  @PrimaryColumn({ name: 'branch', type: 'text' })
  declare branch: string;

  @Column({ name: 'parent', type: 'text', nullable: true })
  declare parent: string | null;

  /** The seq of its first own event. */
  @Column({ name: 'from_seq', type: 'integer' })
  declare fromSeq: number;

  @Column({ name: 'head_seq', type: 'integer' })
  declare headSeq: number;

  @Column({ name: 'head', type: 'text' })
  declare head: string;

  /** The state after the head as `state_build` computed it, so that a push costs its own events. JSON. */
  @Column({ name: 'state', type: 'text' })
  declare state: string;

  @Column({ name: 'state_build', type: 'text' })
  declare stateBuild: string;
}

/** An event, byte for byte. Append-only. */
@Entity('run_event')
@Check('run_event_seq', 'seq > 0')
export class RunEventRow {
  @ForeignKey(() => Run, { name: 'run_event_run_fk' })
  @PrimaryColumn({ name: 'run_id', type: 'uuid' })
  declare runId: string;

  @PrimaryColumn({ name: 'branch', type: 'text' })
  declare branch: string;

  @PrimaryColumn({ name: 'seq', type: 'integer' })
  declare seq: number;

  @Column({ name: 'hash', type: 'text' })
  declare hash: string;

  /** Canonical JSON of the whole event. Text, since `jsonb` would reorder it and refuse some characters. */
  @Column({ name: 'event', type: 'text' })
  declare event: string;

  @Column({ name: 'received_at', type: 'timestamptz' })
  declare receivedAt: Date;
}

/** The server's own word on a branch's head: when it stood so. Append-only. */
@Entity('countersignature')
export class Countersignature {
  @ForeignKey(() => Run, { name: 'countersignature_run_fk' })
  @PrimaryColumn({ name: 'run_id', type: 'uuid' })
  declare runId: string;

  @PrimaryColumn({ name: 'branch', type: 'text' })
  declare branch: string;

  @PrimaryColumn({ name: 'seq', type: 'integer' })
  declare seq: number;

  @Column({ name: 'head', type: 'text' })
  declare head: string;

  /** Server clock, milliseconds since 1970. */
  @Column({ name: 'at', type: 'bigint' })
  declare at: string;

  @Column({ name: 'signature', type: 'text' })
  declare signature: string;

  @ForeignKey(() => ServerKey, { name: 'countersignature_key_fk' })
  @Column({ name: 'key_id', type: 'uuid' })
  declare keyId: string;
}

/** The key that countersigns. The private half is sealed: a copy of the database alone can not sign. */
@Entity('server_key')
export class ServerKey {
  @PrimaryColumn({ name: 'id', type: 'uuid' })
  declare id: string;

  @Column({ name: 'public_key', type: 'json' })
  declare publicKey: { readonly kty: string; readonly crv: string; readonly x: string };

  @Column({ name: 'sealed_private_key', type: 'text' })
  declare sealedPrivateKey: string;

  @Column({ name: 'made_at', type: 'timestamptz' })
  declare madeAt: Date;
}

/** What was done without the right to: refused, and kept where it can be seen. Append-only. */
@Entity('refused_event')
export class RefusedEventRow {
  @PrimaryColumn({ name: 'run_id', type: 'uuid' })
  declare runId: string;

  @PrimaryColumn({ name: 'seq', type: 'integer' })
  declare seq: number;

  @PrimaryColumn({ name: 'hash', type: 'text' })
  declare hash: string;

  @Column({ name: 'event', type: 'text' })
  declare event: string;

  @Column({ name: 'tablet_id', type: 'uuid' })
  declare tabletId: string;

  @Column({ name: 'code', type: 'text' })
  declare code: string;

  @Column({ name: 'reason', type: 'text' })
  declare reason: string;

  @Column({ name: 'received_at', type: 'timestamptz' })
  declare receivedAt: Date;
}

/** Bytes that an event of the run names. */
@Entity('run_attachment')
export class RunAttachment {
  @ForeignKey(() => Run, { name: 'run_attachment_run_fk' })
  @PrimaryColumn({ name: 'run_id', type: 'uuid' })
  declare runId: string;

  @PrimaryColumn({ name: 'sha256', type: 'text' })
  declare sha256: string;
}

/** A value that the server computes differently from what an event says: kept, never a reason to refuse. Append-only. */
@Entity('discrepancy')
export class DiscrepancyRow {
  @ForeignKey(() => Run, { name: 'discrepancy_run_fk' })
  @PrimaryColumn({ name: 'run_id', type: 'uuid' })
  declare runId: string;

  @PrimaryColumn({ name: 'branch', type: 'text' })
  declare branch: string;

  @PrimaryColumn({ name: 'seq', type: 'integer' })
  declare seq: number;

  @PrimaryColumn({ name: 'what', type: 'text' })
  declare what: string;

  @PrimaryColumn({ name: 'computed_by', type: 'text' })
  declare computedBy: string;

  @Column({ name: 'recorded_by', type: 'text' })
  declare recordedBy: string;

  @Column({ name: 'recorded', type: 'text' })
  declare recorded: string;

  @Column({ name: 'computed', type: 'text' })
  declare computed: string;

  @Column({ name: 'found_at', type: 'timestamptz' })
  declare foundAt: Date;
}
