import 'fake-indexeddb/auto';
import { TestBed } from '@angular/core/testing';
import { provideRouter, Router } from '@angular/router';
import { contentHash } from '../../../procedures/engine';
import { crankcaseValveSeal } from '../../../procedures/library';
import { OfflineStore } from '../core/offline-store';
import {
  closeStores,
  coreForSpecs,
  eventually,
  registeredTablet,
  startOfDay,
  workOffline,
} from '../core/testing/core-for-specs';
import type { PublishedProcedure, Visit, VisitRun } from '../core/wire';
import { byRole, textOf } from '../shared/testing/by-role';
import { VisitPage } from './visit-page';

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
const elsewhere: VisitRun = {
  runId: '018f0000-0000-7000-8000-00000000e15e',
  visitId: 'v-1',
  procedureId: crankcaseValveSeal.id,
  procedureTitle: crankcaseValveSeal.title,
  half: 'cold',
  pairId: 'pair-there',
  personName: 'R. Adeyemi',
  tabletLabel: 'B2',
  openedAt: startOfDay - 3_600_000,
  status: 'open',
};

async function shown(...told: VisitRun[]) {
  const { server } = coreForSpecs([provideRouter([])]);
  const store = TestBed.inject(OfflineStore);
  await registeredTablet();
  await store.sites.put({ id: 's-ossenholt', name: 'Ossenholt', elevationM: 640 });
  await store.visits.put(visit);
  await store.procedures.put(published);
  await store.toldRuns.bulkPut(told);
  await workOffline(server);
  const gone = jest.spyOn(TestBed.inject(Router), 'navigate').mockResolvedValue(true);
  const fixture = TestBed.createComponent(VisitPage);
  fixture.componentRef.setInput('id', 'v-1');
  fixture.autoDetectChanges();
  const root = fixture.nativeElement as HTMLElement;
  await eventually(() => expect(textOf(root)).toContain('Procedures that fit'));
  const press = async (name: RegExp) => {
    byRole(root, 'button', name).click();
    await fixture.whenStable();
  };
  const opened = async () => (await store.events.toArray()).filter(({ type }) => type === 'opened');
  return { root, store, press, gone, opened, text: () => textOf(root) };
}

describe('VisitPage', () => {
  afterEach(() => closeStores());

  it('begins a half at once when no other run of it is known', async () => {
    const { press, gone, opened } = await shown({ ...elsewhere, half: 'warm' });
    await press(/Start the cold half/);
    await eventually(() => expect(gone).toHaveBeenCalled());
    expect((await opened()).map(({ data }) => data)).toEqual([
      expect.not.objectContaining({ again: expect.anything() }),
    ]);
  });

  it('says who began the half, when, on which tablet and how it stands, and begins nothing', async () => {
    const { press, opened, text } = await shown(elsewhere);
    await press(/Cold half again/);
    await eventually(() => expect(text()).toContain('The cold half was begun on this visit already'));
    expect(text()).toMatch(/R\. Adeyemi, today \d+:00, on tablet B2\s*still open\s*It goes on there\./);
    expect(await opened()).toEqual([]);
    await press(/Leave it at that/);
    expect(text()).not.toContain('begun on this visit already');
  });

  it('begins another with a reason alone, which stands in the record with the runs that were known', async () => {
    const { root, press, gone, opened } = await shown(elsewhere);
    await press(/Cold half again/);
    await eventually(() => press(/Begin another/));
    expect(textOf(byRole(root, 'alert'))).toBe('Say why another is begun: it is kept with the run.');
    expect(gone).not.toHaveBeenCalled();
    await press(/Repaired since/);
    await press(/Begin another/);
    await eventually(() => expect(gone).toHaveBeenCalled());
    expect((await opened()).map(({ data }) => data)).toEqual([
      expect.objectContaining({ again: { because: 'Repaired since', besides: [elsewhere.runId] } }),
    ]);
  });

  it('leads to the run when it is on this tablet', async () => {
    const { root, press, gone, store } = await shown();
    await press(/Start the cold half/);
    await eventually(() => expect(gone).toHaveBeenCalled());
    const [run] = await store.runs.toArray();
    await eventually(() => press(/Cold half again/));
    expect(byRole(root, 'link', /Open it/).getAttribute('href')).toBe(`/run/${run!.runId}`);
  });

  it('says that a half was begun twice once the other run comes to be known', async () => {
    const { root, press, gone, store, text } = await shown();
    await press(/Start the cold half/);
    await eventually(() => expect(gone).toHaveBeenCalled());
    expect(text()).not.toContain('begun twice');
    await store.toldRuns.put(elsewhere);
    await eventually(() => expect(text()).toContain('The cold half was begun twice. Neither knew of the other.'));
    expect(textOf(root.querySelector('bay-twice-begun')!)).toMatch(/I\. Okafor, today .* on this tablet: still open/);
    expect(textOf(root.querySelector('bay-twice-begun')!)).toMatch(/R\. Adeyemi, today .* on tablet B2: still open/);
  });

  it('pairs a warm half with the cold one of another tablet', async () => {
    const { press, gone, store } = await shown({ ...elsewhere, status: 'closed' });
    await press(/Start the warm half/);
    await eventually(() => expect(gone).toHaveBeenCalled());
    expect((await store.runs.toArray()).map(({ header }) => header.pairId)).toEqual(['pair-there']);
  });
});
