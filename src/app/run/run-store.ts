import { computed, inject, Injectable, signal } from '@angular/core';
import {
  applyEvent,
  type EventDraft,
  type RunCommand,
  type RunEvent,
  type RunState,
} from '../../../procedures/engine/showing';
import { NobodyToSign, RunJournal, RunWrittenElsewhere, type NewBlob } from '../core/run-journal';
import { summariseRun } from '../core/run-summary';
import { Session } from '../core/session';
import { fetchPart } from '../core/fetch-part';
import { clock, monotonicClock } from '../core/time-and-ids';
import { ClockWatch } from './clock-watch';
import { RunOpener, type OpenedRun } from './run-opener';
import type { RunProblem, RunView } from './run-view';
import { isOfRamp, RampQueue } from './ramp-queue';
import { TapGuard, type TapKind } from './tap-guard';
import type { ClocksNow } from './hold-clock';

/** How far the page has got. */
export type RunPhase = 'loading' | 'ready' | Extract<OpenedRun, { ok: false }>['why'];

/** What a command may bring along. */
export interface ActExtras {
  /** Evidence that its events name. */
  readonly blobs?: readonly NewBlob[];
  /** Whether it belongs to the tap before it, so that the guard against double taps lets it through. */
  readonly isFollowUp?: boolean;
}

/** What may be done before the resume card is answered. */
const answersResume: ReadonlySet<RunCommand['do']> = new Set(['resume', 'stop', 'acknowledge-limit', 'leave-stop']);

/** What a manager may do to a real run: what the server would refuse must not be written here either. */
const ofManager: ReadonlySet<RunCommand['do']> = new Set(['release', 'resume']);

/**
 * One run on the screen. A command is decided, its events are written for good, and only then does the screen go on.
 * Provided by the run's page, so that leaving the page gives the run up.
 */
@Injectable()
export class RunStore {
  private readonly opener = inject(RunOpener);
  private readonly journal = inject(RunJournal);
  private readonly session = inject(Session);
  private readonly rampQueue = inject(RampQueue);
  private readonly now = inject(clock);
  private readonly monotonic = inject(monotonicClock);

  private readonly opened = signal<RunView | undefined>(undefined);
  private readonly status = signal<RunPhase>('loading');
  private readonly detail = signal('');
  private readonly writesElsewhere = signal(false);
  private readonly acting = signal<{ readonly do: RunCommand['do']; readonly isOfRamp: boolean } | undefined>(
    undefined,
  );
  private readonly trouble = signal<RunProblem | undefined>(undefined);
  private readonly awaitsResume = signal(false);
  private readonly guard = new TapGuard(this.monotonic);
  private readonly clockWatch = new ClockWatch(this.now, this.monotonic);
  /** `elapsed` of the run less the monotonic clock's reading. */
  private elapsedOffset = 0;
  private loadedElapsed = 0;
  private clockBackMs = 0;
  /** The last command that is being written or waits for it. */
  private lastInLine: Promise<boolean> | undefined;

  readonly phase = this.status.asReadonly();
  /** What a phase without a run is about: an id, a version, the event that does not fit. */
  readonly phaseDetail = this.detail.asReadonly();
  readonly view = this.opened.asReadonly();
  readonly state = computed<RunState | undefined>(() => this.opened()?.state);
  /** Whether another window writes this run. */
  readonly isElsewhere = this.writesElsewhere.asReadonly();
  /** The command that is being written now. */
  readonly busy = computed(() => this.acting()?.do);
  /** Whether nothing else can be done until it is written; a ramp's next point or mark can. */
  readonly isBusy = computed(() => this.acting()?.isOfRamp === false);
  readonly problem = this.trouble.asReadonly();
  /** Whether the resume card has to be answered before anything else. */
  readonly needsResume = this.awaitsResume.asReadonly();

  /** Reads the run and takes it for this window. */
  async load(runId: string): Promise<void> {
    this.status.set('loading');
    const run = await this.opener.open(runId);
    if (!run.ok) {
      this.detail.set(run.what);
      this.status.set(run.why);
      return;
    }
    const { view, isElsewhere, clockBackMs } = run;
    const last = view.events.at(-1);
    this.loadedElapsed = (last?.elapsed ?? 0) + Math.max(0, this.now() - (last?.at ?? this.now()));
    this.elapsedOffset = this.loadedElapsed - this.monotonic();
    this.clockBackMs = clockBackMs;
    this.clockWatch.begin(clockBackMs);
    this.writesElsewhere.set(isElsewhere);
    this.opened.set(view);
    this.awaitsResume.set(!isElsewhere && isOpen(view.state) && !wasJustOpened(view.events));
    this.status.set('ready');
  }

  /** Gives the run up. */
  leave(): void {
    const runId = this.opened()?.header.runId;
    if (runId !== undefined) this.opener.close(runId);
  }

  /** After a pause long enough to lose the place: the resume card comes first. */
  askToResume(): void {
    const state = this.state();
    if (state !== undefined && isOpen(state) && !this.writesElsewhere()) this.awaitsResume.set(true);
  }

  /** The clocks as a hold's timer reads them. */
  clocks(): ClocksNow {
    return {
      elapsed: this.monotonic() + this.elapsedOffset,
      loadedElapsed: this.loadedElapsed,
      clockBackMs: this.clockBackMs,
    };
  }

  forgetProblem(): void {
    this.trouble.set(undefined);
  }

  /**
   * Does a command: true when its events are written and the screen has gone on. False when it was refused (then
   * `problem` says why, and nothing that was entered is lost), or when it was a double tap. The points and marks of a
   * ramp, and the stop, wait in line behind what is being written; anything else is not done meanwhile.
   */
  async act(command: RunCommand, extras: ActExtras = {}): Promise<boolean> {
    const view = this.opened();
    if (view === undefined || this.writesElsewhere()) return false;
    const kind = tapKind(command, view);
    const ahead = this.lastInLine;
    if (kind === 'decision' && ahead !== undefined) return false;
    if (extras.isFollowUp !== true && !this.guard.admit(kind)) return false;
    if (kind === 'ramp') this.rampQueue.add(command);
    this.trouble.set(undefined);
    const perform = (): Promise<boolean> => this.perform(command, extras);
    const turn = ahead === undefined ? perform() : ahead.then(perform, perform);
    this.lastInLine = turn;
    try {
      return await turn;
    } finally {
      if (this.lastInLine === turn) this.lastInLine = undefined;
      if (kind === 'ramp') this.rampQueue.remove(command);
    }
  }

  private async perform(command: RunCommand, extras: ActExtras): Promise<boolean> {
    const view = this.opened();
    if (view === undefined || this.writesElsewhere()) return false;
    if (command.do === 'stop' && view.state.status === 'stopped') return false;
    const refusal = this.refusalOf(command, view);
    if (refusal !== undefined) {
      this.trouble.set(refusal);
      return false;
    }
    this.acting.set({ do: command.do, isOfRamp: isOfRamp(command, view) });
    try {
      // What decides comes in idle time after the first step is shown; a tap before that waits for it.
      const { decide } = await fetchPart(() => import('../../../procedures/engine'));
      const outcome = decide(view.procedure, view.state, command, this.now());
      if (!outcome.ok) {
        this.trouble.set(outcome);
        return false;
      }
      await this.write(view, [...this.clockWatch.drafts(), ...outcome.drafts], extras.blobs ?? []);
      if (command.do === 'resume') this.awaitsResume.set(false);
      return true;
    } catch (error) {
      this.trouble.set(this.explain(error));
      return false;
    } finally {
      this.acting.set(undefined);
    }
  }

  private refusalOf(command: RunCommand, { header }: RunView): RunProblem | undefined {
    if (this.awaitsResume() && !answersResume.has(command.do)) {
      return { code: 'resume-first', message: 'Answer first whether you go on here.' };
    }
    if (header.kind === 'real' && this.session.person()?.role === 'manager' && !ofManager.has(command.do)) {
      return { code: 'not-yours', message: 'A manager only releases here. Whoever runs the test goes on.' };
    }
    return undefined;
  }

  private async write(view: RunView, drafts: readonly EventDraft[], blobs: readonly NewBlob[]): Promise<void> {
    let state = view.state;
    const events = await this.journal.append(view.header.runId, drafts, {
      blobs,
      summarise: (sealed) => {
        state = applied(view, sealed);
        return summariseRun(view.procedure.document, state);
      },
    });
    this.opened.set({ ...view, events: [...view.events, ...events], state });
  }

  private explain(error: unknown): RunProblem {
    if (error instanceof RunWrittenElsewhere) {
      this.writesElsewhere.set(true);
      return { code: 'elsewhere', message: 'Another window has gone on with this run. Nothing was recorded here.' };
    }
    if (error instanceof NobodyToSign) {
      return { code: 'nobody', message: `${error.message}: nothing was recorded. Sign in, then do it again.` };
    }
    // Dexie and the browser name what a full or closed store throws; anything else is a fault of ours and stays loud.
    if (error instanceof Error && /Quota|Database|Abort|Invalid ?State|Unknown/i.test(error.name)) {
      return {
        code: 'store',
        message: 'The tablet could not keep it: nothing was recorded. Free some room, then do it again.',
      };
    }
    throw error;
  }
}

function applied(view: RunView, events: readonly RunEvent[]): RunState {
  return events.reduce<RunState>((state, event) => {
    const result = applyEvent(view.procedure, view.header, state, event);
    if (!result.ok) throw new RangeError(`event ${result.refusal.seq} does not fit: ${result.refusal.what}`);
    return result.state;
  }, view.state);
}

function tapKind(command: RunCommand, view: RunView): TapKind {
  if (command.do === 'stop') return 'stop';
  return isOfRamp(command, view) ? 'ramp' : 'decision';
}

const isOpen = (state: RunState): boolean => state.status !== 'closed' && state.status !== 'signed';

/** Nothing but the opening: there is no place yet that could be lost. */
const wasJustOpened = (events: readonly RunEvent[]): boolean =>
  events.every(({ type }) => type === 'opened' || type === 'step-claimed') && events.length <= 2;
