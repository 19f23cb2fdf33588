import type { DataSource, EntityManager } from 'typeorm';
import { peopleForPull } from '../access/access.service';
import type { ChangedKind } from '../database/change-log.entity';
import { gearForPull } from '../gear/gear.service';
import { publishedProcedures } from '../procedures/procedures.service';
import { sitesForPull } from '../sites/sites.service';
import { visitsForPull } from '../visits/visits.service';
import { cursorText, parseCursor, type Cursor } from './cursor';
import type { PullAnswer } from './sync.dto';
import { runsForPull } from './visit-runs';

/**
 * What changed since a cursor, or everything when there is none or it is from another life of the database. One
 * snapshot: the position is read in it, and positions become visible in their own order, so nothing falls between.
 */
export async function pull(database: DataSource, since: string | undefined, at: Date): Promise<PullAnswer> {
  const from = since === undefined ? undefined : parseCursor(since);
  return database.transaction('REPEATABLE READ', async (manager) => {
    const now = await currentCursor(manager);
    const isDelta = from !== undefined && from.epoch === now.epoch && from.position <= now.position;
    const changed = isDelta ? await changedSince(manager, from) : undefined;
    const ids = (kind: ChangedKind) => (changed === undefined ? undefined : (changed.get(kind) ?? []));
    return {
      cursor: cursorText(now),
      procedures: await publishedProcedures(manager, ids('procedure')),
      sites: await sitesForPull(manager, ids('site')),
      gear: await gearForPull(manager, ids('gear')),
      people: await peopleForPull(manager, ids('person')),
      visits: await visitsForPull(manager, ids('visit')),
      runs: await runsForPull(manager, at, ids('run')),
      notices: [],
    };
  });
}

async function currentCursor(manager: EntityManager): Promise<Cursor> {
  const [row] = await manager.query<{ epoch: string; position: string }[]>(
    'SELECT epoch, position FROM epoch, change_counter',
  );
  if (row === undefined) throw new Error('The database has no epoch.');
  return { epoch: row.epoch, position: BigInt(row.position) };
}

async function changedSince(
  manager: EntityManager,
  { position }: Cursor,
): Promise<Map<ChangedKind, readonly string[]>> {
  const rows = await manager.query<{ kind: ChangedKind; ids: string[] }[]>(
    'SELECT kind, array_agg(DISTINCT item_id) AS ids FROM change_log WHERE position > $1 GROUP BY kind',
    [String(position)],
  );
  return new Map(rows.map(({ kind, ids }) => [kind, ids]));
}
