import { In, type EntityManager } from 'typeorm';
import { Instrument } from './gear.entity';

/** An instrument as tablets know it. */
export type GearOnTheWire = Readonly<
  Pick<Instrument, 'id' | 'siteId' | 'kind' | 'label' | 'serial' | 'shows' | 'dueOn' | 'lastCheckedOn' | 'inUse'>
>;

/** The gear of all sites, or that of these ids. */
export async function gearForPull(manager: EntityManager, ids?: readonly string[]): Promise<readonly GearOnTheWire[]> {
  const gear = await manager.find(Instrument, {
    ...(ids === undefined ? {} : { where: { id: In(ids) } }),
    order: { siteId: 'ASC', label: 'ASC', id: 'ASC' },
  });
  return gear.map(({ id, siteId, kind, label, serial, shows, dueOn, lastCheckedOn, inUse }) => {
    return { id, siteId, kind, label, serial, shows, dueOn, lastCheckedOn, inUse };
  });
}
