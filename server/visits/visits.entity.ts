import { Column, Entity, ForeignKey, PrimaryColumn } from 'typeorm';
import { Site } from '../sites/sites.entity';

/** A visit as it stands: the latest of its revisions. */
@Entity('visit')
export class VisitRow {
  @PrimaryColumn({ name: 'id', type: 'uuid' })
  declare id: string;

  @ForeignKey(() => Site, { name: 'visit_site_fk' })
  @Column({ name: 'site_id', type: 'uuid' })
  declare siteId: string;

  /** Canonical JSON. */
  @Column({ name: 'document', type: 'text' })
  declare document: string;

  @Column({ name: 'content_hash', type: 'text' })
  declare contentHash: string;

  /** Device clock, milliseconds since 1970. */
  @Column({ name: 'changed_at', type: 'bigint' })
  declare changedAt: string;
}

/** Every state of a visit that a tablet ever sent, the losing ones too. Append-only. */
@Entity('visit_revision')
export class VisitRevision {
  @PrimaryColumn({ name: 'visit_id', type: 'uuid' })
  declare visitId: string;

  @PrimaryColumn({ name: 'content_hash', type: 'text' })
  declare contentHash: string;

  @Column({ name: 'document', type: 'text' })
  declare document: string;

  @Column({ name: 'changed_at', type: 'bigint' })
  declare changedAt: string;

  /** Absent for what was seeded. */
  @Column({ name: 'tablet_id', type: 'uuid', nullable: true })
  declare tabletId: string | null;

  @Column({ name: 'received_at', type: 'timestamptz' })
  declare receivedAt: Date;
}
