import { computed, inject, Injectable } from '@angular/core';
import { liveRows } from '../core/live-rows';
import { OfflineStore } from '../core/offline-store';
import { Session } from '../core/session';

/** Who is signed in, and who else has an account: for what a run asks of somebody else. Provided by the steps
 * after the first. */
@Injectable()
export class RunPeople {
  private readonly store = inject(OfflineStore);
  private readonly all = liveRows(() => this.store.people.toArray());

  readonly person = inject(Session).person;
  /** By name. */
  readonly people = computed(() => [...(this.all() ?? [])].sort((a, b) => (a.displayName < b.displayName ? -1 : 1)));
}
