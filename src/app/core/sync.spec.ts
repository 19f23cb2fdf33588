import 'fake-indexeddb/auto';
import type { HttpTestingController, TestRequest } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import type { EventDraft, RunHeader } from '../../../procedures/engine';
import { OfflineStore, PracticeStore } from './offline-store';
import { RunJournal } from './run-journal';
import { Session } from './session';
import { Sync } from './sync';
import { asked, closeStores, coreForSpecs, okafor, registeredTablet, workOffline } from './testing/core-for-specs';
import { VisitBook } from './visit-book';
import type { PullAnswer, Visit } from './wire';

const header: RunHeader = {
  runId: 'r-1',
  procedureId: 'seal',
  version: 1,
  contentHash: 'c',
  visitId: 'v-1',
  siteId: 's-1',
  kind: 'real',
};
const drafts: EventDraft[] = [{ type: 'step-claimed', data: { step: 'start' } }];
const visit = { id: 'v-1', siteId: 's-1', repairOrder: '4417', changedAt: 5 } as Visit;
const nothing: PullAnswer = {
  cursor: 'e1.7',
  procedures: [],
  sites: [],
  gear: [],
  people: [],
  visits: [],
  runs: [],
  notices: [],
};

interface Pushed {
  device: string;
  runs: { header: RunHeader; events: { seq: number; hash: string }[] }[];
  documents: { kind: string; document: Visit }[];
}

async function signedInTablet() {
  const core = coreForSpecs();
  await registeredTablet();
  const session = TestBed.inject(Session);
  const outcome = session.signIn('okafor', 'right');
  const answer = { accessToken: 'a-1', expiresInS: 6000, person: okafor };
  (await asked(core.server, 'POST', '/api/session')).flush(answer);
  await outcome;
  return {
    ...core,
    store: TestBed.inject(OfflineStore),
    journal: TestBed.inject(RunJournal),
    sync: TestBed.inject(Sync),
  };
}

async function pushed(server: HttpTestingController): Promise<{ request: TestRequest; body: Pushed }> {
  const request = await asked(server, 'POST', '/api/sync/push');
  return { request, body: JSON.parse(await textOf(request.request.body)) as Pushed };
}

/** jsdom's Blob has no text(). */
function textOf(blob: Blob): Promise<string> {
  return new Promise((resolve) => {
    const reader = new FileReader();
    reader.onload = () => resolve(String(reader.result));
    reader.readAsText(blob);
  });
}

const accept = (body: Pushed, missingAttachments: string[] = []) => ({
  runs: body.runs.map(({ header: { runId }, events }) => ({
    runId,
    acceptedThrough: events.at(-1)!.seq,
    missingAttachments,
    countersigned: { seq: events.at(-1)!.seq, head: events.at(-1)!.hash, at: 1, signature: 's' },
  })),
  documents: body.documents.map(({ kind, document }) => ({ kind, id: document.id })),
});

describe('Sync', () => {
  afterEach(() => {
    closeStores();
    TestBed.inject(PracticeStore).close();
  });

  it('sends what waits, signed, and gives nothing up before the receipt is stored', async () => {
    const { server, store, journal, sync } = await signedInTablet();
    await TestBed.inject(VisitBook).keep(visit);
    await journal.open(header, drafts);
    const done = sync.again();

    const { request, body } = await pushed(server);
    expect(request.request.headers.get('x-bayhand-signature')).toMatch(/^[\w-]{86}$/);
    expect(body).toMatchObject({ device: 't-1', documents: [{ kind: 'visit', document: visit }] });
    expect(body.runs[0]!.events.map(({ seq }) => seq)).toEqual([1]);
    expect(await store.outbox.count()).toBe(2);
    request.flush(accept(body));
    (await asked(server, 'GET', '/api/sync/pull')).flush(nothing);
    await done;

    expect(await store.outbox.count()).toBe(0);
    expect(await store.receipts.get('r-1')).toMatchObject({
      acceptedThrough: 1,
      countersigned: { seq: 1, head: body.runs[0]!.events[0]!.hash, signature: 's' },
    });
    expect(await store.events.count()).toBe(1);
  });

  it('sends the same events again after a lost answer', async () => {
    const { server, store, journal, sync } = await signedInTablet();
    await journal.open(header, drafts);
    let done = sync.again();
    const first = await pushed(server);
    first.request.error(new ProgressEvent('error'));
    await done;
    expect(sync.view().unreachedSince).toBeDefined();
    expect(await store.outbox.count()).toBe(1);

    done = sync.again();
    const second = await pushed(server);
    expect(second.body).toEqual(first.body);
    second.request.flush(accept(second.body));
    (await asked(server, 'GET', '/api/sync/pull')).flush(nothing);
    await done;
    expect(sync.view().unreachedSince).toBeUndefined();
  });

  it('keeps what was accepted only in part', async () => {
    const { server, store, journal, sync } = await signedInTablet();
    await journal.open(header, [...drafts, { type: 'step-done', data: { step: 'start' } }]);
    const done = sync.again();
    const first = await pushed(server);
    const partly = accept(first.body);
    first.request.flush({ ...partly, runs: [{ ...partly.runs[0]!, acceptedThrough: 1 }] });
    const second = await pushed(server);
    expect(second.body.runs[0]!.events.map(({ seq }) => seq)).toEqual([2]);
    second.request.flush(accept(second.body));
    (await asked(server, 'GET', '/api/sync/pull')).flush(nothing);
    await done;
    expect(await store.outbox.count()).toBe(0);
  });

  it('sends evidence that the server lacks, after the events that name it', async () => {
    const { server, store, journal, sync } = await signedInTablet();
    const blob = (sha256: string) => ({ sha256, bytes: Uint8Array.of(1, 2), mediaType: 'application/octet-stream' });
    await journal.open(header, drafts, { blobs: [blob('aa'), blob('bb')] });
    const done = sync.again();
    const { request, body } = await pushed(server);
    server.expectNone('/api/attachments/aa');
    request.flush(accept(body, ['bb']));
    (await asked(server, 'PUT', '/api/attachments/bb')).flush('', { status: 201, statusText: 'Created' });
    (await asked(server, 'GET', '/api/sync/pull')).flush(nothing);
    await done;
    server.expectNone('/api/attachments/aa');
    expect(await store.outbox.count()).toBe(0);
    expect(await store.blobs.count()).toBe(2);
  });

  it('sends no evidence of a run whose events the server did not take', async () => {
    const { server, store, journal, sync } = await signedInTablet();
    await journal.open(header, drafts, {
      blobs: [{ sha256: 'aa', bytes: Uint8Array.of(1), mediaType: 'application/octet-stream' }],
    });
    const done = sync.again();
    const problem = { code: 'structure', title: 'Refused' };
    (await pushed(server)).request.flush({
      runs: [{ runId: 'r-1', acceptedThrough: 0, missingAttachments: ['aa'], problem }],
      documents: [],
    });
    (await asked(server, 'GET', '/api/sync/pull')).flush(nothing);
    await done;
    server.expectNone('/api/attachments/aa');
    expect((await store.outbox.toArray()).map(({ kind }) => kind)).toEqual(['events', 'blob']);
  });

  it('keeps a refused run, visible and with the reason, and lets the others through', async () => {
    const { server, store, journal, sync } = await signedInTablet();
    await journal.open(header, drafts);
    await journal.open({ ...header, runId: 'r-2' }, drafts);
    let done = sync.again();
    const first = await pushed(server);
    const answer = accept(first.body);
    const problem = { title: 'Refused', detail: 'the procedure was withdrawn' };
    first.request.flush({
      ...answer,
      runs: [{ runId: 'r-1', acceptedThrough: 0, missingAttachments: [], problem }, answer.runs[1]],
    });
    (await asked(server, 'GET', '/api/sync/pull')).flush(nothing);
    await done;
    expect(await store.outbox.toArray()).toMatchObject([{ runId: 'r-1', refused: 'the procedure was withdrawn' }]);

    done = sync.again();
    (await asked(server, 'GET', '/api/sync/pull?since=e1.7')).flush(nothing);
    await done;
    server.expectNone('/api/sync/push');
  });

  it('halves a batch that is refused as a whole until the one at fault stands alone', async () => {
    const { server, store, journal, sync } = await signedInTablet();
    for (const runId of ['r-1', 'r-2', 'r-3']) await journal.open({ ...header, runId }, drafts);
    const done = sync.again();
    for (let pushes = 0; pushes < 5; pushes += 1) {
      const { request, body } = await pushed(server);
      const isFine = body.runs.every(({ header: { runId } }) => runId !== 'r-2');
      if (isFine) request.flush(accept(body));
      else request.flush({ title: 'Not valid' }, { status: 422, statusText: 'Unprocessable Content' });
    }
    (await asked(server, 'GET', '/api/sync/pull')).flush(nothing);
    await done;
    expect(await store.outbox.toArray()).toMatchObject([{ runId: 'r-2', refused: 'Not valid' }]);
    expect((await store.receipts.toArray()).map(({ runId }) => runId)).toEqual(['r-1', 'r-3']);
  });

  it('sends everything again from where the server lacks events', async () => {
    const { server, store, journal, sync } = await signedInTablet();
    await journal.open(header, [...drafts, { type: 'step-done', data: { step: 'start' } }]);
    await store.outbox.clear();
    await journal.append('r-1', [{ type: 'step-claimed', data: { step: 'codes' } }]);
    const done = sync.again();
    const first = await pushed(server);
    expect(first.body.runs[0]!.events.map(({ seq }) => seq)).toEqual([3]);
    const problem = { code: 'gap', title: 'Events are missing' };
    first.request.flush({
      runs: [{ runId: 'r-1', acceptedThrough: 0, missingAttachments: [], problem }],
      documents: [],
    });
    const second = await pushed(server);
    expect(second.body.runs[0]!.events.map(({ seq }) => seq)).toEqual([1, 2, 3]);
    second.request.flush(accept(second.body));
    (await asked(server, 'GET', '/api/sync/pull')).flush(nothing);
    await done;
    expect(await store.outbox.count()).toBe(0);
  });

  it('registers anew when the server does not know the tablet any more, under the same key', async () => {
    const { server, store, journal, sync } = await signedInTablet();
    await journal.open(header, drafts);
    const before = await store.keys.get('tablet');
    let done = sync.again();
    (await pushed(server)).request.flush({ code: 'unknown-tablet' }, { status: 403, statusText: 'Forbidden' });
    await done;
    expect(await store.outbox.count()).toBe(1);

    done = sync.again();
    const request = await asked(server, 'POST', '/api/tablets');
    expect(request.request.body.publicKey).toEqual(before!.publicKey);
    request.flush({ id: 't-2', label: 'x' });
    const again = await pushed(server);
    expect(again.body.device).toBe('t-2');
    again.request.flush(accept(again.body));
    (await asked(server, 'GET', '/api/sync/pull')).flush(nothing);
    await done;
    expect(await store.outbox.count()).toBe(0);
  });

  it('sends no practice', async () => {
    const { server, journal, sync } = await signedInTablet();
    await journal.open({ ...header, kind: 'practice' }, drafts);
    const done = sync.again();
    (await asked(server, 'GET', '/api/sync/pull')).flush(nothing);
    await done;
    server.expectNone('/api/sync/push');
  });

  it('asks for the password when the session has ended, and sends nothing until then', async () => {
    const { server, store, journal, sync } = await signedInTablet();
    await journal.open(header, drafts);
    const unauthorised = { status: 401, statusText: 'Unauthorized' };
    const done = sync.again();
    (await pushed(server)).request.flush({}, unauthorised);
    (await asked(server, 'POST', '/api/session/refresh')).flush({}, unauthorised);
    await done;
    expect(sync.view().heldUpBy).toBe('sign-in');
    expect(await store.outbox.count()).toBe(1);
    await sync.again();
    server.expectNone('/api/sync/push');
  });

  it('tries again soon while nobody answers, then later and later, and soon again once there is a network', async () => {
    const { server } = coreForSpecs();
    await workOffline(server);
    const sync = TestBed.inject(Sync);
    const timers = jest.spyOn(window, 'setTimeout');
    const wait = () => timers.mock.calls.map(([, ms]) => ms ?? 0).findLast((ms) => ms >= 1000);
    const unanswered = async (trying: Promise<void>) => {
      (await asked(server, 'POST', '/api/session/refresh')).error(new ProgressEvent('error'));
      await trying;
    };
    await unanswered(sync.start());
    expect(wait()).toBe(1000);
    await unanswered(sync.again());
    await unanswered(sync.again());
    expect(wait()).toBe(4000);
    expect(sync.view().isReached).toBe(false);
    window.dispatchEvent(new Event('online'));
    await unanswered(sync.again());
    expect(wait()).toBe(1000);
    timers.mockRestore();
  });
});
