import type { DataSource, EntityManager } from 'typeorm';
import { Person } from '../../access/access.entity';
import { Instrument } from '../../gear/gear.entity';
import { hashPassword } from '../../access/password';
import { Site } from '../../sites/sites.entity';
import { VisitRevision, VisitRow } from '../../visits/visits.entity';
import { canonicalJson, sha256Hex } from '../../../procedures/engine';
import { noteChange } from '../change-log';
import { demoGear, demoPassword, demoPeople, demoSites, demoVisit } from './demo-garage';

/** Fills an empty database with the demo's garage, once; a database in which anyone exists is left as it is. */
export async function seedDemo(database: DataSource, now: Date): Promise<boolean> {
  const passwordHash = await hashPassword(demoPassword);
  return database.transaction(async (manager) => {
    if ((await manager.count(Person)) > 0) return false;
    await manager.insert(Site, demoSites);
    await manager.insert(
      Person,
      demoPeople.map((person) => ({ ...person, passwordHash, isActive: true })),
    );
    const gear = demoGear(now);
    await manager.insert(Instrument, [...gear] as Instrument[]);
    const visitId = await seedVisit(manager, now);
    for (const { id } of demoSites) await noteChange(manager, 'site', id);
    for (const { id } of demoPeople) await noteChange(manager, 'person', id);
    for (const { id } of gear) await noteChange(manager, 'gear', id);
    await noteChange(manager, 'visit', visitId);
    return true;
  });
}

async function seedVisit(manager: EntityManager, now: Date): Promise<string> {
  const visit = demoVisit(now);
  const document = canonicalJson(visit);
  const stands = { document, contentHash: sha256Hex(document), changedAt: String(visit.changedAt) };
  await manager.insert(VisitRow, { id: visit.id, siteId: visit.siteId, ...stands });
  await manager.insert(VisitRevision, { visitId: visit.id, ...stands, tabletId: null, receivedAt: now });
  return visit.id;
}
