import 'fake-indexeddb/auto';
import { TestBed } from '@angular/core/testing';
import { Component, ChangeDetectionStrategy } from '@angular/core';
import { provideRouter, Router } from '@angular/router';
import { Session } from './session';
import { roleGuard, signedInGuard } from './signed-in-guard';
import { asked, closeStores, coreForSpecs, okafor, rememberPerson } from './testing/core-for-specs';
import type { Role } from './wire';

@Component({ selector: 'bay-blank', template: '', changeDetection: ChangeDetectionStrategy.OnPush })
class Blank {}

const routes = [
  { path: 'sign-in', component: Blank },
  {
    path: '',
    canActivate: [signedInGuard],
    children: [
      { path: 'records', canMatch: [roleGuard('manager', 'lead')], component: Blank },
      { path: 'not-yours', component: Blank },
      { path: '', component: Blank },
    ],
  },
];

async function whereTo(url: string, role: Role | undefined): Promise<string> {
  const { server } = coreForSpecs([provideRouter(routes)]);
  await rememberPerson();
  const started = TestBed.inject(Session).start();
  const request = await asked(server, 'POST', '/api/session/refresh');
  if (role) request.flush({ accessToken: 'a', expiresInS: 600, person: { ...okafor, role } });
  else request.flush({}, { status: 401, statusText: 'Unauthorized' });
  await started;
  const router = TestBed.inject(Router);
  await router.navigateByUrl(url);
  return router.url;
}

describe('the guards', () => {
  afterEach(() => closeStores());

  it.each<[string, Role | undefined, string]>([
    ['/', undefined, '/sign-in'],
    ['/records', undefined, '/sign-in?next=%2Frecords'],
    ['/', 'apprentice', '/'],
    ['/records', 'manager', '/records'],
    ['/records', 'lead', '/records'],
    ['/records', 'technician', '/not-yours'],
    ['/records', 'apprentice', '/not-yours'],
  ])('send %s, asked for by %s, to %s', async (url, role, end) => {
    expect(await whereTo(url, role)).toBe(end);
  });
});
