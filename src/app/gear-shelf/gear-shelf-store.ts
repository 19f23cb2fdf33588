import { computed, inject, Injectable } from '@angular/core';
import { liveRows } from '../core/live-rows';
import { OfflineStore } from '../core/offline-store';
import { Session } from '../core/session';
import { clock } from '../core/time-and-ids';
import { dueWords, type DueWords } from './gear-words';
import type { GearItem } from '../core/wire';

/** An instrument with how it stands with its check today. */
export interface ShelvedItem extends GearItem {
  readonly due: DueWords;
}

/** The instruments of the person's own site, as they are on this tablet: what is overdue first. */
@Injectable()
export class GearShelfStore {
  private readonly offline = inject(OfflineStore);
  private readonly session = inject(Session);
  private readonly now = inject(clock);

  private readonly gear = liveRows(() => this.offline.gear.toArray());
  private readonly sites = liveRows(() => this.offline.sites.toArray());

  readonly siteName = computed(() => this.sites()?.find(({ id }) => id === this.session.person()?.siteId)?.name);
  /** Undefined until the store has answered. */
  readonly items = computed<readonly ShelvedItem[] | undefined>(() => {
    const now = this.now();
    return this.gear()
      ?.filter(({ siteId }) => siteId === this.session.person()?.siteId)
      .map((item) => ({ ...item, due: dueWords(item.dueOn, now) }))
      .sort((a, b) => (a.dueOn === b.dueOn ? compare(a.label, b.label) : compare(a.dueOn, b.dueOn)));
  });
  readonly overdue = computed(() => (this.items() ?? []).filter(({ due }) => due.state === 'overdue'));
}

function compare(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}
