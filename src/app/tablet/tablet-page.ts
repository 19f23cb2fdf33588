import { ChangeDetectionStrategy, Component, computed, effect, inject, linkedSignal, signal } from '@angular/core';
import { ApiProblem } from '../core/api-problem';
import { buildId } from '../core/build-id';
import { assumedPxPerMm, cardWidthMm, HandSetting, pxPerMmRange } from '../core/hand-setting';
import { Session } from '../core/session';
import { StorageRoom } from '../core/storage-room';
import { Sync } from '../core/sync';
import { Tablet } from '../core/tablet';
import { TopBar } from '../shared/top-bar';
import { RefusedList } from './refused-list';
import { RefusedStore } from './refused-store';

/** This tablet: its registration, how it is held, how large its pixels are, its room, and what the server refused. */
@Component({
  selector: 'bay-tablet-page',
  imports: [RefusedList, TopBar],
  templateUrl: './tablet-page.html',
  styleUrl: './tablet-page.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TabletPage {
  private readonly session = inject(Session);
  private readonly sync = inject(Sync);
  protected readonly refused = inject(RefusedStore);
  protected readonly tablet = inject(Tablet);
  protected readonly holding = inject(HandSetting);
  protected readonly storage = inject(StorageRoom);
  protected readonly build = inject(buildId);

  protected readonly label = signal('');
  protected readonly isBusy = signal(false);
  protected readonly problem = signal<string | undefined>(undefined);
  protected readonly mayRegister = computed(() => {
    const role = this.session.person()?.role;
    return role === 'lead' || role === 'manager';
  });
  protected readonly view = this.sync.view;
  protected readonly range = pxPerMmRange;
  protected readonly pxPerMm = linkedSignal(() => this.holding.pxPerMm() ?? assumedPxPerMm);
  protected readonly cardWidth = computed(() => this.pxPerMm() * cardWidthMm);
  protected readonly roomWords = computed(() => {
    const room = this.storage.room();
    return room === undefined ? undefined : `${gigabytes(room.usedBytes)} used, ${gigabytes(room.freeBytes)} free`;
  });

  constructor() {
    // Whether the tablet is registered is in the store; reading it is asked for once.
    effect(() => void this.tablet.registeredId());
    void this.storage.measure();
  }

  protected async register(event: Event): Promise<void> {
    event.preventDefault();
    const label = this.label().trim();
    if (label === '') return this.problem.set('Give the tablet a name, such as Tablet B2.');
    this.isBusy.set(true);
    this.problem.set(undefined);
    try {
      await this.tablet.register(label);
      void this.sync.again();
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      this.problem.set(
        error.isUnavailable ? 'The server cannot be reached. Registering needs the network.' : error.message,
      );
    } finally {
      this.isBusy.set(false);
    }
  }

  protected resize(text: string): void {
    const size = Number(text);
    if (size >= pxPerMmRange.low && size <= pxPerMmRange.high) this.pxPerMm.set(size);
  }

  protected nudge(by: number): void {
    const size = Math.round((this.pxPerMm() + by) * 100) / 100;
    this.pxPerMm.set(Math.min(pxPerMmRange.high, Math.max(pxPerMmRange.low, size)));
  }

  protected async offerAgain(id: string): Promise<void> {
    await this.refused.offerAgain(id);
    await this.sync.again();
  }

  protected async syncNow(): Promise<void> {
    await this.sync.again();
  }
}

const gigabytes = (bytes: number): string =>
  bytes < 1e9 ? `${Math.round(bytes / 1e6)} MB` : `${(bytes / 1e9).toFixed(1)} GB`;
