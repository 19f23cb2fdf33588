import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { Person } from '../access/access.entity';

/** A document that was brought in and checked, and is not published yet. */
@Entity('procedure_draft')
@Index('procedure_draft_procedure', ['procedureId'])
export class ProcedureDraft {
  @PrimaryColumn({ name: 'id', type: 'uuid' })
  declare id: string;

  @Column({ name: 'procedure_id', type: 'text' })
  declare procedureId: string;

  @Column({ name: 'title', type: 'text' })
  declare title: string;

  /** Canonical JSON. */
  @Column({ name: 'document', type: 'text' })
  declare document: string;

  @Column({ name: 'content_hash', type: 'text' })
  declare contentHash: string;

  @ForeignKey(() => Person, { name: 'procedure_draft_imported_by_fk' })
  @Column({ name: 'imported_by', type: 'uuid' })
  declare importedBy: string;

  @Column({ name: 'imported_at', type: 'timestamptz' })
  declare importedAt: Date;

  @Column({ name: 'published_version', type: 'integer', nullable: true })
  declare publishedVersion: number | null;
}

/** A published version. Append-only. */
@Entity('procedure_version')
export class ProcedureVersion {
  @PrimaryColumn({ name: 'procedure_id', type: 'text' })
  declare procedureId: string;

  @PrimaryColumn({ name: 'version', type: 'integer' })
  declare version: number;

  @Column({ name: 'title', type: 'text' })
  declare title: string;

  /** Canonical JSON: what `content_hash` is the SHA-256 of. */
  @Column({ name: 'document', type: 'text' })
  declare document: string;

  @Column({ name: 'content_hash', type: 'text' })
  declare contentHash: string;

  @ForeignKey(() => Person, { name: 'procedure_version_published_by_fk' })
  @Column({ name: 'published_by', type: 'uuid' })
  declare publishedBy: string;

  @Column({ name: 'published_at', type: 'timestamptz' })
  declare publishedAt: Date;
}

/** That a version must start no new run. Append-only. */
@Entity('procedure_withdrawal')
@ForeignKey(() => ProcedureVersion, ['procedureId', 'version'], ['procedureId', 'version'], {
  name: 'procedure_withdrawal_version_fk',
})
export class ProcedureWithdrawal {
  @PrimaryColumn({ name: 'procedure_id', type: 'text' })
  declare procedureId: string;

  @PrimaryColumn({ name: 'version', type: 'integer' })
  declare version: number;

  @Column({ name: 'reason', type: 'text' })
  declare reason: string;

  @ForeignKey(() => Person, { name: 'procedure_withdrawal_withdrawn_by_fk' })
  @Column({ name: 'withdrawn_by', type: 'uuid' })
  declare withdrawnBy: string;

  @Column({ name: 'withdrawn_at', type: 'timestamptz' })
  declare withdrawnAt: Date;
}
