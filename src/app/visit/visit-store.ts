import { computed, inject, Injectable, type Signal } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { liveQuery } from '#dexie';
import { from, switchMap } from 'rxjs';
import { knownRuns, type KnownRun } from '../core/known-runs';
import { OfflineStore } from '../core/offline-store';
import { fitsOf, isFit, type ProcedureFit } from '../core/procedure-fit';
import type { RunRow } from '../core/stored-rows';
import type { PublishedProcedure, Visit, VisitRun } from '../core/wire';

/** What the page of one visit shows. */
export interface VisitView {
  readonly visit: Visit;
  /** The runs of this visit, of this tablet and as far as the server told of others; the latest first. */
  readonly runs: readonly KnownRun[];
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
      return found.visit === undefined ? 'missing' : viewOf({ ...found, visit: found.visit });
    });
  }

  private async read(visitId: string): Promise<FoundVisit> {
    const [visit, own, told, procedures] = await Promise.all([
      this.store.visits.get(visitId),
      this.store.runs.where('visitId').equals(visitId).toArray(),
      this.store.toldRuns.where('visitId').equals(visitId).toArray(),
      this.store.procedures.toArray(),
    ]);
    return { visit, own, told, procedures };
  }
}

interface FoundVisit {
  readonly visit: Visit | undefined;
  readonly own: readonly RunRow[];
  readonly told: readonly VisitRun[];
  readonly procedures: readonly PublishedProcedure[];
}

function viewOf({ visit, own, told, procedures }: FoundVisit & { readonly visit: Visit }): VisitView {
  const fits = fitsOf(procedures, visit);
  return {
    visit,
    runs: knownRuns(own, told),
    fitting: fits.filter(isFit),
    others: fits.filter((fit) => !isFit(fit)),
  };
}
