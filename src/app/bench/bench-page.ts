import { ChangeDetectionStrategy, Component, computed, DestroyRef, inject, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import { AppUpdate } from '../core/app-update';
import { Session } from '../core/session';
import { StorageRoom } from '../core/storage-room';
import { Sync } from '../core/sync';
import { Tablet } from '../core/tablet';
import { clock } from '../core/time-and-ids';
import { dayTime } from '../core/time-words';
import type { Role } from '../core/wire';
import { TopBar } from '../shared/top-bar';
import { TwiceBegun } from '../shared/twice-begun';
import { BenchStore } from './bench-store';
import { ReadyList } from './ready-list';
import { RunCard } from './run-card';

interface Room {
  readonly path: string;
  readonly words: string;
  readonly roles: readonly Role[];
}

const rooms: readonly Room[] = [
  { path: '/records', words: 'Record room', roles: ['manager', 'lead'] },
  { path: '/method', words: 'Method desk', roles: ['lead'] },
  { path: '/gear', words: 'Gear shelf', roles: ['technician', 'lead', 'manager'] },
  { path: '/practice', words: 'Practice bay', roles: ['apprentice', 'technician', 'lead'] },
];

/** The room in which a role that does not work at cars is at home. */
const homes: Partial<Record<Role, { readonly path: string; readonly words: string; readonly says: string }>> = {
  manager: {
    path: '/records',
    words: 'Go to the Record room',
    says: 'Runs are begun by technicians. What they found is in the Record room.',
  },
  apprentice: {
    path: '/practice',
    words: 'Go to the Practice bay',
    says: 'You practise on the simulated bench, with faults that nobody tells you. Nothing of it counts as work.',
  },
};

const minuteMs = 60_000;

/** The Bench: what is on the car now, what waits, and what works without a network. */
@Component({
  selector: 'bay-bench-page',
  imports: [ReadyList, RouterLink, RunCard, TopBar, TwiceBegun],
  templateUrl: './bench-page.html',
  styleUrl: './bench-page.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BenchPage {
  private readonly session = inject(Session);
  private readonly sync = inject(Sync);
  private readonly storage = inject(StorageRoom);
  private readonly tablet = inject(Tablet);
  private readonly clock = inject(clock);
  protected readonly store = inject(BenchStore);
  protected readonly update = inject(AppUpdate);

  protected readonly now = signal(this.clock());
  protected readonly place = computed(() => {
    const site = this.store.siteName();
    return site === undefined ? 'Bench' : `Bench · ${site}`;
  });
  private readonly role = computed(() => this.session.person()?.role);
  protected readonly home = computed(() => homes[this.role() ?? 'technician']);
  protected readonly rooms = computed(() => {
    const role = this.role();
    return rooms.filter(({ roles }) => role !== undefined && roles.includes(role));
  });
  protected readonly worksAtCars = computed(() => this.home() === undefined);
  /** With nothing on the car, the visit to take next is the loud thing of the Bench. */
  protected readonly next = computed(() => {
    const waiting = this.store.waiting();
    return this.store.open().length > 0 ? undefined : (waiting.find(({ isTaken }) => !isTaken) ?? waiting[0]);
  });
  protected readonly listed = computed(() => {
    const next = this.next();
    return this.store.waiting().filter((item) => item !== next);
  });
  /** Halves that were begun more than once, each with its order and car. */
  protected readonly unaware = computed(() =>
    this.store.unaware().map((runs) => {
      const own = this.store.summaryOf(runs.find(({ isHere }) => isHere)?.runId);
      return { visitId: runs[0]?.visitId, runs, about: own && `RO ${own.repairOrder}, ${own.car}` };
    }),
  );
  protected readonly waiting = computed(() => this.sync.view().waiting);
  protected readonly photosLeft = this.storage.photosLeft;
  protected readonly isExpired = computed(() => this.session.state() === 'expired');
  protected readonly isUnregistered = computed(() => this.worksAtCars() && this.tablet.state() === 'refused');
  protected readonly closed = computed(() =>
    this.store.closed().map(({ runId, summary, changedAt }) => ({
      runId,
      car: summary.car,
      order: `RO ${summary.repairOrder}`,
      verdict: summary.verdict ?? 'closed',
      when: dayTime(changedAt, this.now()),
    })),
  );

  constructor() {
    const timer = setInterval(() => this.now.set(this.clock()), minuteMs);
    inject(DestroyRef).onDestroy(() => clearInterval(timer));
    void this.storage.measure();
  }
}
