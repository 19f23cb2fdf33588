import { computed, inject, Injectable, InjectionToken, signal } from '@angular/core';

/** The browser's storage; undefined where it has none (no secure context). */
export const browserStorage = new InjectionToken<StorageManager | undefined>('browserStorage', {
  factory: () => (typeof navigator === 'undefined' ? undefined : navigator.storage),
});

/** A photo as a tablet's camera makes it, after it was made smaller here: common practice, no source. */
const photoBytes = 1_200_000;

/** How much room is left on the tablet, and whether the browser may clear it on its own. */
@Injectable({ providedIn: 'root' })
export class StorageRoom {
  private readonly storage = inject(browserStorage);

  private readonly estimate = signal<{ readonly usedBytes: number; readonly freeBytes: number } | undefined>(undefined);
  private readonly persistent = signal<boolean | undefined>(undefined);

  /** Bytes that are used and free; undefined where the browser does not say. */
  readonly room = this.estimate.asReadonly();
  /** Whether the browser promised to keep what is stored; undefined before it was asked. */
  readonly isPersistent = this.persistent.asReadonly();
  /** About how many photos still fit, to two digits; undefined where the browser does not say. */
  readonly photosLeft = computed(() => {
    const room = this.estimate();
    return room && roughly(room.freeBytes / photoBytes);
  });

  /** Asks the browser to keep what is stored, and measures the room. Safe to call again. */
  async secure(): Promise<void> {
    if (!this.storage) return;
    const isKept = (await this.storage.persisted?.()) ?? false;
    this.persistent.set(isKept || ((await this.storage.persist?.()) ?? false));
    await this.measure();
  }

  /** Measures the room anew. */
  async measure(): Promise<void> {
    const { quota, usage } = (await this.storage?.estimate?.()) ?? {};
    if (quota === undefined || usage === undefined) return;
    this.estimate.set({ usedBytes: usage, freeBytes: Math.max(0, quota - usage) });
  }
}

function roughly(count: number): number {
  if (count < 100) return Math.floor(count);
  const unit = 10 ** (Math.floor(Math.log10(count)) - 1);
  return Math.floor(count / unit) * unit;
}
