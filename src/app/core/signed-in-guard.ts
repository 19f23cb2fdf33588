import { inject } from '@angular/core';
import { type CanActivateFn, type CanMatchFn, Router } from '@angular/router';
import { Session } from './session';
import type { Role } from './wire';

/** Lets in who is signed in, or goes on without a network; the others come back here after they have signed in. */
export const signedInGuard: CanActivateFn = async (_route, { url }) => {
  const session = inject(Session);
  const router = inject(Router);
  await session.start();
  if (session.isOpen()) return true;
  return router.createUrlTree(['/sign-in'], { queryParams: url === '/' ? {} : { next: url } });
};

/**
 * Lets in the given roles; the others are told that the room is not theirs. It decides before the room's code is
 * loaded. The server checks the same again: this only spares people a room full of refusals.
 */
export const roleGuard =
  (...roles: readonly Role[]): CanMatchFn =>
  async () => {
    const session = inject(Session);
    const router = inject(Router);
    await session.start();
    const person = session.person();
    if (person === undefined) return true;
    return roles.includes(person.role) || router.createUrlTree(['/not-yours']);
  };
