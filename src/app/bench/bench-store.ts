import { computed, inject, Injectable, type Signal } from '@angular/core';
import { begunUnaware, isOver, knownRuns, standingWords, type KnownRun } from '../core/known-runs';
import { liveRows } from '../core/live-rows';
import { OfflineStore } from '../core/offline-store';
import { Session } from '../core/session';
import { fitsOf, isFit, readyOffline } from '../core/procedure-fit';
import type { RunRow, RunSummary } from '../core/stored-rows';
import { clock } from '../core/time-and-ids';
import { daysUntil } from '../core/time-words';
import { carWords } from '../core/visit-book';
import type { GearItem, PublishedProcedure, Visit } from '../core/wire';

/** A run that is not closed. */
export interface OpenRun {
  readonly runId: string;
  readonly summary: RunSummary;
  readonly changedAt: number;
  readonly isMine: boolean;
}

/** A run that was closed on this tablet. */
export interface ClosedRun {
  readonly runId: string;
  readonly summary: RunSummary;
  readonly changedAt: number;
}

/** A visit on which nothing was begun, only one half of a pair, or something on another tablet. */
export interface WaitingVisit {
  readonly visit: Visit;
  readonly car: string;
  /** `2 procedures fit`, `warm half not recorded yet`, or who is at it elsewhere. */
  readonly fits: string;
  /** Whether someone is at it on another tablet. */
  readonly isTaken: boolean;
}

/** What is on the tablet, so that it works without a network. */
export interface ReadyView {
  readonly procedures: number;
  /** When the newest was published, ISO 8601. */
  readonly newestAt: string | undefined;
  readonly instruments: number;
  /** The instrument whose check ends first, with the days until then; negative once it is overdue. */
  readonly nextDue: { readonly label: string; readonly days: number } | undefined;
}

/** How many closed runs the Bench still lists. */
const closedShown = 5;

/** What lies on the Bench: runs, visits, and what is ready without a network. */
@Injectable({ providedIn: 'root' })
export class BenchStore {
  private readonly store = inject(OfflineStore);
  private readonly session = inject(Session);
  private readonly now = inject(clock);

  private readonly runs = liveRows(() => this.store.runs.orderBy('changedAt').reverse().toArray());
  private readonly told = liveRows(() => this.store.toldRuns.toArray());
  private readonly visits = liveRows(() => this.store.visits.orderBy('changedAt').reverse().toArray());
  private readonly procedures = liveRows(() => this.store.procedures.toArray());
  private readonly gear = liveRows(() => this.store.gear.toArray());
  private readonly sites = liveRows(() => this.store.sites.toArray());

  /** Whether the tablet's store has answered. */
  readonly isRead = computed(() => this.runs() !== undefined && this.visits() !== undefined);
  /** Where the person works. */
  readonly siteName = computed(() => this.sites()?.find(({ id }) => id === this.session.person()?.siteId)?.name);
  /** Runs that are not closed, the person's own first, the latest first. */
  readonly open: Signal<readonly OpenRun[]> = computed(() =>
    summarised(this.runs())
      .filter(({ summary }) => !isClosed(summary))
      .map(({ runId, summary, changedAt, openedBy }) => ({
        runId,
        summary,
        changedAt,
        isMine: openedBy === this.session.person()?.id,
      }))
      .sort((a, b) => Number(b.isMine) - Number(a.isMine)),
  );
  /** The latest closed ones. */
  readonly closed: Signal<readonly ClosedRun[]> = computed(() =>
    summarised(this.runs())
      .filter(({ summary }) => isClosed(summary))
      .slice(0, closedShown),
  );
  private readonly known = computed(() => knownRuns(this.runs() ?? [], this.told() ?? []));
  /** Halves that go on here and were begun a second time, here or elsewhere, the one not knowing of the other. */
  readonly unaware = computed(() =>
    begunUnaware(this.known()).filter((group) => group.some(({ isHere }) => isHere) && !group.every(isOver)),
  );
  readonly waiting: Signal<readonly WaitingVisit[]> = computed(() =>
    waitingVisits(this.visits() ?? [], this.known(), this.procedures() ?? []),
  );
  readonly ready: Signal<ReadyView> = computed(() => {
    const usable = readyOffline(this.procedures() ?? []);
    const here = (this.gear() ?? []).filter(({ siteId, inUse }) => inUse && siteId === this.session.person()?.siteId);
    return {
      procedures: usable.length,
      newestAt: usable.map(({ publishedAt }) => publishedAt).reduce((a, b) => (a > b ? a : b), '') || undefined,
      instruments: here.length,
      nextDue: nextDueOf(here, this.now()),
    };
  });

  /** What is shown of a run of this tablet. */
  summaryOf(runId: string | undefined): RunSummary | undefined {
    return this.runs()?.find((run) => run.runId === runId)?.summary;
  }
}

type Summarised = RunRow & { readonly summary: RunSummary };

const summarised = (rows: readonly RunRow[] | undefined): readonly Summarised[] =>
  (rows ?? []).filter((row): row is Summarised => row.summary !== undefined);

const isClosed = ({ status }: RunSummary): boolean => status === 'closed' || status === 'signed';

function nextDueOf(gear: readonly GearItem[], now: number): ReadyView['nextDue'] {
  const [first] = [...gear].sort((a, b) => (a.dueOn < b.dueOn ? -1 : 1));
  return first && { label: first.label, days: daysUntil(first.dueOn, now) };
}

function waitingVisits(
  visits: readonly Visit[],
  runs: readonly KnownRun[],
  procedures: readonly PublishedProcedure[],
): readonly WaitingVisit[] {
  return visits.flatMap((visit): WaitingVisit[] => {
    const ofVisit = runs.filter(({ visitId }) => visitId === visit.id);
    const car = carWords(visit);
    if (ofVisit.length === 0) return [{ visit, car, fits: fitWords(procedures, visit), isTaken: false }];
    const open = ofVisit.find((run) => !isOver(run));
    if (open !== undefined) {
      const fits = `${open.personName} has it on ${open.tablet}: ${standingWords(open)}`;
      return ofVisit.some(({ isHere }) => isHere) ? [] : [{ visit, car, fits, isTaken: true }];
    }
    const half = missingHalf(ofVisit);
    return half === undefined ? [] : [{ visit, car, fits: `${half} half not recorded yet`, isTaken: false }];
  });
}

/** The half that a closed run still lacks its partner for. */
function missingHalf(runs: readonly KnownRun[]): 'cold' | 'warm' | undefined {
  const halves = new Map<string, Set<string>>();
  for (const { pairId, half } of runs) {
    if (pairId === undefined || half === undefined) continue;
    halves.set(pairId, (halves.get(pairId) ?? new Set()).add(half));
  }
  const alone = [...halves.values()].find((pair) => pair.size === 1);
  if (alone === undefined) return undefined;
  return alone.has('cold') ? 'warm' : 'cold';
}

function fitWords(procedures: readonly PublishedProcedure[], visit: Visit): string {
  const count = fitsOf(procedures, visit).filter(isFit).length;
  if (count === 0) return 'choose a procedure';
  return count === 1 ? '1 procedure fits' : `${count} procedures fit`;
}
