import 'fake-indexeddb/auto';
import type { HttpTestingController } from '@angular/common/http/testing';
import { TestBed, type ComponentFixture } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { crankcaseValveSeal } from '../../../procedures/library';
import { OfflineStore } from '../core/offline-store';
import { asked, closeStores, coreForSpecs } from '../core/testing/core-for-specs';
import { allByRole, byRole, textOf } from '../shared/testing/by-role';
import { settle } from '../shared/testing/settle';
import { ReadingPage } from './reading-page';

describe('reading a procedure', () => {
  let server: HttpTestingController;
  let fixture: ComponentFixture<ReadingPage>;

  beforeEach(() => {
    // jsdom scrolls nothing.
    Element.prototype.scrollIntoView = jest.fn();
    server = coreForSpecs([provideRouter([])]).server;
    fixture = TestBed.createComponent(ReadingPage);
    document.body.append(fixture.nativeElement as HTMLElement);
  });
  afterEach(async () => {
    await settle();
    fixture.destroy();
    closeStores();
    document.body.replaceChildren();
  });

  const root = (): HTMLElement => fixture.nativeElement as HTMLElement;
  const outline = (): HTMLElement => byRole(root(), 'navigation', 'Outline');
  async function showDraft(document: object): Promise<void> {
    fixture.componentRef.setInput('draftId', 'draft-1');
    fixture.autoDetectChanges();
    const body = {
      id: 'draft-1',
      title: 'x',
      procedureId: 'x',
      importedAt: '',
      importedBy: '',
      problems: [],
      document,
    };
    (await asked(server, 'GET', '/api/procedures/drafts/draft-1')).flush(body);
    await settle();
    // The lint comes as a chunk of its own and walks every way.
    for (let turns = 0; turns < 100 && root().querySelector('[aria-busy="true"]') !== null; turns += 1) await settle();
  }

  it('outlines every step with its kind, and what it opens and closes', async () => {
    await showDraft(crankcaseValveSeal);
    const entries = allByRole(outline(), 'button').map(textOf);
    expect(entries).toHaveLength(crankcaseValveSeal.steps.length + 1);
    expect(entries.find((text) => text.includes('Dipstick out'))).toMatch(/^7.*Do and confirm.*opens$/);
    expect(entries.find((text) => text.includes('Back together') && text.startsWith('16'))).toMatch(/closes$/);
    expect(textOf(byRole(root(), 'contentinfo'))).toMatch(/0\s*must be mended/);
    expect(textOf(root())).toContain('Everything opened is closed again on every way');
  });

  it('begins with what the procedure is for, its limits, how it is stopped and what it needs', async () => {
    await showDraft(crankcaseValveSeal);
    const head = textOf(byRole(root(), 'region', 'Step'));
    expect(head).toContain('about 25 min a half; run as a pair, cold and warm');
    expect(head).toContain('gauge <= 34.5 kPa');
    expect(head).toContain('Let the gauge fall to zero.');
    expect(head).toMatch(/Seal point at most\s*5\.0 kPa\s*common practice, no source/);
    expect(head).toMatch(/Elevation of the site\s*from the site/);
    expect(head).toMatch(/Seals outside the band\s*1, 2d, .*11, 11b, 14, 15a, 15b, 15c, 16, 17a/);
  });

  it('reads the chosen step: its sentence, cautions, what it finds, and where it goes on', async () => {
    await showDraft(crankcaseValveSeal);
    byRole(outline(), 'button', 'Raise slowly and listen').click();
    await settle();
    const step = textOf(byRole(root(), 'region', 'Step'));
    expect(step).toContain('Raise the pressure slowly towards 10 kPa while you listen.');
    expect(step).toContain('WARNING');
    expect(step).toMatch(/Seal point\s*kPa gauge/);
    expect(step).toContain('band from seal point at least to seal point at most');
    expect(step).toMatch(/if\s*the warm half\s*11a/);
  });

  it('follows a way to the step that it leads to', async () => {
    await showDraft(crankcaseValveSeal);
    byRole(outline(), 'button', 'Manifold pressure, key on').click();
    await settle();
    allByRole(byRole(root(), 'region', 'Step'), 'button', '6')[0]!.click();
    await settle();
    expect(textOf(byRole(root(), 'heading', '6. Boost'))).toContain('Boost pressure, key on');
  });

  it('is walked by arrows as one tab stop', async () => {
    await showDraft(crankcaseValveSeal);
    const stops = allByRole(outline(), 'button').filter((button) => button.tabIndex === 0);
    expect(stops.map(textOf)).toEqual(['What it is for']);
    stops[0]!.dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowDown', bubbles: true }));
    await settle();
    expect(document.activeElement?.textContent).toContain('Start card');
    document.activeElement?.dispatchEvent(new KeyboardEvent('keydown', { key: 'Home', bubbles: true }));
    await settle();
    expect(document.activeElement?.textContent).toContain('What it is for');
  });

  it('lists what must be mended with its step and place', async () => {
    const steps = crankcaseValveSeal.steps.map((step) =>
      step.id === 'boost-pressure' && step.kind === 'reading'
        ? { ...step, next: [{ ...step.next![0]!, when: 'tooClose(bostPressure)' }] }
        : step,
    );
    await showDraft({ ...crankcaseValveSeal, steps });
    expect(textOf(byRole(root(), 'contentinfo'))).toMatch(/1\s*must be mended/);
    const entry = byRole(outline(), 'button', 'Boost pressure');
    expect(textOf(entry)).toMatch(/1\s*problems/);
    entry.click();
    await settle();
    expect(textOf(byRole(root(), 'list', 'To be mended here'))).toContain('bostPressure');
  });

  it('reads a version from this device, without a network', async () => {
    await TestBed.inject(OfflineStore).procedures.put({
      id: 'crankcase-valve-seal',
      version: 4,
      status: 'withdrawn',
      contentHash: 'h',
      publishedAt: '2026-11-12T08:00:00Z',
      publishedBy: 'R. Adeyemi',
      document: crankcaseValveSeal,
    });
    fixture.componentRef.setInput('procedureId', 'crankcase-valve-seal');
    fixture.componentRef.setInput('version', '4');
    fixture.autoDetectChanges();
    await settle();
    expect(textOf(root())).toContain('version 4, withdrawn');
    server.expectNone((request) => request.url.startsWith('/api/procedures'));
  });

  it('says so when the version is not on this device', async () => {
    fixture.componentRef.setInput('procedureId', 'crankcase-valve-seal');
    fixture.componentRef.setInput('version', '9');
    fixture.autoDetectChanges();
    await settle();
    expect(textOf(byRole(root(), 'alert'))).toContain('Version 9 of crankcase-valve-seal is not on this device yet');
  });
});
