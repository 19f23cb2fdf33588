import { DestroyRef, DOCUMENT, inject, Injectable, InjectionToken, signal } from '@angular/core';

/** The browser's way to keep a screen awake; undefined where it has none (no secure context). */
export const screenWakeLock = new InjectionToken<WakeLock | undefined>('screenWakeLock', {
  factory: () => (typeof navigator === 'undefined' ? undefined : navigator.wakeLock),
});

/** Keeps the screen awake while a run is on it, and says when it cannot. Provided by the run's page. */
@Injectable()
export class AwakeScreen {
  private readonly lock = inject(screenWakeLock);
  private readonly document = inject(DOCUMENT);

  private readonly held = signal<boolean | undefined>(undefined);
  private sentinel: WakeLockSentinel | undefined;
  private isWanted = false;

  /** Whether the screen stays awake; undefined before it was asked for. */
  readonly isAwake = this.held.asReadonly();

  constructor() {
    const again = (): void => {
      if (this.isWanted && this.document.visibilityState === 'visible') void this.take();
    };
    this.document.addEventListener('visibilitychange', again);
    inject(DestroyRef).onDestroy(() => {
      this.document.removeEventListener('visibilitychange', again);
      this.isWanted = false;
      void this.sentinel?.release();
    });
  }

  /** Takes the lock, and takes it again whenever the page comes back. */
  async take(): Promise<void> {
    this.isWanted = true;
    if (this.lock === undefined) return this.held.set(false);
    try {
      const sentinel = await this.lock.request('screen');
      if (!this.isWanted) return void sentinel.release();
      this.sentinel = sentinel;
      this.held.set(true);
      sentinel.addEventListener('release', () => this.held.set(false));
    } catch (error) {
      // NotAllowedError: a hidden page, a low battery or power saving; it is shown, and tried again on return.
      if (!(error instanceof DOMException)) throw error;
      this.held.set(false);
    }
  }
}
