import { inject, Injectable, InjectionToken } from '@angular/core';
import { Dexie, type EntityTable, type Table } from '#dexie';
import type { RunEvent } from '../../../procedures/engine/showing';
import type { BlobRow, OutboxRow, ReceiptRow, RunRow, SettingRow, TabletKeyRow } from './stored-rows';
import type { Colleague, GearItem, PublishedProcedure, Site, Visit, VisitRun } from './wire';

/** The databases' names; specs give each test its own. */
export const storeNames = new InjectionToken<{ readonly work: string; readonly practice: string }>('storeNames', {
  factory: () => ({ work: 'bayhand', practice: 'bayhand-practice' }),
});

/** Written to the disk before a transaction reports success: a reading that was acknowledged survives a dead battery. */
const strict = { chromeTransactionDurability: 'strict' } as const;

/** The tables that a run of either kind is written to. */
export interface RunTables {
  readonly runs: EntityTable<RunRow, 'runId'>;
  readonly events: Table<RunEvent, [string, number]>;
  readonly blobs: EntityTable<BlobRow, 'sha256'>;
}

/** Everything that the tablet keeps for real work. */
@Injectable({ providedIn: 'root' })
export class OfflineStore extends Dexie implements RunTables {
  declare readonly runs: EntityTable<RunRow, 'runId'>;
  declare readonly events: Table<RunEvent, [string, number]>;
  declare readonly outbox: Table<OutboxRow, number>;
  declare readonly blobs: EntityTable<BlobRow, 'sha256'>;
  declare readonly receipts: EntityTable<ReceiptRow, 'runId'>;
  declare readonly procedures: Table<PublishedProcedure, [string, number]>;
  declare readonly sites: EntityTable<Site, 'id'>;
  declare readonly gear: EntityTable<GearItem, 'id'>;
  declare readonly people: EntityTable<Colleague, 'id'>;
  declare readonly visits: EntityTable<Visit, 'id'>;
  /** Runs of all tablets, as the server told of them. */
  declare readonly toldRuns: EntityTable<VisitRun, 'runId'>;
  declare readonly settings: EntityTable<SettingRow, 'key'>;
  declare readonly keys: EntityTable<TabletKeyRow, 'id'>;

  constructor() {
    super(inject(storeNames).work, strict);
    // Additive changes only, each as a new version: an older build must still find its tables.
    this.version(1).stores({
      runs: 'runId, visitId, changedAt',
      events: '[runId+seq]',
      outbox: '++id, kind, runId',
      blobs: 'sha256, runId',
      receipts: 'runId',
      procedures: '[id+version], id',
      sites: 'id',
      gear: 'id, siteId',
      people: 'id',
      visits: 'id, changedAt',
      settings: 'key',
      keys: 'id',
    });
    // The runs of before come with everything else: the next pull begins anew.
    this.version(2)
      .stores({ toldRuns: 'runId, visitId' })
      .upgrade((transaction) => transaction.table('settings').delete('pull-cursor'));
  }
}

/** Practice lives in a database of its own that has no outbox: it can never pass for work, nor be sent. */
@Injectable({ providedIn: 'root' })
export class PracticeStore extends Dexie implements RunTables {
  declare readonly runs: EntityTable<RunRow, 'runId'>;
  declare readonly events: Table<RunEvent, [string, number]>;
  declare readonly blobs: EntityTable<BlobRow, 'sha256'>;

  constructor() {
    super(inject(storeNames).practice, strict);
    this.version(1).stores({ runs: 'runId, changedAt', events: '[runId+seq]', blobs: 'sha256, runId' });
  }
}
