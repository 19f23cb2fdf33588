import { HttpClient } from '@angular/common/http';
import { computed, inject, Injectable, signal } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import { ApiProblem } from './api-problem';
import { outsideSession } from './session-context';
import { SettingsBook } from './settings-book';
import type { RememberedPerson } from './stored-rows';
import { Tablet } from './tablet';
import { clock } from './time-and-ids';
import type { Person, SessionAnswer } from './wire';

/**
 * - `starting`: not known yet.
 * - `signed-in`: the server vouches for the person.
 * - `unavailable`: nobody can be asked; the last person of this tablet goes on with what is on it.
 * - `expired`: the server asks for the password again; the work at hand goes on, nothing is sent until then.
 * - `signed-out`: nobody.
 */
export type SessionState = 'starting' | 'signed-in' | 'unavailable' | 'expired' | 'signed-out';

/** How an attempt to sign in ended. */
export type SignInOutcome =
  | { readonly ok: true }
  | { readonly ok: false; readonly why: 'wrong' | 'locked' | 'unreachable' | 'other'; readonly message: string };

const rememberedKey = 'last-person';
const signedOutKey = 'sign-out-waits';
/** A reload at the car does not wait longer than this for the server before it goes on with the last person. */
const startPatienceMs = 1500;
/** A token this close to its end is renewed first. */
const tokenMarginMs = 20_000;

/**
 * Who works on this tablet. The access token lives in memory alone; the refresh token in a cookie that scripts cannot
 * read. What outlives a reload is the last person's name and role, never a token.
 */
@Injectable({ providedIn: 'root' })
export class Session {
  private readonly http = inject(HttpClient);
  private readonly settings = inject(SettingsBook);
  private readonly tablet = inject(Tablet);
  private readonly now = inject(clock);

  private readonly status = signal<SessionState>('starting');
  private readonly current = signal<Person | undefined>(undefined);
  private readonly last = signal<RememberedPerson | undefined>(undefined);
  private token: { readonly text: string; readonly until: number } | undefined;
  private refreshing: Promise<string | undefined> | undefined;
  private started: Promise<void> | undefined;

  readonly state = this.status.asReadonly();
  /** Who works here now; undefined when nobody does. */
  readonly person = this.current.asReadonly();
  /** The last person of this tablet, who may go on without a network. */
  readonly remembered = this.last.asReadonly();
  /** Whether someone may work, with or without a network. */
  readonly isOpen = computed(() => this.current() !== undefined);

  /** Finds out who is signed in; done once, at start. */
  start(): Promise<void> {
    this.started ??= this.findOut();
    return this.started;
  }

  /** Signs in by name and password. Never throws for what the server may answer. */
  async signIn(name: string, password: string): Promise<SignInOutcome> {
    const tablet = await this.tablet.registeredId();
    const body = { name, password, ...(tablet === undefined ? {} : { tablet }) };
    try {
      const answer = await firstValueFrom(this.http.post<SessionAnswer>('/api/session', body, outsideSession()));
      await this.settings.forget(signedOutKey);
      await this.accept(answer, tablet);
      return { ok: true };
    } catch (error) {
      if (error instanceof ApiProblem) return refusalOf(error);
      throw error;
    }
  }

  /** Goes on as the last person of this tablet, with what is on it. */
  goOnOffline(): void {
    const last = this.last();
    if (!last) return;
    this.current.set(last.person);
    this.status.set('unavailable');
  }

  /** A token that still holds, renewed first when it is about to end; undefined when there is none to be had. */
  async usableToken(): Promise<string | undefined> {
    if (this.token && this.token.until - tokenMarginMs > this.now()) return this.token.text;
    if (this.status() !== 'signed-in' && this.status() !== 'unavailable') return undefined;
    return this.refresh();
  }

  /** Renews the token through the cookie, once for all who ask meanwhile; undefined when that did not work. */
  refresh(): Promise<string | undefined> {
    this.refreshing ??= this.renew().finally(() => (this.refreshing = undefined));
    return this.refreshing;
  }

  /** Ends the session. Work that waits stays on the tablet and is sent by whoever signs in next. */
  async signOut(): Promise<void> {
    // Whoever sees the sign-in page may reload or walk away at once: by then nothing may still name them.
    await this.settings.write(signedOutKey, true);
    await this.settings.forget(rememberedKey);
    this.token = undefined;
    this.current.set(undefined);
    this.last.set(undefined);
    this.status.set('signed-out');
    await this.endOnServer();
  }

  private async findOut(): Promise<void> {
    if ((await this.settings.read<boolean>(signedOutKey)) === true) {
      this.status.set('signed-out');
      await this.endOnServer();
      return;
    }
    this.last.set(await this.settings.read<RememberedPerson>(rememberedKey));
    // Where nobody ever signed in there is no session to renew: asking would only be refused.
    if (this.last() === undefined) return this.status.set('signed-out');
    const patience = new Promise<'late'>((resolve) => setTimeout(() => resolve('late'), startPatienceMs));
    await Promise.race([this.refresh(), patience]);
    if (this.status() === 'starting') this.goOnOffline();
  }

  private async renew(): Promise<string | undefined> {
    try {
      const tablet = this.last()?.tablet;
      const body = tablet === undefined ? {} : { tablet };
      const answer = await firstValueFrom(
        this.http.post<SessionAnswer>('/api/session/refresh', body, outsideSession()),
      );
      await this.accept(answer, tablet);
      return this.token?.text;
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      this.token = undefined;
      if (error.status === 401 || error.status === 403) {
        this.status.set(this.current() === undefined ? 'signed-out' : 'expired');
      } else if (this.current() !== undefined) {
        this.status.set('unavailable');
      } else if (this.last() !== undefined && this.status() === 'starting') {
        this.goOnOffline();
      }
      return undefined;
    }
  }

  private async accept({ accessToken, expiresInS, person }: SessionAnswer, tablet: string | undefined): Promise<void> {
    this.token = { text: accessToken, until: this.now() + expiresInS * 1000 };
    const remembered = { person, lastAt: this.now(), tablet };
    this.current.set(person);
    this.last.set(remembered);
    this.status.set('signed-in');
    await this.settings.write(rememberedKey, remembered);
  }

  /** Signing out without a network is made good at the next start with one: until then the cookie is not used. */
  private async endOnServer(): Promise<void> {
    try {
      await firstValueFrom(this.http.delete('/api/session', outsideSession()));
      await this.settings.forget(signedOutKey);
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      if (!error.isUnavailable) await this.settings.forget(signedOutKey);
    }
  }
}

function refusalOf(error: ApiProblem): SignInOutcome {
  if (error.isUnavailable) return { ok: false, why: 'unreachable', message: 'The server cannot be reached.' };
  if (error.status === 429) {
    const wait = error.retryAfterS === undefined ? 'in a while' : `in ${waitWords(error.retryAfterS)}`;
    return { ok: false, why: 'locked', message: `Too many tries. Try again ${wait}.` };
  }
  if (error.status === 401 || error.status === 422 || error.status === 400) {
    return { ok: false, why: 'wrong', message: 'This name and password do not belong together.' };
  }
  return { ok: false, why: 'other', message: error.message };
}

const waitWords = (seconds: number): string =>
  seconds < 90 ? `${Math.max(1, Math.ceil(seconds))} s` : `${Math.ceil(seconds / 60)} min`;
