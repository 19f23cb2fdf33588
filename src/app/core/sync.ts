import {
  ApplicationRef,
  computed,
  DestroyRef,
  DOCUMENT,
  effect,
  ErrorHandler,
  inject,
  Injectable,
  signal,
} from '@angular/core';
import { ApiProblem } from './api-problem';
import { AttachmentSender } from './attachment-sender';
import { Outbox } from './outbox';
import { PullIntake } from './pull-intake';
import { PushSender } from './push-sender';
import { retryDelayMs } from './retry-delay';
import { webLocks } from './run-locks';
import { Session } from './session';
import { SettingsBook } from './settings-book';
import { nothingWaiting, type SyncView, type WaitingCounts } from './sync-view';
import { Tablet } from './tablet';
import { chance, clock } from './time-and-ids';

const everyMs = 60_000;
/** After a change on the tablet, so that several taps go in one push. */
const soonMs = 3_000;
const lastSyncKey = 'last-sync-at';

/**
 * Sends what waits and fetches what is new, in the foreground: at start, when the network or the window comes back,
 * after each close, soon after a change, and every minute. After a failure the next try waits a random while. One
 * window does it at a time.
 */
@Injectable({ providedIn: 'root' })
export class Sync {
  private readonly session = inject(Session);
  private readonly tablet = inject(Tablet);
  private readonly outbox = inject(Outbox);
  private readonly pushSender = inject(PushSender);
  private readonly attachments = inject(AttachmentSender);
  private readonly intake = inject(PullIntake);
  private readonly settings = inject(SettingsBook);
  private readonly locks = inject(webLocks);
  private readonly now = inject(clock);
  private readonly draw = inject(chance);
  private readonly document = inject(DOCUMENT);
  private readonly application = inject(ApplicationRef);
  private readonly errors = inject(ErrorHandler);

  private readonly reached = signal<{ readonly isReached: boolean; readonly since: number } | undefined>(undefined);
  private readonly lastSyncAt = signal<number | undefined>(undefined);
  private readonly progress = signal<SyncView['progress']>(undefined);
  private readonly blocked = signal<SyncView['heldUpBy']>(undefined);
  private running: Promise<void> | undefined;
  private timer: ReturnType<typeof setTimeout> | undefined;
  private failures = 0;
  private hasStarted = false;
  private waitedLast = 0;
  /** Whose right to register the tablet the server denied. */
  private refusedTo: string | undefined;

  /** Where sending stands. */
  readonly view = computed<SyncView>(() => {
    const reached = this.reached();
    return {
      isReached: reached?.isReached,
      unreachedSince: reached?.isReached === false ? reached.since : undefined,
      lastSyncAt: this.lastSyncAt(),
      waiting: this.outbox.waiting() ?? nothingWaiting,
      progress: this.progress(),
      heldUpBy: this.session.state() === 'expired' ? 'sign-in' : this.blocked(),
    };
  });

  constructor() {
    // Towards the network: what a tap adds goes out soon, and a new sign-in sends what waited for it.
    effect(() => this.noteWaiting(this.outbox.waiting()));
    effect(() => {
      if (this.session.state() === 'signed-in' && this.hasStarted) void this.again();
    });
    inject(DestroyRef).onDestroy(() => clearTimeout(this.timer));
  }

  /** Begins to sync, and goes on for as long as the app is open. */
  async start(): Promise<void> {
    if (this.hasStarted) return;
    this.hasStarted = true;
    this.lastSyncAt.set(await this.settings.read<number>(lastSyncKey));
    const window = this.document.defaultView;
    // It is often said a moment before the first request gets through: the tries begin anew, close together.
    window?.addEventListener('online', () => {
      this.failures = 0;
      void this.again();
    });
    window?.addEventListener('offline', () => this.noteUnreached());
    this.document.addEventListener('visibilitychange', () => {
      if (this.document.visibilityState === 'visible') void this.again();
    });
    // The service worker registers once the app is stable: a request that never ends would hold it up.
    await this.application.whenStable();
    await this.again();
  }

  /** Syncs soon: call it after a change that others should see. */
  soon(): void {
    // Without a network the next try comes by itself: taps at the car do not each start one.
    const isUnreached = this.reached()?.isReached === false;
    if (this.hasStarted && this.failures === 0 && !isUnreached) this.schedule(soonMs);
  }

  /** Syncs now, unless a sync is under way; ends when it has ended. Never throws for what a network may do. */
  async again(): Promise<void> {
    this.running ??= this.once().finally(() => (this.running = undefined));
    await this.running;
  }

  private noteWaiting(waiting: WaitingCounts | undefined): void {
    const count = waiting ? waiting.events + waiting.documents + waiting.evidence : 0;
    if (count > this.waitedLast) this.soon();
    this.waitedLast = count;
  }

  private async once(): Promise<void> {
    clearTimeout(this.timer);
    try {
      if (await this.inOneWindow(() => this.exchange())) this.failures = 0;
      this.schedule(everyMs);
    } catch (error) {
      this.failures += 1;
      this.schedule(Math.max(1000, retryDelayMs(this.failures, this.draw())));
      await this.noteFailure(error);
    } finally {
      this.progress.set(undefined);
    }
  }

  /** A network may fail in all sorts of ways; anything else is a fault, which is reported and does not end syncing. */
  private async noteFailure(error: unknown): Promise<void> {
    if (!(error instanceof ApiProblem)) return this.errors.handleError(error);
    if (error.isUnavailable) this.noteUnreached();
    else this.noteReached();
    if (error.code === 'unknown-tablet') await this.tablet.forgetRegistration();
  }

  private async exchange(): Promise<void> {
    const state = this.session.state();
    if (state === 'signed-out' || state === 'starting' || state === 'expired') return;
    if ((await this.session.usableToken()) === undefined) {
      if (this.session.state() === 'unavailable') throw unanswered();
      return;
    }
    await this.registerIfAllowed();
    if ((await this.tablet.registeredId()) === undefined) {
      this.blocked.set(this.missesTablet() ? 'tablet' : undefined);
    } else {
      this.blocked.set(undefined);
      await this.sendAll();
    }
    await this.intake.pull();
    this.noteReached();
    const at = this.now();
    this.lastSyncAt.set(at);
    await this.settings.write(lastSyncKey, at);
  }

  private async sendAll(): Promise<void> {
    const waiting = this.outbox.waiting() ?? nothingWaiting;
    const of = waiting.runs + waiting.documents + waiting.evidence - waiting.refused;
    let done = 0;
    const count = (items: number): void => {
      done += items;
      if (of > 1) this.progress.set({ done: Math.min(done, of), of });
    };
    count(0);
    const missing = await this.pushSender.sendAll(count);
    await this.attachments.sendAll(missing, () => count(1));
  }

  /** Who works at cars registers the tablet on the way; a manager at a desk does it on purpose only. */
  private async registerIfAllowed(): Promise<void> {
    const person = this.session.person();
    if (person === undefined || person.role === 'manager' || this.refusedTo === person.id) return;
    if ((await this.tablet.registeredId()) !== undefined) return;
    if ((await this.tablet.register()) === 'refused') this.refusedTo = person.id;
  }

  /** Who only reads at a desk needs no registered tablet, unless something of others waits on this one. */
  private missesTablet(): boolean {
    return this.session.person()?.role !== 'manager' || this.waitedLast > 0;
  }

  private async inOneWindow(work: () => Promise<void>): Promise<boolean> {
    if (this.locks === undefined) {
      await work();
      return true;
    }
    return this.locks.request('bayhand-sync', { ifAvailable: true }, async (lock) => {
      if (lock === null) return false;
      await work();
      return true;
    });
  }

  private schedule(ms: number): void {
    clearTimeout(this.timer);
    this.timer = setTimeout(() => void this.again(), ms);
  }

  private noteReached(): void {
    if (this.reached()?.isReached !== true) this.reached.set({ isReached: true, since: this.now() });
  }

  private noteUnreached(): void {
    if (this.reached()?.isReached !== false) this.reached.set({ isReached: false, since: this.now() });
  }
}

/** The session could not be renewed because nobody answered: for the next try that is a failure like any other. */
const unanswered = (): ApiProblem =>
  new ApiProblem(0, 'The server cannot be reached', undefined, [], undefined, undefined);
