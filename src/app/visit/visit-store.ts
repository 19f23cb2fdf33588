import { computed, inject, Injectable, type Signal } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { liveQuery } from 'dexie';
import { from, switchMap } from 'rxjs';
import { OfflineStore } from '../core/offline-store';
import { fitsOf, isFit, type ProcedureFit } from '../core/procedure-fit';
import type { RunRow } from '../core/stored-rows';
import type { PublishedProcedure, Visit } from '../core/wire';

/** What the page of one visit shows. */
export interface VisitView {
  readonly visit: Visit;
  /** Runs of this visit on this tablet, the latest first. */
  readonly runs: readonly RunRow[];
  readonly fitting: readonly ProcedureFit[];
  readonly others: readonly ProcedureFit[];
}

/** Reads one visit with its runs and the procedures for it, and follows every change. */
@Injectable({ providedIn: 'root' })
export class VisitStore {
  private readonly store = inject(OfflineStore);

  /** `undefined` while it is read; `missing` when this tablet does not have it. Call it in an injection context. */
  view(id: Signal<string>): Signal<VisitView | 'missing' | undefined> {
    const read = toSignal(toObservable(id).pipe(switchMap((visitId) => from(liveQuery(() => this.read(visitId))))), {
      initialValue: undefined,
    });
    return computed(() => {
      const found = read();
      if (found === undefined) return undefined;
      return found.visit === undefined ? 'missing' : viewOf(found.visit, found.runs, found.procedures);
    });
  }

  private async read(visitId: string): Promise<{
    readonly visit: Visit | undefined;
    readonly runs: readonly RunRow[];
    readonly procedures: readonly PublishedProcedure[];
  }> {
    const [visit, runs, procedures] = await Promise.all([
      this.store.visits.get(visitId),
      this.store.runs.where('visitId').equals(visitId).toArray(),
      this.store.procedures.toArray(),
    ]);
    return { visit, runs, procedures };
  }
}

function viewOf(visit: Visit, runs: readonly RunRow[], procedures: readonly PublishedProcedure[]): VisitView {
  const fits = fitsOf(procedures, visit);
  return {
    visit,
    runs: [...runs].sort((a, b) => b.changedAt - a.changedAt),
    fitting: fits.filter(isFit),
    others: fits.filter((fit) => !isFit(fit)),
  };
}
