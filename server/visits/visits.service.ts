import { In, type DataSource, type EntityManager } from 'typeorm';
import { canonicalJson, sha256Hex } from '../../procedures/engine';
import { noteChange } from '../database/change-log';
import { Invalid } from '../http/problem';
import { validated } from '../http/validated';
import { Site } from '../sites/sites.entity';
import { VisitDto } from './visits.dto';
import { VisitRevision, VisitRow } from './visits.entity';

export type { VisitDto as VisitOnTheWire } from './visits.dto';

/**
 * Visits, made on tablets. Every state that is sent is kept as a revision; the one that was changed last stands (on a
 * tie, the greater hash), whatever order they arrive in.
 */
export class VisitsService {
  constructor(
    private readonly database: DataSource,
    private readonly clock: () => Date,
  ) {}

  /** Takes one state of a visit in. Throws `Invalid` or `BadRequest` when it is none. */
  async take(sent: unknown, tabletId: string): Promise<void> {
    const visit = validated(VisitDto, sent);
    const document = canonicalJson(sent);
    const row = { document, contentHash: sha256Hex(document), changedAt: String(visit.changedAt) };
    await this.database.transaction(async (manager) => {
      if (!(await manager.existsBy(Site, { id: visit.siteId }))) {
        throw new Invalid('The visit is at no site of ours.', [
          { pointer: '/siteId', detail: 'There is no such site.' },
        ]);
      }
      await manager
        .createQueryBuilder()
        .insert()
        .into(VisitRevision)
        .values({ visitId: visit.id, ...row, tabletId, receivedAt: this.clock() })
        .orIgnore()
        .execute();
      const stands: unknown[] = await manager.query(
        `INSERT INTO visit (id, site_id, document, content_hash, changed_at) VALUES ($1, $2, $3, $4, $5)
         ON CONFLICT (id) DO UPDATE SET site_id = $2, document = $3, content_hash = $4, changed_at = $5
         WHERE (visit.changed_at, visit.content_hash) < ($5, $4)
         RETURNING id`,
        [visit.id, visit.siteId, row.document, row.contentHash, row.changedAt],
      );
      if (stands.length > 0) await noteChange(manager, 'visit', visit.id);
    });
  }
}

/** The visits as they stand, or those of these ids. */
export async function visitsForPull(manager: EntityManager, ids?: readonly string[]): Promise<readonly VisitDto[]> {
  const visits = await manager.find(VisitRow, {
    ...(ids === undefined ? {} : { where: { id: In(ids) } }),
    order: { id: 'ASC' },
  });
  return visits.map(({ document }) => JSON.parse(document) as VisitDto);
}
