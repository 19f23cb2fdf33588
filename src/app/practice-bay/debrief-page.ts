import { ChangeDetectionStrategy, Component, computed, effect, inject, input, signal, untracked } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import { ResultMark } from '../shared/result-mark';
import { TopBar } from '../shared/top-bar';
import { DebriefStore } from './debrief-store';
import { PracticeStarter } from './practice-starter';

/** The debrief at the end of a practice run: what the record found against what was planted. */
@Component({
  selector: 'bay-debrief-page',
  imports: [ResultMark, RouterLink, TopBar],
  templateUrl: './debrief-page.html',
  styleUrl: './debrief-page.css',
  providers: [DebriefStore],
  host: { class: 'practice-edge' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DebriefPage {
  private readonly store = inject(DebriefStore);
  private readonly starter = inject(PracticeStarter);
  private readonly router = inject(Router);

  /** Of the address. */
  readonly runId = input.required<string>();

  protected readonly isStarting = signal(false);
  protected readonly read = computed(() => (this.store.run.hasValue() ? this.store.run.value() : undefined));
  protected readonly debriefed = computed(() => {
    const run = this.read();
    return run?.ok === true ? run : undefined;
  });
  protected readonly why = computed(() => {
    const run = this.read();
    return run?.ok === false ? run.why : undefined;
  });
  protected readonly differing = computed(
    () => this.debriefed()?.debrief.figures.filter(({ isSame }) => !isSame) ?? [],
  );

  constructor() {
    // The store lives outside the template: it follows the address.
    effect(() => {
      const runId = this.runId();
      untracked(() => this.store.show(runId));
    });
  }

  protected async startAgain(): Promise<void> {
    const run = this.debriefed();
    if (run === undefined || this.isStarting()) return;
    this.isStarting.set(true);
    const started = await this.starter.start(run.scenario, run.published).finally(() => this.isStarting.set(false));
    if (started.ok) await this.router.navigate(['/run', started.runId]);
  }
}
