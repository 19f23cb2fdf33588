import 'fake-indexeddb/auto';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { provideRouter, Router } from '@angular/router';
import { contentHash } from '../../../procedures/engine';
import { crankcaseValveSeal } from '../../../procedures/library';
import { OfflineStore, PracticeStore } from '../core/offline-store';
import { RunJournal } from '../core/run-journal';
import { Session } from '../core/session';
import { closeStores, coreForSpecs, okafor, rememberPerson } from '../core/testing/core-for-specs';
import type { PublishedProcedure } from '../core/wire';
import { practiceScenarios } from '../shared/practice/practice-scenarios';
import { allByRole, byRole, textOf } from '../shared/testing/by-role';
import { settle } from '../shared/testing/settle';
import { PracticeBayPage } from './practice-bay-page';

const published: PublishedProcedure = {
  id: 'crankcase-valve-seal',
  version: 2,
  status: 'published',
  contentHash: contentHash(crankcaseValveSeal),
  publishedAt: '2026-11-12T08:00:00Z',
  publishedBy: 'R. Adeyemi',
  document: crankcaseValveSeal,
};

describe('the Practice bay', () => {
  let fixture: ComponentFixture<PracticeBayPage>;
  const root = (): HTMLElement => fixture.nativeElement as HTMLElement;

  async function show(...procedures: PublishedProcedure[]): Promise<void> {
    coreForSpecs([provideRouter([{ path: 'run/:runId', children: [] }])]);
    await TestBed.inject(OfflineStore).procedures.bulkPut(procedures);
    await rememberPerson({ ...okafor, role: 'apprentice' });
    void TestBed.inject(Session).start();
    await settle();
    TestBed.inject(Session).goOnOffline();
    fixture = TestBed.createComponent(PracticeBayPage);
    fixture.autoDetectChanges();
    await settle();
  }
  async function start(title: string): Promise<string> {
    byRole(root(), 'button', title).click();
    for (let turns = 0; turns < 50 && TestBed.inject(Router).url === '/'; turns += 1) await settle();
    return TestBed.inject(Router).url.replace('/run/', '');
  }
  afterEach(async () => {
    await settle();
    fixture.destroy();
    closeStores();
  });

  it('is marked as practice: the word in the header and the hatched edge', async () => {
    await show(published);
    expect(root().classList).toContain('practice-edge');
    expect(textOf(root().querySelector('header')!)).toContain('Practice');
  });

  it('offers every scenario by what the driver says, without giving the fault away', async () => {
    await show(published);
    const text = textOf(root());
    for (const { title, story, planted } of practiceScenarios) {
      expect(text).toContain(title);
      expect(text).toContain(story);
      expect(text).not.toContain(planted.fault);
    }
    expect(text).toContain('No try yet');
  });

  it('opens a practice run on the newest published version, in the practice store alone, and goes there', async () => {
    await show({ ...published, version: 1 }, published, { ...published, version: 3, status: 'withdrawn' });
    const runId = await start('A cold morning, hissing somewhere');
    const row = await TestBed.inject(PracticeStore).runs.get(runId);
    expect(row?.header).toMatchObject({ kind: 'practice', version: 2, half: 'cold', siteId: 's-ossenholt' });
    expect(row?.summary).toMatchObject({ car: 'Merrow Heron, blue, 1.6 L turbo petrol', status: 'open' });
    const work = TestBed.inject(OfflineStore);
    expect(await work.runs.count()).toBe(0);
    expect(await work.outbox.count()).toBe(0);
  });

  it('lists an open try with the way back to it, and no loud start beside it', async () => {
    await show(published);
    const runId = await start('A whistle at idle when hot');
    await settle();
    const goOn = byRole(root(), 'link', 'Go on');
    expect(goOn.getAttribute('href')).toBe(`/run/${runId}`);
    expect(textOf(root())).toContain('step 1, Start card');
    expect(root().querySelectorAll('bay-scenario-card .primary')).toHaveLength(0);
  });

  it('tells found from not found in the list of tries', async () => {
    await show(published);
    const practice = TestBed.inject(PracticeStore);
    const first = await start('A whistle at idle when hot');
    const row = (await practice.runs.get(first))!;
    const closed = (runId: string, verdict: string) => ({
      ...row,
      runId,
      summary: { ...row.summary!, status: 'closed' as const, current: undefined, verdict },
    });
    await practice.runs.bulkPut([closed(first, 'Seals'), closed('other', 'Does not seal')]);
    await settle();
    const tries = allByRole(root(), 'listitem').map(textOf);
    expect(tries.find((text) => text.includes('finding: Seals'))).toMatch(/ found /);
    expect(tries.find((text) => text.includes('finding: Does not seal'))).toContain('not found');
    expect(allByRole(root(), 'link', 'Debrief').map((link) => link.getAttribute('href'))).toContain(
      `/practice/${first}`,
    );
    expect(textOf(root())).toContain('tried 2 times, found once');
  });

  it('does not show the tries of somebody else', async () => {
    await show(published);
    const practice = TestBed.inject(PracticeStore);
    const runId = await start('A whistle at idle when hot');
    await practice.runs.update(runId, { openedBy: 'p-brandt' });
    await settle();
    expect(textOf(root())).toContain('No try yet');
  });

  it('says that the procedure has to come first, where it has not', async () => {
    await show();
    expect(textOf(root())).toContain('The procedure is not on this tablet yet');
    expect(allByRole(root(), 'button', 'Start')).toEqual([]);
  });

  it('writes a chain that holds from its first event on', async () => {
    await show(published);
    const runId = await start('Coarse figures and a gap');
    const stored = await TestBed.inject(RunJournal).load(runId);
    expect(stored?.events.map(({ type }) => type)).toEqual(['opened', 'step-claimed']);
  });
});
