import type { EnvironmentProviders, Provider } from '@angular/core';
import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { buildId } from '../build-id';
import { OfflineStore, PracticeStore, storeNames } from '../offline-store';
import { problemInterceptor } from '../problem-interceptor';
import { Session } from '../session';
import { sessionInterceptor } from '../session-interceptor';
import { chance, clock, monotonicClock, newId } from '../time-and-ids';
import type { Person } from '../wire';

/** 2 December 2026, 09:00 UTC. */
export const startOfDay = Date.UTC(2026, 11, 2, 9, 0, 0);

export const okafor: Person = {
  id: 'p-okafor',
  name: 'okafor',
  displayName: 'I. Okafor',
  role: 'technician',
  siteId: 's-ossenholt',
};

/** Times and ids that a spec holds in its hand. */
export class HeldTime {
  now = startOfDay;
  monotonicMs = 1000;
  private ids = 0;

  /** Lets both clocks go on. */
  pass(ms: number): void {
    this.now += ms;
    this.monotonicMs += ms;
  }

  nextId(): string {
    this.ids += 1;
    return `018f0000-0000-7000-8000-${String(this.ids).padStart(12, '0')}`;
  }
}

let databases = 0;

/** A fresh pair of databases, held clocks and a server that the spec answers for. */
export function coreForSpecs(more: readonly (Provider | EnvironmentProviders)[] = []): {
  time: HeldTime;
  server: HttpTestingController;
} {
  const time = new HeldTime();
  databases += 1;
  const name = `spec-${databases}`;
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(withInterceptors([sessionInterceptor, problemInterceptor])),
      provideHttpClientTesting(),
      { provide: storeNames, useValue: { work: name, practice: `${name}-practice` } },
      { provide: clock, useValue: () => time.now },
      { provide: monotonicClock, useValue: () => time.monotonicMs },
      { provide: newId, useValue: () => time.nextId() },
      { provide: chance, useValue: () => 0.5 },
      { provide: buildId, useValue: '0.0.0+spec' },
      ...more,
    ],
  });
  return { time, server: TestBed.inject(HttpTestingController) };
}

/** Puts a registered tablet into the store, without a server. */
export async function registeredTablet(id = 't-1'): Promise<void> {
  const pair = await crypto.subtle.generateKey({ name: 'ECDSA', namedCurve: 'P-256' }, false, ['sign', 'verify']);
  await TestBed.inject(OfflineStore).keys.put({
    id: 'tablet',
    publicKey: await crypto.subtle.exportKey('jwk', pair.publicKey),
    privateKey: pair.privateKey,
    tabletId: id,
    label: 'Tablet B2',
  });
}

/** Leaves a person behind as the last one of this tablet, as an earlier session does. */
export async function rememberPerson(person: Person = okafor): Promise<void> {
  await TestBed.inject(OfflineStore).settings.put({
    key: 'last-person',
    value: { person, lastAt: startOfDay, tablet: undefined },
  });
}

/** Lets a person go on without a network, as after a reload at the car. */
export async function workOffline(server: HttpTestingController, person: Person = okafor): Promise<void> {
  await rememberPerson(person);
  const started = TestBed.inject(Session).start();
  (await asked(server, 'POST', '/api/session/refresh')).error(new ProgressEvent('error'));
  await started;
}

/** Waits until the app asks the server for this, and gives the request to the spec. */
export async function asked(server: HttpTestingController, method: string, url: string) {
  for (let tries = 0; tries < 200; tries += 1) {
    const found = server.match((request) => request.method === method && request.urlWithParams === url);
    if (found[0]) return found[0];
    await new Promise((resolve) => setTimeout(resolve, 5));
  }
  throw new Error(`Nobody asked ${method} ${url}`);
}

/** Waits until a check holds: what a page shows comes from the store, in its own time. Fails as the check fails. */
export async function eventually(check: () => unknown, withinMs = 4000): Promise<void> {
  const until = Date.now() + withinMs;
  for (;;) {
    try {
      await check();
      return;
    } catch (error) {
      if (Date.now() > until) throw error;
      await new Promise((resolve) => setTimeout(resolve, 15));
    }
  }
}

/** Ends what a spec left open. */
export function closeStores(): void {
  TestBed.inject(OfflineStore).close();
  TestBed.inject(PracticeStore).close();
}
