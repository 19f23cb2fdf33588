import { NgTemplateOutlet } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, effect, inject, input, signal } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import type { BegunAgain } from '../../../procedures/engine/showing';
import { begunUnaware, isOver, runsOfSameWork, standingWords, type KnownRun } from '../core/known-runs';
import { clock } from '../core/time-and-ids';
import { dayTime } from '../core/time-words';
import { Tablet } from '../core/tablet';
import { carWords } from '../core/visit-book';
import type { PublishedProcedure } from '../core/wire';
import { TopBar } from '../shared/top-bar';
import { TwiceBegun } from '../shared/twice-begun';
import { BegunAlready } from './begun-already';
import { CodeMeanings } from './code-meanings';
import { ProcedureCard } from './procedure-card';
import { RunBeginner, type Half } from './run-beginner';
import { groupVin } from './vin-text';
import { VisitStore } from './visit-store';

/** One visit: the car, the concern, and the procedures that fit, from which a run begins. */
@Component({
  selector: 'bay-visit-page',
  imports: [BegunAlready, CodeMeanings, NgTemplateOutlet, ProcedureCard, RouterLink, TopBar, TwiceBegun],
  templateUrl: './visit-page.html',
  styleUrl: './visit-page.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VisitPage {
  private readonly store = inject(VisitStore);
  private readonly beginner = inject(RunBeginner);
  private readonly router = inject(Router);
  protected readonly now = inject(clock);
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
  protected readonly runs = computed(() =>
    (this.view()?.runs ?? []).map((run) => ({
      runId: run.runId,
      isHere: run.isHere,
      title: run.half === undefined ? run.procedureTitle : `${run.procedureTitle}, ${run.half}`,
      said: run.verdict ?? (run.step === undefined ? standingWords(run) : `at step ${run.step}`),
      by: run.isHere ? '' : `${run.personName}, on ${run.tablet}`,
      when: `${isOver(run) ? 'closed ' : ''}${dayTime(run.lastAt, this.now())}`,
    })),
  );
  /** Halves that were begun more than once, the one not knowing of the other. */
  protected readonly unaware = computed(() => begunUnaware(this.view()?.runs ?? []));
  /** What a person wants to begin although it is begun already. */
  protected readonly asked = signal<{ procedure: PublishedProcedure; half: Half | undefined } | undefined>(undefined);
  protected readonly beside = computed(() => {
    const asked = this.asked();
    return asked === undefined ? [] : this.others(asked.procedure, asked.half);
  });

  constructor() {
    // Whether the tablet is registered is in the store; reading it is asked for once.
    effect(() => void this.tablet.registeredId());
  }

  protected begunHalves(procedureId: string): readonly Half[] {
    const runs = this.view()?.runs ?? [];
    return runs.flatMap((run) => (run.procedureId === procedureId && run.half !== undefined ? [run.half] : []));
  }

  /** Begins the run, unless the same was begun already: then it says so first. */
  protected async start(procedure: PublishedProcedure, half: Half | undefined): Promise<void> {
    if (this.others(procedure, half).length > 0) this.asked.set({ procedure, half });
    else await this.begin(procedure, half);
  }

  protected async startAgain(because: string): Promise<void> {
    const asked = this.asked();
    if (asked === undefined) return;
    const besides = this.beside().map(({ runId }) => runId);
    await this.begin(asked.procedure, asked.half, { because, besides });
  }

  private others({ id: procedureId }: PublishedProcedure, half: Half | undefined): readonly KnownRun[] {
    const view = this.view();
    return view === undefined ? [] : runsOfSameWork(view.runs, { visitId: view.visit.id, procedureId, half });
  }

  private async begin(procedure: PublishedProcedure, half: Half | undefined, again?: BegunAgain): Promise<void> {
    const visit = this.view()?.visit;
    if (!visit || this.isBusy()) return;
    this.isBusy.set(true);
    this.problem.set(undefined);
    try {
      const begun = await this.beginner.begin(visit, procedure, half, again);
      if (begun.ok) await this.router.navigate(['/run', begun.runId]);
      else this.problem.set(begun.message);
    } finally {
      this.isBusy.set(false);
    }
  }
}
