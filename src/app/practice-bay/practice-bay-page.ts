import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { Router } from '@angular/router';
import { NobodyToSign } from '../core/run-journal';
import { Sync } from '../core/sync';
import { clock } from '../core/time-and-ids';
import { TopBar } from '../shared/top-bar';
import { PracticeBook, type OfferedScenario } from './practice-book';
import { PracticeStarter } from './practice-starter';
import { ScenarioCard } from './scenario-card';
import { TryList } from './try-list';

/** The Practice bay: cars with a fault that nobody is told about, and one's own tries at them. */
@Component({
  selector: 'bay-practice-bay-page',
  imports: [ScenarioCard, TopBar, TryList],
  templateUrl: './practice-bay-page.html',
  styleUrl: './practice-bay-page.css',
  providers: [PracticeBook],
  host: { class: 'practice-edge' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PracticeBayPage {
  protected readonly book = inject(PracticeBook);
  private readonly starter = inject(PracticeStarter);
  private readonly router = inject(Router);
  private readonly sync = inject(Sync);

  protected readonly now = inject(clock)();
  protected readonly starting = signal<string | undefined>(undefined);
  protected readonly problem = signal<string | undefined>(undefined);
  /** The one loud start: the first car whose fault was not found yet, while no try is open. */
  protected readonly next = computed(() => {
    const isOneOpen = this.book.tries()?.some(({ isOpen }) => isOpen) ?? true;
    return isOneOpen ? undefined : this.book.offers()?.find(({ found }) => found === 0)?.scenario.id;
  });
  protected readonly lacksProcedure = computed(() => this.book.offers()?.every(({ procedure }) => !procedure) ?? false);
  protected readonly lackText = computed(() =>
    this.sync.view().isReached === false
      ? 'It comes from the server with the first sync, and there is no network now. After that, practice needs none.'
      : 'It comes with the first sync, which may still be under way.',
  );

  protected async start({ scenario, procedure }: OfferedScenario): Promise<void> {
    if (procedure === undefined || this.starting() !== undefined) return;
    this.starting.set(scenario.id);
    this.problem.set(undefined);
    try {
      const started = await this.starter.start(scenario, procedure);
      if (started.ok) await this.router.navigate(['/run', started.runId]);
      else this.problem.set(started.why);
    } catch (error) {
      if (!(error instanceof NobodyToSign)) throw error;
      this.problem.set(error.message);
    } finally {
      this.starting.set(undefined);
    }
  }
}
