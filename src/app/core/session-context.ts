import { HttpContext, HttpContextToken } from '@angular/common/http';

/** Set on the calls that make or end a session: they carry no token and no answer of theirs starts a refresh. */
export const withoutSession = new HttpContextToken(() => false);

/** Options of such a call. */
export const outsideSession = (): { context: HttpContext } => ({
  context: new HttpContext().set(withoutSession, true),
});
