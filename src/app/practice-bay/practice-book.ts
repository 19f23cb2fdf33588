import { computed, inject, Injectable } from '@angular/core';
import { liveRows } from '../core/live-rows';
import { OfflineStore, PracticeStore } from '../core/offline-store';
import { Session } from '../core/session';
import type { RunRow } from '../core/stored-rows';
import type { PublishedProcedure } from '../core/wire';
import type { PracticeScenario } from '../shared/practice/practice-scenario';
import { practiceScenarios, scenarioOfVisit } from '../shared/practice/practice-scenarios';

/** A practice run of the person, as the list shows it. */
export interface PracticeTry {
  readonly runId: string;
  /** Absent when the app no longer has the scenario. */
  readonly scenario: PracticeScenario | undefined;
  readonly title: string;
  readonly changedAt: number;
  readonly isOpen: boolean;
  /** The current step, while it is open. */
  readonly step: string | undefined;
  /** The finding's title, once one is reached. */
  readonly found: string | undefined;
  /** Whether it is the planted one; undefined while there is none. */
  readonly isFound: boolean | undefined;
}

/** A scenario with how often the person has tried it. */
export interface OfferedScenario {
  readonly scenario: PracticeScenario;
  readonly procedure: PublishedProcedure | undefined;
  readonly tries: number;
  readonly found: number;
}

/** What there is to practise on, and the person's own practice runs, newest first. They never leave this tablet. */
@Injectable()
export class PracticeBook {
  private readonly offline = inject(OfflineStore);
  private readonly practice = inject(PracticeStore);
  private readonly session = inject(Session);

  private readonly rows = liveRows(() => this.practice.runs.orderBy('changedAt').reverse().toArray());
  private readonly procedures = liveRows(() => this.offline.procedures.toArray());

  /** Undefined until the store has answered. */
  readonly tries = computed(() => {
    const person = this.session.person()?.id;
    const procedures = this.procedures();
    if (procedures === undefined) return undefined;
    return this.rows()
      ?.filter(({ openedBy }) => openedBy === person)
      .map((row) => tryOf(row, procedures));
  });
  readonly offers = computed<readonly OfferedScenario[] | undefined>(() => {
    const tries = this.tries();
    const procedures = this.procedures();
    if (tries === undefined || procedures === undefined) return undefined;
    return practiceScenarios.map((scenario) => {
      const own = tries.filter((entry) => entry.scenario === scenario && !entry.isOpen);
      return {
        scenario,
        procedure: newestPublished(procedures, scenario.procedureId),
        tries: own.length,
        found: own.filter(({ isFound }) => isFound === true).length,
      };
    });
  });
}

/** The version that a new run takes: the newest that is not withdrawn. */
export function newestPublished(
  procedures: readonly PublishedProcedure[],
  procedureId: string,
): PublishedProcedure | undefined {
  return procedures
    .filter(({ id, status }) => id === procedureId && status === 'published')
    .reduce<PublishedProcedure | undefined>(
      (newest, entry) => (newest === undefined || entry.version > newest.version ? entry : newest),
      undefined,
    );
}

function tryOf(row: RunRow, procedures: readonly PublishedProcedure[]): PracticeTry {
  const { header, summary } = row;
  const scenario = scenarioOfVisit(header.visitId);
  const document = procedures.find(
    ({ id, version }) => id === header.procedureId && version === header.version,
  )?.document;
  const planted = document?.steps.find(({ id }) => id === scenario?.planted.finding)?.title;
  const isOpen = summary?.status !== 'closed' && summary?.status !== 'signed';
  const found = summary?.verdict;
  return {
    runId: row.runId,
    scenario,
    title: scenario?.title ?? summary?.procedureTitle ?? 'A practice run',
    changedAt: row.changedAt,
    isOpen,
    step: summary?.current === undefined ? undefined : `step ${summary.current.number}, ${summary.current.title}`,
    found,
    isFound: found === undefined || planted === undefined ? undefined : found === planted,
  };
}
