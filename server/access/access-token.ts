import jwt from 'jsonwebtoken';
import { everyRole, type Principal, type Role } from '../http/route';

export const accessTokenSeconds = 15 * 60;
const claims = { issuer: 'bayhand', audience: 'bayhand-api' } as const;

/** Makes and reads the short tokens that the app holds in memory. Times come from the given clock. */
export class AccessTokens {
  constructor(
    private readonly secret: string,
    private readonly clock: () => Date,
  ) {}

  make(person: Principal): string {
    const { personId, displayName, role, siteId } = person;
    const issuedAtS = Math.floor(this.clock().getTime() / 1000);
    return jwt.sign(
      { name: displayName, role, site: siteId, iat: issuedAtS, exp: issuedAtS + accessTokenSeconds },
      this.secret,
      { algorithm: 'HS256', subject: personId, ...claims },
    );
  }

  /** Who the Authorization header speaks for; undefined when it holds no token of ours or an old one. */
  read(authorization: string | undefined): Principal | undefined {
    const token = /^Bearer (\S+)$/.exec(authorization ?? '')?.[1];
    if (token === undefined) return undefined;
    try {
      const clockTimestamp = Math.floor(this.clock().getTime() / 1000);
      const content = jwt.verify(token, this.secret, { algorithms: ['HS256'], clockTimestamp, ...claims });
      return principalOf(content);
    } catch (error) {
      // Expired, not yet valid, tampered with or no token at all: all the same to the caller.
      if (error instanceof jwt.JsonWebTokenError) return undefined;
      throw error;
    }
  }
}

function principalOf(content: jwt.JwtPayload | string): Principal | undefined {
  if (typeof content === 'string') return undefined;
  const { sub, name, role, site } = content as Record<string, unknown>;
  if (typeof sub !== 'string' || typeof name !== 'string' || typeof site !== 'string' || !isRole(role))
    return undefined;
  return { personId: sub, displayName: name, role, siteId: site };
}

function isRole(role: unknown): role is Role {
  return everyRole.includes(role as Role);
}
