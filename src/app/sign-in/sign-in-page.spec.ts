import { Component, ChangeDetectionStrategy, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter, Router } from '@angular/router';
import { Session, type SignInOutcome } from '../core/session';
import { Sync } from '../core/sync';
import { Theme } from '../core/theme';
import { okafor } from '../core/testing/core-for-specs';
import { SignInPage } from './sign-in-page';

@Component({ selector: 'bay-blank', template: '', changeDetection: ChangeDetectionStrategy.OnPush })
class Blank {}

/** A session that answers as it is told. */
class ToldSession {
  readonly state = signal('signed-out');
  readonly remembered = signal<unknown>(undefined);
  readonly asked: string[][] = [];
  answer: SignInOutcome = { ok: true };

  signIn(name: string, password: string): Promise<SignInOutcome> {
    this.asked.push([name, password]);
    if (this.answer.ok) this.state.set('signed-in');
    return Promise.resolve(this.answer);
  }

  goOnOffline(): void {
    this.state.set('unavailable');
  }
}

async function page(session: ToldSession, next?: string) {
  TestBed.configureTestingModule({
    providers: [
      provideRouter([{ path: '**', component: Blank }]),
      { provide: Session, useValue: session },
      { provide: Sync, useValue: { again: () => Promise.resolve() } },
      { provide: Theme, useValue: { name: signal('day'), choose: () => Promise.resolve() } },
    ],
  });
  const fixture = TestBed.createComponent(SignInPage);
  if (next !== undefined) fixture.componentRef.setInput('next', next);
  await fixture.whenStable();
  const root = fixture.nativeElement as HTMLElement;
  const field = (id: string) => root.querySelector<HTMLInputElement>(`#${id}`)!;
  const type = async (id: string, text: string) => {
    field(id).value = text;
    field(id).dispatchEvent(new Event('input'));
    await fixture.whenStable();
  };
  const send = async () => {
    root.querySelector('form')!.dispatchEvent(new Event('submit', { cancelable: true }));
    await fixture.whenStable();
    await fixture.whenStable();
  };
  const button = (words: RegExp) => [...root.querySelectorAll('button')].find((b) => words.test(b.textContent ?? ''));
  return { root, field, type, send, button, fixture, router: TestBed.inject(Router) };
}

describe('SignInPage', () => {
  it('goes where the person wanted to, once signed in', async () => {
    const session = new ToldSession();
    const { type, send, router } = await page(session, '/visit/v-1');
    await type('name', ' okafor ');
    await type('password', 'right');
    await send();
    expect(session.asked).toEqual([['okafor', 'right']]);
    expect(router.url).toBe('/visit/v-1');
  });

  it.each(['//elsewhere.example/x', 'https://elsewhere.example'])('never leaves the app for %s', async (next) => {
    const { type, send, router } = await page(new ToldSession(), next);
    await type('name', 'okafor');
    await type('password', 'right');
    await send();
    expect(router.url).toBe('/');
  });

  it('says beside the password that it is wrong, and goes back to it', async () => {
    const session = new ToldSession();
    session.answer = { ok: false, why: 'wrong', message: 'This name and password do not belong together.' };
    const { root, field, type, send } = await page(session);
    document.body.append(root);
    await type('name', 'okafor');
    await type('password', 'no');
    await send();
    const described = field('password').getAttribute('aria-describedby')!;
    expect(root.querySelector(`#${described}`)?.textContent).toBe('This name and password do not belong together.');
    expect(field('password').getAttribute('aria-invalid')).toBe('true');
    expect(document.activeElement).toBe(field('password'));
    root.remove();
  });

  it('asks for what is missing before it asks the server', async () => {
    const session = new ToldSession();
    const { root, send } = await page(session);
    await send();
    expect(session.asked).toEqual([]);
    expect(root.querySelector('#name-error')?.textContent).toBe('Type the name that you sign in with.');
  });

  it('lets the last person go on when the server cannot be reached', async () => {
    const session = new ToldSession();
    session.remembered.set({ person: okafor });
    session.answer = { ok: false, why: 'unreachable', message: 'The server cannot be reached.' };
    const { field, type, send, button, router, fixture } = await page(session);
    expect(field('name').value).toBe('okafor');
    await type('password', 'right');
    await send();
    const goOn = button(/Go on as I. Okafor, offline/)!;
    goOn.click();
    await fixture.whenStable();
    expect(session.state()).toBe('unavailable');
    expect(router.url).toBe('/');
  });

  it('says that a tablet on which nobody worked yet needs the network once', async () => {
    const session = new ToldSession();
    session.answer = { ok: false, why: 'unreachable', message: 'The server cannot be reached.' };
    const { root, type, send, button } = await page(session);
    await type('name', 'okafor');
    await type('password', 'right');
    await send();
    expect(root.textContent).toContain('it needs the network this once');
    expect(button(/Go on as/)).toBeUndefined();
  });
});
