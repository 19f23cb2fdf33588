import { computed, inject, Injectable } from '@angular/core';
import { liveRows } from '../core/live-rows';
import { OfflineStore } from '../core/offline-store';
import { Session } from '../core/session';
import { RunStore } from './run-store';

/** The instruments that the run may choose from: those of its site; in practice those of the person's own. */
@Injectable()
export class RunGear {
  private readonly store = inject(OfflineStore);
  private readonly run = inject(RunStore);
  private readonly session = inject(Session);
  private readonly all = liveRows(() => this.store.gear.toArray());

  readonly items = computed(() => {
    const all = this.all() ?? [];
    const siteId = this.run.view()?.header.siteId;
    const ofSite = all.filter((item) => item.siteId === siteId);
    return ofSite.length > 0 ? ofSite : all.filter((item) => item.siteId === this.session.person()?.siteId);
  });
}
