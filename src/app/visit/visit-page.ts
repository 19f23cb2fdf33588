import { ChangeDetectionStrategy, Component, computed, effect, inject, input, signal } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import { clock } from '../core/time-and-ids';
import { dayTime } from '../core/time-words';
import { Tablet } from '../core/tablet';
import { carWords } from '../core/visit-book';
import type { PublishedProcedure } from '../core/wire';
import { TopBar } from '../shared/top-bar';
import { ProcedureCard } from './procedure-card';
import { RunBeginner, type Half } from './run-beginner';
import { codeWords } from '../shared/trouble-code-words';
import { groupVin } from './vin-words';
import { VisitStore } from './visit-store';

/** One visit: the car, the concern, and the procedures that fit, from which a run begins. */
@Component({
  selector: 'bay-visit-page',
  imports: [ProcedureCard, RouterLink, TopBar],
  templateUrl: './visit-page.html',
  styleUrl: './visit-page.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VisitPage {
  private readonly store = inject(VisitStore);
  private readonly beginner = inject(RunBeginner);
  private readonly router = inject(Router);
  private readonly now = inject(clock);
  private readonly tablet = inject(Tablet);

  readonly id = input.required<string>();

  protected readonly read = this.store.view(this.id);
  protected readonly view = computed(() => {
    const view = this.read();
    return view === 'missing' ? undefined : view;
  });
  protected readonly isBusy = signal(false);
  protected readonly problem = signal<string | undefined>(undefined);
  protected readonly isUnregistered = computed(() => {
    const state = this.tablet.state();
    return state === 'unregistered' || state === 'refused';
  });
  protected readonly title = computed(() => {
    const view = this.view();
    return view ? carWords(view.visit) : '';
  });
  protected readonly vin = computed(() => groupVin(this.view()?.visit.vin ?? ''));
  protected readonly odometer = computed(() => {
    const { text = '', unit = '' } = this.view()?.visit.odometer ?? {};
    return `${text.replace(/\B(?=(\d{3})+$)/g, ',')} ${unit}`;
  });
  protected readonly codes = computed(() =>
    (this.view()?.visit.codes ?? []).map((code) => ({ code, words: codeWords(code) })),
  );
  protected readonly runs = computed(() =>
    (this.view()?.runs ?? []).map(({ runId, summary, changedAt, header }) => ({
      runId,
      title: summary?.procedureTitle ?? header.procedureId,
      half: header.half,
      said: summary?.verdict ?? (summary?.current ? `at step ${summary.current.number}` : ''),
      isClosed: summary?.status === 'closed' || summary?.status === 'signed',
      when: dayTime(changedAt, this.now()),
    })),
  );

  constructor() {
    // Whether the tablet is registered is in the store; reading it is asked for once.
    effect(() => void this.tablet.registeredId());
  }

  protected begunHalves(procedureId: string): readonly Half[] {
    const runs = this.view()?.runs ?? [];
    return runs.flatMap(({ header }) =>
      header.procedureId === procedureId && header.half !== undefined ? [header.half] : [],
    );
  }

  protected async begin(procedure: PublishedProcedure, half: Half | undefined): Promise<void> {
    const visit = this.view()?.visit;
    if (!visit || this.isBusy()) return;
    this.isBusy.set(true);
    this.problem.set(undefined);
    try {
      const begun = await this.beginner.begin(visit, procedure, half);
      if (begun.ok) await this.router.navigate(['/run', begun.runId]);
      else this.problem.set(begun.message);
    } finally {
      this.isBusy.set(false);
    }
  }
}
