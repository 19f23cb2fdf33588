import 'fake-indexeddb/auto';
import { HttpClient } from '@angular/common/http';
import { TestBed } from '@angular/core/testing';
import { firstValueFrom } from 'rxjs';
import { ApiProblem } from './api-problem';
import { OfflineStore } from './offline-store';
import { Session } from './session';
import {
  asked,
  closeStores,
  coreForSpecs,
  eventually,
  okafor,
  registeredTablet,
  rememberPerson,
} from './testing/core-for-specs';

const answer = { accessToken: 'a-1', expiresInS: 600, person: okafor };
const unauthorised = { status: 401, statusText: 'Unauthorized' };
const refresh = '/api/session/refresh';

describe('Session', () => {
  afterEach(() => closeStores());

  it('asks nobody to sign in again while the cookie holds', async () => {
    const { server } = coreForSpecs();
    await rememberPerson();
    const session = TestBed.inject(Session);
    const started = session.start();
    (await asked(server, 'POST', refresh)).flush(answer);
    await started;
    expect(session.state()).toBe('signed-in');
    expect(session.person()).toEqual(okafor);
  });

  it('asks for no session where nobody ever signed in', async () => {
    const { server } = coreForSpecs();
    const session = TestBed.inject(Session);
    await session.start();
    expect(session.state()).toBe('signed-out');
    server.expectNone(refresh);
  });

  it('goes on as the last person when nobody can be asked, and not as nobody', async () => {
    const { server } = coreForSpecs();
    await rememberPerson();
    const session = TestBed.inject(Session);
    const started = session.start();
    (await asked(server, 'POST', refresh)).error(new ProgressEvent('error'));
    await started;
    expect(session.state()).toBe('unavailable');
    expect(session.person()?.displayName).toBe('I. Okafor');
  });

  it('does not wait for a server that does not answer', async () => {
    const { server } = coreForSpecs();
    await rememberPerson();
    const session = TestBed.inject(Session);
    await session.start();
    expect(session.state()).toBe('unavailable');
    (await asked(server, 'POST', refresh)).flush(answer);
    await eventually(() => expect(session.state()).toBe('signed-in'));
  });

  it('lets nobody in when the server says no, although someone is remembered', async () => {
    const { server } = coreForSpecs();
    await rememberPerson();
    const session = TestBed.inject(Session);
    const started = session.start();
    (await asked(server, 'POST', refresh)).flush({ title: 'Sign in' }, unauthorised);
    await started;
    expect(session.state()).toBe('signed-out');
    expect(session.isOpen()).toBe(false);
    expect(session.remembered()?.person.name).toBe('okafor');
  });

  it('says in the same words that a name or a password is wrong', async () => {
    const { server } = coreForSpecs();
    const session = TestBed.inject(Session);
    const outcome = session.signIn('okafor', 'no');
    (await asked(server, 'POST', '/api/session')).flush({ title: 'no' }, unauthorised);
    expect(await outcome).toEqual({
      ok: false,
      why: 'wrong',
      message: 'This name and password do not belong together.',
    });
  });

  it('says how long a lock-out lasts', async () => {
    const { server } = coreForSpecs();
    const outcome = TestBed.inject(Session).signIn('okafor', 'no');
    (await asked(server, 'POST', '/api/session')).flush(
      { title: 'locked' },
      { status: 429, statusText: 'Too Many Requests', headers: { 'retry-after': '300' } },
    );
    expect(await outcome).toMatchObject({ why: 'locked', message: 'Too many tries. Try again in 5 min.' });
  });

  it('tells an unreachable server from a refusal', async () => {
    const { server } = coreForSpecs();
    const outcome = TestBed.inject(Session).signIn('okafor', 'no');
    (await asked(server, 'POST', '/api/session')).flush('', { status: 504, statusText: 'Gateway Timeout' });
    expect(await outcome).toMatchObject({ ok: false, why: 'unreachable' });
  });

  it('keeps the person and never a token in what outlives a reload', async () => {
    const { server } = coreForSpecs();
    await registeredTablet('t-9');
    const session = TestBed.inject(Session);
    const outcome = session.signIn('okafor', 'right');
    const request = await asked(server, 'POST', '/api/session');
    expect(request.request.body).toEqual({ name: 'okafor', password: 'right', tablet: 't-9' });
    request.flush(answer);
    expect(await outcome).toEqual({ ok: true });
    const stored = await TestBed.inject(OfflineStore).settings.toArray();
    expect(JSON.stringify(stored)).toContain('I. Okafor');
    expect(JSON.stringify(stored)).not.toContain('a-1');
  });

  it('lets work go on when the server ends the session meanwhile', async () => {
    const { server } = coreForSpecs();
    const session = TestBed.inject(Session);
    const outcome = session.signIn('okafor', 'right');
    (await asked(server, 'POST', '/api/session')).flush(answer);
    await outcome;
    const renewed = session.refresh();
    (await asked(server, 'POST', refresh)).flush({}, unauthorised);
    expect(await renewed).toBeUndefined();
    expect(session.state()).toBe('expired');
    expect(session.person()?.name).toBe('okafor');
  });

  it('shows that one is signed out only once a reload would find nobody', async () => {
    const { server } = coreForSpecs();
    const session = TestBed.inject(Session);
    const outcome = session.signIn('okafor', 'right');
    (await asked(server, 'POST', '/api/session')).flush(answer);
    await outcome;
    const { settings } = TestBed.inject(OfflineStore);
    const shownAtWrite: string[] = [];
    const note = (): void => void shownAtWrite.push(session.state());
    settings.hook('creating', note);
    settings.hook('deleting', note);
    const ended = session.signOut();
    const request = await asked(server, 'DELETE', '/api/session');
    expect(shownAtWrite).toEqual(['signed-in', 'signed-in']);
    expect(session.state()).toBe('signed-out');
    expect(await settings.get('last-person')).toBeUndefined();
    expect(await settings.get('sign-out-waits')).toMatchObject({ value: true });
    request.flush(null, { status: 204, statusText: 'No Content' });
    await ended;
  });

  it('makes a sign-out without a network good before it uses the cookie again', async () => {
    const { server } = coreForSpecs();
    await TestBed.inject(OfflineStore).settings.put({ key: 'sign-out-waits', value: true });
    await rememberPerson();
    const session = TestBed.inject(Session);
    const started = session.start();
    (await asked(server, 'DELETE', '/api/session')).flush(null, { status: 204, statusText: 'No Content' });
    await started;
    expect(session.state()).toBe('signed-out');
    expect(await TestBed.inject(OfflineStore).settings.get('sign-out-waits')).toBeUndefined();
    server.expectNone(refresh);
  });
});

describe('sessionInterceptor', () => {
  afterEach(() => closeStores());

  async function signedIn() {
    const { server, time } = coreForSpecs();
    const session = TestBed.inject(Session);
    const outcome = session.signIn('okafor', 'right');
    (await asked(server, 'POST', '/api/session')).flush(answer);
    await outcome;
    return { server, time, session, http: TestBed.inject(HttpClient) };
  }

  it('sends the token with calls to the server', async () => {
    const { server, http } = await signedIn();
    const call = firstValueFrom(http.get('/api/records'));
    const request = await asked(server, 'GET', '/api/records');
    expect(request.request.headers.get('authorization')).toBe('Bearer a-1');
    request.flush([]);
    expect(await call).toEqual([]);
  });

  it('refreshes once for all calls that were refused, and sends them again', async () => {
    const { server, http } = await signedIn();
    const calls = Promise.all(['/api/a', '/api/b'].map((url) => firstValueFrom(http.get(url))));
    (await asked(server, 'GET', '/api/a')).flush({}, unauthorised);
    (await asked(server, 'GET', '/api/b')).flush({}, unauthorised);
    (await asked(server, 'POST', refresh)).flush({ ...answer, accessToken: 'a-2' });
    for (const url of ['/api/a', '/api/b']) {
      const again = await asked(server, 'GET', url);
      expect(again.request.headers.get('authorization')).toBe('Bearer a-2');
      again.flush(url);
    }
    expect(await calls).toEqual(['/api/a', '/api/b']);
    server.expectNone(refresh);
  });

  it('gives the refusal on when the cookie no longer holds', async () => {
    const { server, http } = await signedIn();
    const call = firstValueFrom(http.get('/api/a'));
    (await asked(server, 'GET', '/api/a')).flush({ title: 'Sign in' }, unauthorised);
    (await asked(server, 'POST', refresh)).flush({}, unauthorised);
    await expect(call).rejects.toMatchObject({ name: 'ApiProblem', status: 401 });
  });

  it('renews a token that is about to end before it is used', async () => {
    const { server, http, time } = await signedIn();
    time.pass(595_000);
    const call = firstValueFrom(http.get('/api/a'));
    (await asked(server, 'POST', refresh)).flush({ ...answer, accessToken: 'a-2' });
    const request = await asked(server, 'GET', '/api/a');
    expect(request.request.headers.get('authorization')).toBe('Bearer a-2');
    request.flush(1);
    expect(await call).toBe(1);
  });

  it('turns a problem document into its parts', async () => {
    const { server, http } = await signedIn();
    const call = firstValueFrom(http.post('/api/procedures/drafts', {}));
    const errors = [{ pointer: '/steps/3', detail: 'leads nowhere' }];
    (await asked(server, 'POST', '/api/procedures/drafts')).flush(
      { title: 'Not valid', detail: 'One step leads nowhere', errors },
      { status: 422, statusText: 'Unprocessable Content' },
    );
    const problem = await call.catch((error: unknown) => error);
    expect(problem).toBeInstanceOf(ApiProblem);
    expect(problem).toMatchObject({ status: 422, title: 'Not valid', fields: errors, isUnavailable: false });
  });
});
