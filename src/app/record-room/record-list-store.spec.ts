import 'fake-indexeddb/auto';
import { TestBed } from '@angular/core/testing';
import type { HttpTestingController } from '@angular/common/http/testing';
import { ApiProblem } from '../core/api-problem';
import { asked, closeStores, coreForSpecs } from '../core/testing/core-for-specs';
import { RecordListStore } from './record-list-store';
import type { RecordRow } from './record-wire';

const pageSize = 50;

function rowsFrom(first: number, count: number, car = 'Merrow Heron'): RecordRow[] {
  return Array.from({ length: count }, (_, index) => ({
    runId: `run-${first + index}`,
    procedureTitle: 'Crankcase valve seal',
    version: 1,
    repairOrder: String(first + index),
    car,
    person: 'I. Okafor',
    openedAt: 0,
    status: 'closed',
  }));
}

describe('the list of records', () => {
  let server: HttpTestingController;
  let store: RecordListStore;
  const newest = { text: '', finding: '', status: '', sort: '-openedAt' } as const;
  const url = (page: number, more = '') => `/api/records?${more}sort=-openedAt&page=${page}`;

  beforeEach(() => {
    server = coreForSpecs([RecordListStore]).server;
    store = TestBed.inject(RecordListStore);
  });
  afterEach(() => closeStores());

  async function firstPage(total: number): Promise<void> {
    const asking = store.ask(newest);
    (await asked(server, 'GET', url(1))).flush({ total, rows: rowsFrom(0, Math.min(total, pageSize)) });
    await asking;
  }

  it('has a place for every record, and the rows of the first page in theirs', async () => {
    await firstPage(12_000);
    expect(store.total()).toBe(12_000);
    expect(store.rows()).toHaveLength(12_000);
    expect(store.rows()[49]?.runId).toBe('run-49');
    expect(store.rows()[50]).toBeUndefined();
  });

  it('fetches only the pages that came into sight, and each of them once', async () => {
    await firstPage(12_000);
    const shown = store.show(5_030, 5_070);
    const again = store.show(5_031, 5_071);
    (await asked(server, 'GET', url(101))).flush({ total: 12_000, rows: rowsFrom(5_000, pageSize) });
    (await asked(server, 'GET', url(102))).flush({ total: 12_000, rows: rowsFrom(5_050, pageSize) });
    await Promise.all([shown, again]);
    expect(store.rows()[5_040]?.runId).toBe('run-5040');
    expect(store.rows()[5_069]?.runId).toBe('run-5069');
    server.verify();
  });

  it('drops the answer to a question that is no longer asked', async () => {
    const first = store.ask(newest);
    const slow = await asked(server, 'GET', url(1));
    const second = store.ask({ ...newest, text: 'wren' });
    (await asked(server, 'GET', url(1, 'text=wren&'))).flush({ total: 1, rows: rowsFrom(7, 1, 'Merrow Wren') });
    slow.flush({ total: 2, rows: rowsFrom(0, 2) });
    await Promise.all([first, second]);
    expect(store.rows().map((row) => row?.car)).toEqual(['Merrow Wren']);
  });

  it('keeps the earlier rows in sight until the new ones are there', async () => {
    await firstPage(3);
    const asking = store.ask({ ...newest, text: 'wren' });
    expect(store.isAsking()).toBe(true);
    expect(store.rows()).toHaveLength(3);
    (await asked(server, 'GET', url(1, 'text=wren&'))).flush({ total: 0, rows: [] });
    await asking;
    expect(store.isAsking()).toBe(false);
    expect(store.rows()).toEqual([]);
  });

  it('says what went wrong, and works again afterwards', async () => {
    const asking = store.ask(newest);
    (await asked(server, 'GET', url(1))).flush({ title: 'Not yours' }, { status: 403, statusText: 'Forbidden' });
    await asking;
    expect(store.status()).toBe('failed');
    expect(store.error()).toMatchObject({ status: 403 });
    expect(store.error()).toBeInstanceOf(ApiProblem);
    const again = store.again();
    (await asked(server, 'GET', url(1))).flush({ total: 0, rows: [] });
    await again;
    expect(store.status()).toBe('ready');
  });
});
