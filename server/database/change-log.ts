import type { EntityManager } from 'typeorm';
import type { ChangedKind } from './change-log.entity';

/** Any number that no other advisory lock of ours has. */
const changeCounterLock = 4_310_001;

/**
 * Notes that something which tablets pull has changed, inside the transaction that changes it. The lock is held until
 * that transaction commits: positions become visible in their own order, so that a cursor never runs past a change that
 * commits later. Call it last, to hold it briefly.
 */
export async function noteChange(manager: EntityManager, kind: ChangedKind, itemId: string): Promise<void> {
  await manager.query('SELECT pg_advisory_xact_lock($1)', [changeCounterLock]);
  await manager.query(
    `WITH next AS (UPDATE change_counter SET position = position + 1 WHERE id = 1 RETURNING position)
     INSERT INTO change_log (position, kind, item_id) SELECT position, $1, $2 FROM next`,
    [kind, itemId],
  );
}
