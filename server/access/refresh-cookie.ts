import type { CookieOptions, Request } from 'express';
import type { IssuedRefreshToken } from './refresh-tokens';

const cookieName = 'bayhand-refresh';
const path = '/api/session';

/** The refresh token of the request's cookie. */
export function readRefreshCookie(req: Request): string | undefined {
  const token: unknown = (req.cookies as Record<string, unknown> | undefined)?.[cookieName];
  return typeof token === 'string' && token !== '' ? token : undefined;
}

/** Gives the browser a refresh token that no script can read and no other site can send. */
export function setRefreshCookie(req: Request, issued: IssuedRefreshToken, isDemo: boolean): void {
  req.res?.cookie(cookieName, issued.token, { ...optionsFor(req, isDemo), expires: issued.expiresAt });
}

export function clearRefreshCookie(req: Request, isDemo: boolean): void {
  req.res?.clearCookie(cookieName, optionsFor(req, isDemo));
}

function optionsFor(req: Request, isDemo: boolean): CookieOptions {
  // A demo on this very machine speaks plain http; everything else must be encrypted, here or by a proxy before us.
  const isPlainLoopback = !req.secure && /^(?:::1|(?:::ffff:)?127\.)/.test(req.socket.remoteAddress ?? '');
  return { httpOnly: true, sameSite: 'strict', path, secure: !(isDemo && isPlainLoopback) };
}
