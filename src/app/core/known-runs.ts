import type { RunHeader } from '../../../procedures/engine/showing';
import { dayTime } from './time-words';
import type { RunRow } from './stored-rows';
import { tabletWords } from './tablet-words';
import type { VisitRun } from './wire';

/** A run as far as this tablet knows of it: its own, or one that the server told of. */
export interface KnownRun extends Omit<VisitRun, 'tabletLabel' | 'result'> {
  /** Whether it is on this tablet, and can be opened here. */
  readonly isHere: boolean;
  /** `this tablet`, `tablet B2`. */
  readonly tablet: string;
  /** The number of the step that it is at, where it is here. */
  readonly step?: string;
  /** The last that is known to have happened, milliseconds since 1970. */
  readonly lastAt: number;
}

/** What makes runs the same work: one visit, one procedure, one half of it (none: the whole procedure). */
export type SameWork = Pick<RunHeader, 'visitId' | 'procedureId' | 'half'>;

/** The runs of this tablet and those that the server told of, each once, the latest first. What is here knows better. */
export function knownRuns(own: readonly RunRow[], told: readonly VisitRun[]): readonly KnownRun[] {
  const here = new Set(own.map(({ runId }) => runId));
  const elsewhere = told.filter(({ runId }) => !here.has(runId));
  return [...own.map(ownRun), ...elsewhere.map(toldRun)].sort((a, b) => b.lastAt - a.lastAt);
}

/** Those of the runs that are the same work. */
export function runsOfSameWork(runs: readonly KnownRun[], work: SameWork): readonly KnownRun[] {
  return runs.filter(
    (run) => run.visitId === work.visitId && run.procedureId === work.procedureId && run.half === work.half,
  );
}

/** Runs of the same work of which at least two were begun without knowing of each other, group by group. */
export function begunUnaware(runs: readonly KnownRun[]): readonly (readonly KnownRun[])[] {
  const groups = new Map<string, KnownRun[]>();
  for (const run of runs) {
    const key = [run.visitId, run.procedureId, run.half ?? ''].join('/');
    groups.set(key, [...(groups.get(key) ?? []), run]);
  }
  return [...groups.values()].filter(areUnaware);
}

/** Whether two of these runs were begun without that the later one names the earlier. */
export function areUnaware(runs: readonly Pick<VisitRun, 'runId' | 'again'>[]): boolean {
  const knows = (one: Pick<VisitRun, 'again'>, other: Pick<VisitRun, 'runId'>): boolean =>
    one.again?.besides.includes(other.runId) === true;
  return runs.some((one, place) => runs.slice(place + 1).some((other) => !knows(one, other) && !knows(other, one)));
}

export const isOver = ({ status }: Pick<VisitRun, 'status'>): boolean => status === 'closed' || status === 'signed';

/** `cold half`, or `procedure` where it is not run in halves. */
export const workWords = ({ half }: Pick<SameWork, 'half'>): string =>
  half === undefined ? 'procedure' : `${half} half`;

/** Who began it, when and where: `R. Adeyemi, today 9:05, on tablet B2`. */
export function begunWords({ personName, openedAt, tablet }: KnownRun, now: number): string {
  return `${personName}, ${dayTime(openedAt, now)}, on ${tablet}`;
}

const stateWords: Readonly<Record<VisitRun['status'], string>> = {
  open: 'still open',
  'set-aside': 'set aside',
  stopped: 'stopped',
  'lead-called': 'waits for the lead',
  closed: 'closed',
  signed: 'signed',
};

/** How it stands: `still open`, `closed: Does not seal`. */
export function standingWords({ status, verdict }: Pick<VisitRun, 'status' | 'verdict'>): string {
  return verdict === undefined ? stateWords[status] : `${stateWords[status]}: ${verdict}`;
}

function ownRun({ runId, visitId, header, summary, changedAt }: RunRow): KnownRun {
  const { procedureId, half, pairId } = header;
  return {
    runId,
    visitId,
    procedureId,
    procedureTitle: summary?.procedureTitle ?? procedureId,
    personName: summary?.personName ?? 'somebody',
    openedAt: summary?.openedAt ?? changedAt,
    status: summary?.status ?? 'open',
    ...(half === undefined ? {} : { half }),
    ...(pairId === undefined ? {} : { pairId }),
    ...(summary?.verdict === undefined ? {} : { verdict: summary.verdict }),
    ...(summary?.current === undefined ? {} : { step: summary.current.number }),
    ...(summary?.again === undefined ? {} : { again: summary.again }),
    isHere: true,
    tablet: 'this tablet',
    lastAt: changedAt,
  };
}

function toldRun({ tabletLabel, result: _result, ...run }: VisitRun): KnownRun {
  const tablet = tabletLabel === undefined ? 'another tablet' : tabletWords(tabletLabel);
  return { ...run, isHere: false, tablet, lastAt: run.openedAt };
}
