import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DestroyRef,
  DOCUMENT,
  effect,
  inject,
  input,
  linkedSignal,
  signal,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { Router } from '@angular/router';
import type { Step } from '../../../procedures/document';
import type { RunCommand } from '../../../procedures/engine/showing';
import { Sync } from '../core/sync';
import { clock, monotonicClock } from '../core/time-and-ids';
import { BenchSheet } from '../shared/practice/bench-sheet';
import { RouteRibbon } from '../shared/route-ribbon';
import { syncWords } from '../shared/sync-words';
import { briefConnection } from './brief-connection';
import { CurrentStepView } from './current-step';
import { EntryDraft } from './entry-draft';
import { frameLayout } from './frame/frame-layout';
import { HonestWays } from './frame/honest-ways';
import { RunHeaderBar } from './frame/run-header';
import { StopRow } from './frame/stop-row';
import { RunSheets } from './later';
import { ListenFlow } from './listen/listen-flow';
import { pedalAct } from './pedal-keys';
import type { PhotoTaken } from './photo/photo-file';
import { PrimaryAction } from './primary-action';
import { RunGear } from './run-gear';
import { RunPreferences } from './run-preferences';
import { RunStore } from './run-store';
import { toneAfter } from './run-tones';
import type { LaidSheet } from './sheets/laid-sheet';
import type { Takeover } from './sheets/run-sheets';
import { TapGuard } from './tap-guard';
import { Tones } from './tones';
import { AwakeScreen } from './wake-lock';
import { beadResult, lastDecision, walkedBefore } from './walked-steps';
import { waysAhead } from './ways-ahead';

/** A page that was out of sight for this long may have cost the place. */
const placeLostMs = 30_000;

/** One run on the screen: the frame that never moves, the step in it, and what is laid over it. */
@Component({
  selector: 'bay-run-page',
  imports: [BenchSheet, CurrentStepView, HonestWays, RouteRibbon, RunHeaderBar, RunSheets, StopRow],
  providers: [AwakeScreen, EntryDraft, ListenFlow, PrimaryAction, RunGear, RunStore],
  templateUrl: './run-page.html',
  styleUrl: './run-page.css',
  host: { '(window:keydown)': 'pedal($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RunPage {
  protected readonly store = inject(RunStore);
  protected readonly flow = inject(ListenFlow);
  protected readonly awake = inject(AwakeScreen);
  protected readonly preferences = inject(RunPreferences);
  protected readonly gear = inject(RunGear);
  private readonly draft = inject(EntryDraft);
  private readonly primary = inject(PrimaryAction);
  private readonly tones = inject(Tones);
  private readonly sync = inject(Sync);
  private readonly router = inject(Router);
  private readonly document = inject(DOCUMENT);
  private readonly clock = inject(clock);
  private readonly pedalGuard = new TapGuard(inject(monotonicClock));

  /** From the address. */
  readonly runId = input.required<string>();

  protected readonly sheet = signal<LaidSheet | undefined>(undefined);
  protected readonly now = signal(this.clock());

  protected readonly run = this.store.view;
  protected readonly step = computed<Step | undefined>(() => {
    const run = this.run();
    const id = run?.state.current?.id ?? run?.state.finding;
    return run === undefined || id === undefined ? undefined : run.procedure.step(id);
  });
  protected readonly layout = computed(() => frameLayout(this.step()));
  protected readonly canMeasure = computed(() => {
    const step = this.step();
    return step !== undefined && 'cannotMeasure' in step;
  });
  protected readonly isPractice = computed(() => this.run()?.header.kind === 'practice');
  protected readonly isClosed = computed(() => ['closed', 'signed'].includes(this.run()?.state.status ?? 'open'));
  private readonly places = computed(() => {
    const run = this.run();
    return run === undefined ? [] : walkedBefore(run);
  });
  protected readonly beads = computed(() =>
    this.places().map(({ step, walked }) => ({ label: step.number, result: beadResult(walked) })),
  );
  protected readonly live = computed(() => {
    const step = this.step();
    return step === undefined || step.kind === 'finding' ? undefined : step.number;
  });
  /** Where the step would lead by what is typed in it now; undefined while nothing is. */
  protected readonly predicted = linkedSignal<number | undefined, string | undefined>({
    source: () => this.run()?.state.seq,
    computation: () => undefined,
  });
  protected readonly ahead = computed(() => {
    const run = this.run();
    return run === undefined ? [] : waysAhead(run, this.predicted());
  });
  protected readonly hasWay = computed(() => {
    const run = this.run();
    return run !== undefined && lastDecision(run) !== undefined;
  });
  protected readonly connection = computed(() =>
    this.isPractice() ? 'Practice is not sent' : syncWords(this.sync.view()).text,
  );
  protected readonly briefly = computed(() => {
    const kept = this.isPractice() ? 'not sent' : briefConnection(this.sync.view());
    return this.awake.isAwake() === false ? `${kept}, may go dark` : kept;
  });
  /** What lies over the step by the run's own state: it goes only when it is answered. */
  protected readonly takeover = computed<Takeover | undefined>(() => {
    const state = this.run()?.state;
    if (state === undefined) return undefined;
    if (state.alarm !== undefined) return 'limit';
    if (this.store.isElsewhere()) return 'elsewhere';
    if (state.status === 'stopped') return 'stopped';
    const isPaused = state.status === 'set-aside' || state.status === 'lead-called';
    return isPaused || this.store.needsResume() ? 'resume' : undefined;
  });
  protected readonly isCovered = computed(() => this.takeover() !== undefined || this.sheet() !== undefined);

  protected readonly readClocks = () => this.store.clocks();

  private hiddenAt: number | undefined;

  constructor() {
    // Towards the outside: the address names the run, and leaving the page gives it up.
    effect(() => void this.store.load(this.runId()));
    effect(() => void this.draft.recall(this.runId()));
    effect(() => {
      const run = this.run();
      if (run !== undefined && !this.store.isElsewhere()) this.draft.tidy(run);
    });
    // A refusal stands until what was refused is changed.
    this.draft.changed.pipe(takeUntilDestroyed()).subscribe(() => this.store.forgetProblem());
    effect(() => {
      if (this.store.problem()?.field === 'gear' && this.step()?.kind !== 'start') this.sheet.set({ show: 'gear' });
    });
    effect(() => {
      const { takeAgain, message } = this.store.problem() ?? {};
      if (takeAgain !== undefined && message !== undefined)
        this.sheet.set({ show: 'take-again', of: takeAgain, said: message });
    });
    void this.preferences.recall();
    void this.awake.take();
    const timer = setInterval(() => this.now.set(this.clock()), 10_000);
    const noteVisibility = (): void => this.noteVisibility();
    this.document.addEventListener('visibilitychange', noteVisibility);
    inject(DestroyRef).onDestroy(() => {
      clearInterval(timer);
      this.document.removeEventListener('visibilitychange', noteVisibility);
      this.store.leave();
    });
  }

  /** Does a command; what was laid over the step for it goes when it is done. */
  protected async act(command: RunCommand): Promise<void> {
    const before = this.store.state();
    if (!(await this.store.act(command))) return;
    this.afterAct(before);
  }

  protected async takeSeries(request: Parameters<ListenFlow['take']>[0]): Promise<void> {
    const before = this.store.state();
    if (await this.flow.take(request)) this.afterAct(before);
  }

  protected async keepPhoto({ command, blob }: PhotoTaken): Promise<void> {
    const before = this.store.state();
    if (await this.store.act(command, { blobs: [blob] })) this.afterAct(before);
  }

  protected async takeAgain(step: string): Promise<void> {
    await this.act({ do: 'redo', step, reason: 'its reading no longer holds' });
  }

  protected async finishListening(request: Parameters<ListenFlow['finish']>[0]): Promise<void> {
    const before = this.store.state();
    await this.flow.finish(request);
    this.afterAct(before);
  }

  protected async repeat(step: string): Promise<void> {
    if (!(await this.store.act({ do: 'resume' }))) return;
    await this.store.act({ do: 'redo', step, reason: 'repeated after a pause' }, { isFollowUp: true });
    this.sheet.set(undefined);
  }

  /** Back to where the run came from: practice to its bay, and once it is closed to its debrief. */
  protected async toBench(): Promise<void> {
    const practice = this.isClosed() ? `/practice/${this.runId()}` : '/practice';
    await this.router.navigateByUrl(this.isPractice() ? practice : '/');
  }

  protected soundHoldOver(): void {
    this.tones.play('hold-over');
  }

  protected open(sheet: LaidSheet): void {
    this.store.forgetProblem();
    this.sheet.set(sheet);
  }

  protected leaveSheet(): void {
    this.store.forgetProblem();
    this.sheet.set(undefined);
  }

  protected pedal(event: KeyboardEvent): void {
    if (event.defaultPrevented || event.ctrlKey || event.altKey || event.metaKey) return;
    const act = pedalAct(event.key, this.document.activeElement);
    if (act === undefined) return;
    event.preventDefault();
    if (event.repeat || !this.pedalGuard.admit()) return;
    if (act === 'primary') this.primary.press();
    else this.lookBack();
  }

  private lookBack(): void {
    if (this.takeover() !== undefined) return;
    const sheet = this.sheet();
    const bead = sheet?.show === 'look-back' ? sheet.bead - 1 : this.places().length - 1;
    if (bead >= 0) this.sheet.set({ show: 'look-back', bead });
  }

  private afterAct(before: Parameters<typeof toneAfter>[0]): void {
    const after = this.store.state();
    this.now.set(this.clock());
    this.sheet.set(undefined);
    const tone = after === undefined ? undefined : toneAfter(before, after);
    if (tone !== undefined) this.tones.play(tone);
    if (after?.status === 'closed') this.sync.soon();
  }

  private noteVisibility(): void {
    if (this.document.visibilityState === 'hidden') {
      this.hiddenAt = this.clock();
      return;
    }
    if (this.hiddenAt !== undefined && this.clock() - this.hiddenAt > placeLostMs) this.store.askToResume();
    this.hiddenAt = undefined;
    this.now.set(this.clock());
  }
}
