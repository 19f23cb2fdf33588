import 'fake-indexeddb/auto';
import { TestBed } from '@angular/core/testing';
import type { ProcedureDocument } from '../../../procedures/document';
import { plugHold } from '../../../procedures/document/testing/plug-hold';
import { walkRound } from '../../../procedures/document/testing/walk-round';
import { contentHash, openRun, type EventDraft, type RunHeader } from '../../../procedures/engine';
import { openingFacts } from '../../../procedures/engine/testing/run-walk';
import { roundTo } from '../../../procedures/engine/testing/walk-round-walk';
import { OfflineStore } from '../core/offline-store';
import { procedureCompiler } from '../core/procedure-compiler';
import { RunJournal } from '../core/run-journal';
import { closeStores, coreForSpecs, okafor, registeredTablet, workOffline } from '../core/testing/core-for-specs';
import type { Person, PublishedProcedure } from '../core/wire';
import { RunOpener } from './run-opener';

const header: RunHeader = {
  runId: '018f0000-0000-7000-8000-00000000bbbb',
  procedureId: walkRound.id,
  version: 1,
  contentHash: contentHash(walkRound),
  visitId: 'v-1',
  siteId: 's-ossenholt',
  kind: 'real',
};

function published(document: ProcedureDocument, status: PublishedProcedure['status'] = 'published') {
  const { id } = document;
  const words = { publishedAt: '2026-11-12T09:00:00Z', publishedBy: 'R. Adeyemi' };
  return { id, version: 1, status, contentHash: contentHash(document), document, ...words };
}

/** A tablet with a run of the walk-round on it, which calls the plug hold test. */
async function tabletWithRun(person: Person = okafor, more: readonly EventDraft[] = []): Promise<OfflineStore> {
  const { server } = coreForSpecs();
  await registeredTablet();
  await workOffline(server, person);
  const store = TestBed.inject(OfflineStore);
  await store.procedures.bulkPut([published(walkRound), published(plugHold, 'withdrawn')]);
  const opening = openRun(await TestBed.inject(procedureCompiler)(walkRound), openingFacts);
  if (!opening.ok) throw new Error(opening.message);
  await TestBed.inject(RunJournal).open(header, [...opening.drafts, ...more]);
  TestBed.inject(RunJournal).release(header.runId);
  return store;
}

describe('RunOpener', () => {
  afterEach(() => closeStores());

  it('writes the called steps in, from the version on the tablet, withdrawn or not', async () => {
    await tabletWithRun();
    const opened = await TestBed.inject(RunOpener).open(header.runId);
    if (!opened.ok) throw new Error(opened.what);
    expect(opened.view.procedure.step('plug-test-press')).toMatchObject({ number: '4.3' });
    expect(contentHash(opened.view.procedure.authored)).toBe(header.contentHash);
  });

  it('names the called version that is not on the tablet, and shows no run', async () => {
    const store = await tabletWithRun();
    await store.procedures.delete([plugHold.id, 1]);
    expect(await TestBed.inject(RunOpener).open(header.runId)).toEqual({
      ok: false,
      why: 'no-procedure',
      what: 'plug-hold, version 1, which is called in it',
    });
    await expect(TestBed.inject(procedureCompiler)(walkRound)).rejects.toThrow(
      'It calls plug-hold, version 1, which is not on this tablet yet. It comes with the next sync.',
    );
  });

  it('opens a real run for a manager only where it waits for a release', async () => {
    const manager: Person = { ...okafor, id: 'p-lindqvist', role: 'manager' };
    await tabletWithRun(manager);
    expect(await TestBed.inject(RunOpener).open(header.runId)).toMatchObject({ ok: false, why: 'not-allowed' });
    closeStores();
    TestBed.resetTestingModule();
    const drafts = roundTo('show').events.slice(2);
    const looked = { type: 'verified', data: { step: 'show', by: 'brandt' } } as const;
    const walked = drafts.map(({ type, data }) => ({ type, data }) as EventDraft);
    await tabletWithRun(manager, [...walked, looked]);
    expect(await TestBed.inject(RunOpener).open(header.runId)).toMatchObject({ ok: true });
  });
});
