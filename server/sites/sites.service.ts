import { In, type EntityManager } from 'typeorm';
import { Site } from './sites.entity';

/** A site as tablets know it. */
export interface SiteOnTheWire {
  readonly id: string;
  readonly name: string;
  readonly elevationM: number;
}

/** The sites, or those of these ids. */
export async function sitesForPull(manager: EntityManager, ids?: readonly string[]): Promise<readonly SiteOnTheWire[]> {
  const sites = await manager.find(Site, {
    ...(ids === undefined ? {} : { where: { id: In(ids) } }),
    order: { name: 'ASC', id: 'ASC' },
  });
  return sites.map(({ id, name, elevationM }) => ({ id, name, elevationM }));
}
