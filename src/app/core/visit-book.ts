import { inject, Injectable } from '@angular/core';
import { OfflineStore } from './offline-store';
import type { Visit } from './wire';

/** The visits of this tablet: kept here first, then sent. */
@Injectable({ providedIn: 'root' })
export class VisitBook {
  private readonly store = inject(OfflineStore);

  /** A visit; undefined when this tablet does not have it. */
  find(id: string): Promise<Visit | undefined> {
    return this.store.visits.get(id);
  }

  /** Keeps a new or changed visit and queues it, in one transaction. */
  async keep(visit: Visit): Promise<void> {
    const { outbox, visits } = this.store;
    await this.store.transaction('rw', [visits, outbox], async () => {
      await visits.put(visit);
      await outbox.filter((row) => row.kind === 'document' && row.documentId === visit.id).delete();
      await outbox.add({
        kind: 'document',
        documentKind: 'visit',
        documentId: visit.id,
        changedAt: visit.changedAt,
        since: visit.changedAt,
      });
    });
  }
}

/** The car in a few words: `Merrow Heron, silver`. */
export function carWords({ car }: Pick<Visit, 'car'>): string {
  const name = [car.make, car.model].filter((word) => word !== '').join(' ');
  return car.colour === undefined || car.colour === '' ? name : `${name}, ${car.colour}`;
}
