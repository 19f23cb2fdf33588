import 'fake-indexeddb/auto';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { OfflineStore, PracticeStore } from '../core/offline-store';
import { summariseRun } from '../core/run-summary';
import { closeStores, coreForSpecs } from '../core/testing/core-for-specs';
import { coldMorning } from '../shared/practice/cold-morning';
import { allByRole, byRole, textOf } from '../shared/testing/by-role';
import { settle } from '../shared/testing/settle';
import { compiledLibraryProcedure, walkScenario, type WalkOptions } from '../shared/testing/walk-scenario';
import { DebriefPage } from './debrief-page';

const choices = {
  'where-it-comes-out': ['airAtValve'],
  look: ['carboned'],
  'clear-codes': ['codesCleared'],
  'other-half': ['otherHalfToCome'],
};

describe('the debrief', () => {
  const procedure = compiledLibraryProcedure();
  let fixture: ComponentFixture<DebriefPage>;
  const root = (): HTMLElement => fixture.nativeElement as HTMLElement;

  async function show(options: Partial<WalkOptions> = {}, kind: 'practice' | 'real' = 'practice'): Promise<void> {
    coreForSpecs([provideRouter([])]);
    const { header, events, state } = walkScenario(procedure, coldMorning, { choices, kind, ...options });
    const { document } = procedure;
    const last = events.at(-1)!;
    await TestBed.inject(OfflineStore).procedures.put({
      id: document.id,
      version: header.version,
      status: 'published',
      contentHash: header.contentHash,
      publishedAt: '2026-11-12T08:00:00Z',
      publishedBy: 'R. Adeyemi',
      document,
    });
    const tables = kind === 'practice' ? TestBed.inject(PracticeStore) : TestBed.inject(OfflineStore);
    await tables.events.bulkAdd(events);
    await tables.runs.put({
      runId: header.runId,
      header,
      visitId: header.visitId,
      seq: last.seq,
      head: last.hash,
      changedAt: last.at,
      elapsed: last.elapsed,
      openedBy: 'p-okafor',
      summary: summariseRun(document, state),
    });
    fixture = TestBed.createComponent(DebriefPage);
    fixture.componentRef.setInput('runId', header.runId);
    fixture.autoDetectChanges();
    for (let turns = 0; turns < 50 && root().querySelector('[aria-busy]') !== null; turns += 1) await settle();
  }
  afterEach(async () => {
    await settle();
    fixture.destroy();
    closeStores();
  });

  it('holds what the record found against what was planted', async () => {
    await show();
    expect(textOf(byRole(root(), 'heading', 'You found'))).toBe('You found what was planted.');
    const text = textOf(root());
    expect(text).toContain(coldMorning.planted.fault);
    expect(text).toContain('The noise never stops, and you marked no end of it.');
    expect(text).toMatch(/All \d+ as the instruments showed them\./);
    expect(text).toContain(coldMorning.planted.lesson);
    expect(root().classList).toContain('practice-edge');
  });

  it('tells nothing of the fault while the run is open', async () => {
    await show({ until: 'look' });
    const text = textOf(root());
    expect(text).toContain('The run is still open');
    expect(text).not.toContain(coldMorning.planted.fault);
    expect(byRole(root(), 'link', 'Go back to the run').getAttribute('href')).toContain('/run/');
  });

  it('debriefs no real run', async () => {
    await show({}, 'real');
    expect(textOf(root())).toContain('No such practice run here');
  });

  it('shows each figure beside what the instrument showed, where one differs', async () => {
    let isWritten = false;
    await show({
      before: (step, walk) => {
        if (step.id !== 'boost-pressure' || isWritten) return;
        isWritten = true;
        walk.do({ do: 'record', name: 'boostPressure', text: '93.1', unit: 'kPa' });
      },
    });
    const row = allByRole(root(), 'row')
      .map(textOf)
      .find((text) => text.includes('boost pressure'));
    expect(row).toMatch(/93\.7 kPa\s*93\.1 kPa\s*not the same/);
  });
});
