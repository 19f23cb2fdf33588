import { Check, Column, Entity, ForeignKey, Index, PrimaryColumn, Unique } from 'typeorm';
import type { Role } from '../http/route';
import { Site } from '../sites/sites.entity';

/** Someone who signs in. */
@Entity('person')
@Unique('person_name', ['name'])
@Check('person_role', `role IN ('technician', 'lead', 'apprentice', 'manager')`)
export class Person {
  @PrimaryColumn({ name: 'id', type: 'uuid' })
  declare id: string;

  @ForeignKey(() => Site, { name: 'person_site_fk' })
  @Column({ name: 'site_id', type: 'uuid' })
  declare siteId: string;

  /** The sign-in name, in small letters. */
  @Column({ name: 'name', type: 'text' })
  declare name: string;

  @Column({ name: 'display_name', type: 'text' })
  declare displayName: string;

  @Column({ name: 'role', type: 'text' })
  declare role: Role;

  /** argon2id, with its own salt and costs in the text. */
  @Column({ name: 'password_hash', type: 'text' })
  declare passwordHash: string;

  @Column({ name: 'is_active', type: 'boolean' })
  declare isActive: boolean;
}

/** How often a name was tried in vain. Kept for unknown names too, so that a lock-out tells nothing about who exists. */
@Entity('sign_in_attempt')
export class SignInAttempt {
  @PrimaryColumn({ name: 'name', type: 'text' })
  declare name: string;

  @Column({ name: 'failures', type: 'integer' })
  declare failures: number;

  @Column({ name: 'last_at', type: 'timestamptz' })
  declare lastAt: Date;

  @Column({ name: 'locked_until', type: 'timestamptz' })
  declare lockedUntil: Date;
}

/** A tablet that may push. */
@Entity('tablet')
export class Tablet {
  @PrimaryColumn({ name: 'id', type: 'uuid' })
  declare id: string;

  @Column({ name: 'label', type: 'text' })
  declare label: string;

  @Column({ name: 'public_key', type: 'json' })
  declare publicKey: { readonly kty: string; readonly crv: string; readonly x: string; readonly y: string };

  @ForeignKey(() => Person, { name: 'tablet_enrolled_by_fk' })
  @Column({ name: 'enrolled_by', type: 'uuid' })
  declare enrolledBy: string;

  @Column({ name: 'enrolled_at', type: 'timestamptz' })
  declare enrolledAt: Date;
}

/** One sign-in and all the refresh tokens that follow from it: the family. */
@Entity('session')
@Index('session_person', ['personId'])
export class Session {
  @PrimaryColumn({ name: 'id', type: 'uuid' })
  declare id: string;

  @ForeignKey(() => Person, { name: 'session_person_fk' })
  @Column({ name: 'person_id', type: 'uuid' })
  declare personId: string;

  @Column({ name: 'tablet_id', type: 'uuid', nullable: true })
  declare tabletId: string | null;

  @Column({ name: 'opened_at', type: 'timestamptz' })
  declare openedAt: Date;

  @Column({ name: 'ended_at', type: 'timestamptz', nullable: true })
  declare endedAt: Date | null;

  @Column({ name: 'ended_because', type: 'text', nullable: true })
  declare endedBecause: 'signed-out' | 'token-reused' | null;
}

/** A refresh token, known by its hash alone. */
@Entity('refresh_token')
@Unique('refresh_token_hash', ['tokenHash'])
@Index('refresh_token_session', ['sessionId'])
export class RefreshToken {
  @PrimaryColumn({ name: 'id', type: 'uuid' })
  declare id: string;

  @ForeignKey(() => Session, { name: 'refresh_token_session_fk' })
  @Column({ name: 'session_id', type: 'uuid' })
  declare sessionId: string;

  @Column({ name: 'predecessor_id', type: 'uuid', nullable: true })
  declare predecessorId: string | null;

  @Column({ name: 'token_hash', type: 'text' })
  declare tokenHash: string;

  @Column({ name: 'issued_at', type: 'timestamptz' })
  declare issuedAt: Date;

  @Column({ name: 'expires_at', type: 'timestamptz' })
  declare expiresAt: Date;

  /** When a successor was first asked for with it. */
  @Column({ name: 'used_at', type: 'timestamptz', nullable: true })
  declare usedAt: Date | null;
}
