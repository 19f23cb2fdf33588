import type { Request } from 'express';
import { everyRole, openRoute, route, type Reply, type Route } from '../http/route';
import { RefreshRequest, SessionAnswer, SignInRequest, TabletAnswer, TabletRequest } from './access.dto';
import type { AccessService, SignedIn } from './access.service';
import { clearRefreshCookie, readRefreshCookie, setRefreshCookie, type Reached } from './refresh-cookie';
import type { Tablets } from './tablets';

const small = 16 * 1024;

export function accessRoutes(access: AccessService, tablets: Tablets, reached: Reached): Route[] {
  const answer = (req: Request, signedIn: SignedIn): Reply => {
    setRefreshCookie(req, signedIn.refresh, reached);
    return { status: 200, json: sessionAnswer(signedIn) };
  };
  return [
    openRoute(
      'post',
      '/api/session',
      {
        summary: 'Sign in with a name and a password.',
        body: { kind: 'json', dto: SignInRequest, limitBytes: small },
        answers: { 200: SessionAnswer },
      },
      async ({ req, body }) => answer(req, await access.signIn(body)),
    ),
    openRoute(
      'post',
      '/api/session/refresh',
      {
        summary: 'Get a new access token for the refresh cookie, which is replaced.',
        body: { kind: 'json', dto: RefreshRequest, limitBytes: small },
        answers: { 200: SessionAnswer },
      },
      async ({ req, body }) => answer(req, await access.refresh(readRefreshCookie(req), body.tablet)),
    ),
    openRoute('delete', '/api/session', { summary: 'Sign out.', answers: { 204: 'Signed out.' } }, async ({ req }) => {
      await access.signOut(readRefreshCookie(req));
      clearRefreshCookie(req, reached);
      return { status: 204 };
    }),
    route(
      'post',
      '/api/tablets',
      // In the demo anyone may try it on a tablet of their own.
      reached.isDemo ? everyRole : ['lead', 'manager'],
      {
        summary: 'Enrol a tablet by its public key.',
        body: { kind: 'json', dto: TabletRequest, limitBytes: small },
        answers: { 201: TabletAnswer },
      },
      async ({ body }, person) => {
        const { id, label } = await tablets.enrol(body, person.personId);
        return { status: 201, json: { id, label } satisfies TabletAnswer };
      },
    ),
  ];
}

function sessionAnswer({ accessToken, expiresInS, person }: SignedIn): SessionAnswer {
  const { id, name, displayName, role, siteId } = person;
  return { accessToken, expiresInS, person: { id, name, displayName, role, siteId } };
}
