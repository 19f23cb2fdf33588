import type { HttpInterceptorFn } from '@angular/common/http';
import { inject } from '@angular/core';
import { catchError, from, switchMap, throwError } from 'rxjs';
import { ApiProblem } from './api-problem';
import { Session } from './session';
import { withoutSession } from './session-context';

/**
 * Puts the access token on calls to the server. Policy: an expired or refused token (401) is refreshed once through
 * the cookie and the call is sent again; whatever that answers stands. No network changes nothing about who is
 * signed in.
 */
export const sessionInterceptor: HttpInterceptorFn = (request, next) => {
  if (!request.url.startsWith('/api/') || request.context.get(withoutSession)) return next(request);
  const session = inject(Session);
  const send = (token: string | undefined) =>
    next(token === undefined ? request : request.clone({ setHeaders: { authorization: `Bearer ${token}` } }));
  return from(session.usableToken()).pipe(
    switchMap((token) => send(token)),
    catchError((error: unknown) => {
      if (!(error instanceof ApiProblem) || error.status !== 401) return throwError(() => error);
      return from(session.refresh()).pipe(
        switchMap((token) => (token === undefined ? throwError(() => error) : send(token))),
      );
    }),
  );
};
