import { createHash, randomBytes } from 'node:crypto';
import type { DataSource, EntityManager } from 'typeorm';
import { IsNull, Not } from 'typeorm';
import { v7 as uuidv7 } from 'uuid';
import { SessionEnded } from '../http/problem';
import { RefreshToken, Session } from './access.entity';

export interface IssuedRefreshToken {
  readonly token: string;
  readonly expiresAt: Date;
}

const lifetimeMs = 30 * 24 * 60 * 60 * 1000;
/** How long an answer that got lost may be asked for again. */
const lostAnswerMs = 60 * 1000;

/**
 * Refresh tokens of one use each. Using one that was used before ends the whole session, for then two hold it; except
 * that an answer may get lost: until one of its successors is first used, for 60 s, from the same tablet, the token
 * gives another successor.
 */
export class RefreshTokens {
  constructor(
    private readonly database: DataSource,
    private readonly clock: () => Date,
  ) {}

  /** Opens a session. */
  async open(personId: string, tabletId: string | undefined): Promise<IssuedRefreshToken> {
    return this.database.transaction(async (manager) => {
      const session = { id: uuidv7(), personId, tabletId: tabletId ?? null, openedAt: this.clock() };
      await manager.insert(Session, session);
      return this.issue(manager, session.id, null);
    });
  }

  /** Takes a token and gives its successor. Throws `SessionEnded`. */
  async rotate(
    token: string | undefined,
    tabletId: string | undefined,
  ): Promise<{ personId: string; issued: IssuedRefreshToken }> {
    // A reuse ends the session: that must stay written, so the refusal is thrown after the transaction.
    const outcome = await this.database.transaction((manager) => this.tryRotate(manager, token, tabletId));
    if (outcome === undefined) throw new SessionEnded('The session has ended. Sign in again.');
    return outcome;
  }

  /** Ends the token's session. */
  async end(token: string | undefined): Promise<void> {
    if (token === undefined) return;
    const found = await this.database.getRepository(RefreshToken).findOneBy({ tokenHash: hashOf(token) });
    if (found !== null) await this.endSession(this.database.manager, found.sessionId, 'signed-out');
  }

  private async tryRotate(manager: EntityManager, token: string | undefined, tabletId: string | undefined) {
    if (token === undefined) return undefined;
    const known = await manager.findOneBy(RefreshToken, { tokenHash: hashOf(token) });
    if (known === null) return undefined;
    // One at a time within a session: the row is the family's lock.
    const session = await manager.findOne(Session, {
      where: { id: known.sessionId, endedAt: IsNull() },
      lock: { mode: 'pessimistic_write' },
    });
    const now = this.clock();
    const used = await manager.findOneBy(RefreshToken, { id: known.id });
    if (session === null || used === null || used.expiresAt <= now) return undefined;
    if (!(await this.mayStillBeUsed(manager, used, session, tabletId, now))) {
      await this.endSession(manager, session.id, 'token-reused');
      return undefined;
    }
    if (used.usedAt === null) await manager.update(RefreshToken, { id: used.id }, { usedAt: now });
    return { personId: session.personId, issued: await this.issue(manager, session.id, used.id) };
  }

  private async mayStillBeUsed(
    manager: EntityManager,
    token: RefreshToken,
    session: Session,
    tabletId: string | undefined,
    now: Date,
  ): Promise<boolean> {
    if (token.usedAt === null) return !(await this.hasUsedSibling(manager, token));
    const isInTime = now.getTime() - token.usedAt.getTime() <= lostAnswerMs;
    const isSameTablet = session.tabletId === (tabletId ?? null);
    return isInTime && isSameTablet && !(await this.hasUsedSuccessor(manager, token.id));
  }

  /** Whether another answer to the same token was taken up instead of this one. */
  private async hasUsedSibling(manager: EntityManager, token: RefreshToken): Promise<boolean> {
    return token.predecessorId !== null && (await this.hasUsedSuccessor(manager, token.predecessorId));
  }

  private hasUsedSuccessor(manager: EntityManager, predecessorId: string): Promise<boolean> {
    return manager.existsBy(RefreshToken, { predecessorId, usedAt: Not(IsNull()) });
  }

  private async issue(
    manager: EntityManager,
    sessionId: string,
    predecessorId: string | null,
  ): Promise<IssuedRefreshToken> {
    const token = randomBytes(32).toString('base64url');
    const issuedAt = this.clock();
    const expiresAt = new Date(issuedAt.getTime() + lifetimeMs);
    const row = { id: uuidv7(), sessionId, predecessorId, tokenHash: hashOf(token), issuedAt, expiresAt };
    await manager.insert(RefreshToken, row);
    return { token, expiresAt };
  }

  private async endSession(manager: EntityManager, id: string, because: Session['endedBecause']): Promise<void> {
    await manager.update(Session, { id, endedAt: IsNull() }, { endedAt: this.clock(), endedBecause: because });
  }
}

/** A random token of 256 bits needs no slow hash. */
function hashOf(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
