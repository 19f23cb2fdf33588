import type { CookieOptions, Request } from 'express';
import type { IssuedRefreshToken } from './refresh-tokens';

const cookieName = 'bayhand-refresh';
const path = '/api/session';

/** The refresh token of the request's cookie. */
export function readRefreshCookie(req: Request): string | undefined {
  const token: unknown = (req.cookies as Record<string, unknown> | undefined)?.[cookieName];
  return typeof token === 'string' && token !== '' ? token : undefined;
}

/** How the browsers reach this server. */
export interface Reached {
  readonly isDemo: boolean;
  /** Whether it is known by an https address, here or at a proxy before it. */
  readonly isHttps: boolean;
}

/** Gives the browser a refresh token that no script can read and no other site can send. */
export function setRefreshCookie(req: Request, issued: IssuedRefreshToken, reached: Reached): void {
  req.res?.cookie(cookieName, issued.token, { ...optionsFor(req, reached), expires: issued.expiresAt });
}

export function clearRefreshCookie(req: Request, reached: Reached): void {
  req.res?.clearCookie(cookieName, optionsFor(req, reached));
}

function optionsFor(req: Request, { isDemo, isHttps }: Reached): CookieOptions {
  // A demo on this very machine speaks plain http; everything else must be encrypted, here or by a proxy before us.
  const isPlainLoopback = !req.secure && /^(?:::1|(?:::ffff:)?127\.)/.test(req.socket.remoteAddress ?? '');
  return { httpOnly: true, sameSite: 'strict', path, secure: isHttps || !(isDemo && isPlainLoopback) };
}
