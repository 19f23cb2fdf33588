import 'fake-indexeddb/auto';
import { provideLocationMocks } from '@angular/common/testing';
import type { HttpTestingController } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter, Router, withComponentInputBinding } from '@angular/router';
import { RouterTestingHarness } from '@angular/router/testing';
import { asked, closeStores, coreForSpecs } from '../core/testing/core-for-specs';
import { byRole, textOf } from '../shared/testing/by-role';
import { settle } from '../shared/testing/settle';
import { RecordListPage } from './record-list-page';

const row = {
  runId: 'run-1',
  procedureTitle: 'Crankcase valve seal',
  version: 4,
  repairOrder: '4417',
  car: 'Merrow Heron',
  person: 'I. Okafor',
  openedAt: 0,
  status: 'closed',
  finding: 'doesNotSeal',
  verdict: 'The manifold valve does not seal.',
  result: 'out',
};

describe('the Record room’s list', () => {
  let server: HttpTestingController;
  let harness: RouterTestingHarness;

  beforeEach(async () => {
    // jsdom neither lays out nor scrolls.
    jest.spyOn(HTMLElement.prototype, 'clientHeight', 'get').mockReturnValue(600);
    HTMLElement.prototype.scrollTo = jest.fn();
    window.matchMedia = jest
      .fn()
      .mockReturnValue({ matches: false, addListener: jest.fn(), removeListener: jest.fn() });
    server = coreForSpecs([
      provideRouter(
        [
          { path: 'records', component: RecordListPage },
          { path: 'records/:runId', children: [] },
        ],
        withComponentInputBinding(),
      ),
      provideLocationMocks(),
    ]).server;
    harness = await RouterTestingHarness.create();
  });
  afterEach(async () => {
    await settle();
    harness.fixture.destroy();
    closeStores();
    jest.restoreAllMocks();
  });

  const root = (): HTMLElement => harness.routeNativeElement as HTMLElement;
  async function answer(url: string, body: object, status = 200): Promise<void> {
    (await asked(server, 'GET', url)).flush(body, { status, statusText: String(status) });
    await settle();
  }
  const newest = '/api/records?sort=-openedAt&page=1';

  it('counts the records and lists the newest first', async () => {
    await harness.navigateByUrl('/records');
    await answer(newest, { total: 12_345, rows: [row] });
    expect(textOf(byRole(root(), 'status', 'records'))).toBe('12,345 records');
  });

  it('asks for what the address says, so that the way back finds the same list', async () => {
    await harness.navigateByUrl('/records?text=heron&finding=doesNotSeal&status=closed&sort=car');
    await answer('/api/records?text=heron&finding=doesNotSeal&status=closed&sort=car&page=1', {
      total: 1,
      rows: [row],
    });
    expect((byRole(root(), 'textbox', 'Find') as HTMLInputElement).value).toBe('heron');
    expect(textOf(byRole(root(), 'status', 'record'))).toBe('1 record');
  });

  it('puts what is typed into the address once the typing pauses', async () => {
    await harness.navigateByUrl('/records');
    await answer(newest, { total: 1, rows: [row] });
    const field = byRole(root(), 'textbox', 'Find') as HTMLInputElement;
    field.value = 'wren';
    field.dispatchEvent(new Event('input'));
    await answer('/api/records?text=wren&sort=-openedAt&page=1', { total: 0, rows: [] });
    expect(TestBed.inject(Router).url).toBe('/records?text=wren');
    expect(textOf(root())).toContain('No record fits');
  });

  it('goes to the field by a slash', async () => {
    await harness.navigateByUrl('/records');
    await answer(newest, { total: 1, rows: [row] });
    document.body.append(harness.fixture.nativeElement as HTMLElement);
    document.dispatchEvent(new KeyboardEvent('keydown', { key: '/' }));
    expect(document.activeElement?.id).toBe('record-text');
  });

  it('says that there is no record yet, which is not the same as none that fits', async () => {
    await harness.navigateByUrl('/records');
    await answer(newest, { total: 0, rows: [] });
    expect(textOf(root())).toContain('No record yet');
  });

  it.each([
    [403, 'Not yours to see'],
    [504, 'No network'],
  ])('has words for an answer of %s', async (status, words) => {
    await harness.navigateByUrl('/records');
    await answer(newest, { title: 'No' }, status);
    expect(textOf(byRole(root(), 'alert'))).toContain(words);
  });
});
