import type { DataSource } from 'typeorm';
import { LockedOut } from '../http/problem';

/** The wrong try that locks. */
const lockingTry = 5;
const firstLockS = 30;
const longestLockS = 15 * 60;
/** After this long without a try the count begins anew. */
const forgottenAfterS = 24 * 60 * 60;

/**
 * Counts a try against a name before the password is looked at, so that many at once can not slip through together.
 * The fifth wrong one locks the name for 30 s, each further one twice as long, 15 min at most. Throws `LockedOut` while it is locked.
 */
export async function countTry(database: DataSource, name: string, now: Date): Promise<void> {
  const counted: unknown[] = await database.query(
    `INSERT INTO sign_in_attempt AS tried (name, failures, last_at, locked_until) VALUES ($1, 1, $2, $2)
     ON CONFLICT (name) DO UPDATE SET
       failures = CASE WHEN tried.last_at < $2 - make_interval(secs => $6) THEN 1 ELSE tried.failures + 1 END,
       last_at = $2,
       locked_until = CASE
         WHEN tried.last_at < $2 - make_interval(secs => $6) OR tried.failures + 1 < $3 THEN $2
         ELSE $2 + make_interval(secs => least($4 * power(2, least(tried.failures + 1 - $3, 20)), $5))
       END
     WHERE tried.locked_until <= $2
     RETURNING 1`,
    [name, now, lockingTry, firstLockS, longestLockS, forgottenAfterS],
  );
  if (counted.length > 0) return;
  const [row] = await database.query<{ locked_until: Date }[]>(
    'SELECT locked_until FROM sign_in_attempt WHERE name = $1',
    [name],
  );
  throw new LockedOut(Math.max(1, Math.ceil(((row?.locked_until ?? now).getTime() - now.getTime()) / 1000)));
}

/** Forgets a name's wrong tries after a right one. */
export async function forgetTries(database: DataSource, name: string): Promise<void> {
  await database.query('DELETE FROM sign_in_attempt WHERE name = $1', [name]);
}
