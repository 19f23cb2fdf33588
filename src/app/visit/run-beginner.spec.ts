import 'fake-indexeddb/auto';
import { TestBed } from '@angular/core/testing';
import { contentHash, verifyChain } from '../../../procedures/engine';
import { crankcaseValveSeal } from '../../../procedures/library';
import { OfflineStore } from '../core/offline-store';
import { RunJournal } from '../core/run-journal';
import { closeStores, coreForSpecs, registeredTablet, workOffline } from '../core/testing/core-for-specs';
import type { PublishedProcedure, Visit } from '../core/wire';
import { RunBeginner } from './run-beginner';

const published: PublishedProcedure = {
  id: crankcaseValveSeal.id,
  version: 1,
  status: 'published',
  contentHash: contentHash(crankcaseValveSeal),
  publishedAt: '2026-11-12T08:00:00Z',
  publishedBy: 'R. Adeyemi',
  document: crankcaseValveSeal,
};
const visit: Visit = {
  id: 'v-1',
  siteId: 's-ossenholt',
  vin: '1ZZBT4CK4LR204817',
  repairOrder: '4417',
  odometer: { text: '84210', unit: 'km' },
  concern: 'Whistle at idle',
  codes: ['P0068'],
  car: { make: 'Merrow', model: 'Heron', colour: 'silver', displacementL: '1.6' },
  openedBy: 'p-okafor',
  openedAt: 1,
  changedAt: 1,
};

async function ready({ hasSite = true, isRegistered = true } = {}) {
  const { server } = coreForSpecs();
  const store = TestBed.inject(OfflineStore);
  if (isRegistered) await registeredTablet();
  if (hasSite) await store.sites.put({ id: 's-ossenholt', name: 'Ossenholt', elevationM: 640 });
  await workOffline(server);
  return { store, beginner: TestBed.inject(RunBeginner), journal: TestBed.inject(RunJournal) };
}

describe('RunBeginner', () => {
  afterEach(() => closeStores());

  it('writes header and first events, so that the run can be read without anything else', async () => {
    const { beginner, journal } = await ready();
    const begun = await beginner.begin(visit, published, 'cold');
    const stored = (await journal.load((begun as { runId: string }).runId))!;
    expect(stored.header).toMatchObject({
      procedureId: 'crankcase-valve-seal',
      version: 1,
      contentHash: published.contentHash,
      visitId: 'v-1',
      kind: 'real',
      half: 'cold',
    });
    expect(verifyChain(stored.header, stored.events).ok).toBe(true);
    expect(stored.events.map(({ type }) => type)).toEqual(['opened', 'step-claimed']);
    expect(stored.events[0]!.data).toMatchObject({
      siteName: 'Ossenholt',
      person: 'I. Okafor',
      visit: { repairOrder: '4417', car: 'Merrow Heron, silver' },
      inputs: { elevation: { text: '640', unit: 'm' } },
    });
    expect(stored.row.summary).toMatchObject({ status: 'open', current: { number: '1' }, half: 'cold' });
  });

  it('pairs the warm half with the cold one, and a further cold one with none', async () => {
    const { store, beginner } = await ready();
    for (const half of ['cold', 'warm', 'cold'] as const) {
      expect(await beginner.begin(visit, published, half)).toMatchObject({ ok: true });
    }
    const headers = (await store.runs.orderBy('runId').toArray()).map(({ header }) => header);
    expect(headers.map(({ half }) => half)).toEqual(['cold', 'warm', 'cold']);
    expect(headers[1]!.pairId).toBe(headers[0]!.pairId);
    expect(headers[2]!.pairId).not.toBe(headers[0]!.pairId);
  });

  it('gives a procedure that is no pair neither half nor pair', async () => {
    const { store, beginner } = await ready();
    await beginner.begin(visit, published, undefined);
    const [row] = await store.runs.toArray();
    expect([row!.header.half, row!.header.pairId]).toEqual([undefined, undefined]);
  });

  it.each([
    [{ hasSite: false }, 'The site of this visit is not on the tablet yet: it comes with the next sync.'],
    [{ isRegistered: false }, 'This tablet is not registered yet.'],
  ])('begins nothing with %o, and says why', async (lacking, message) => {
    const { store, beginner } = await ready(lacking);
    expect(await beginner.begin(visit, published, 'cold')).toEqual({ ok: false, message });
    expect([await store.runs.count(), await store.events.count()]).toEqual([0, 0]);
  });
});
