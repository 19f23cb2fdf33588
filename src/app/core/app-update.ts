import {
  APP_INITIALIZER,
  createEnvironmentInjector,
  DestroyRef,
  DOCUMENT,
  EnvironmentInjector,
  inject,
  Injectable,
  isDevMode,
  runInInjectionContext,
  signal,
} from '@angular/core';
import type { SwUpdate } from '@angular/service-worker';

const lookEveryMs = 30 * 60_000;
/** The browser is hardly ever busy for longer. */
const idleWithinMs = 3_000;

/**
 * A new build waits until someone takes it on the Bench: code is never swapped while a run is open. The running page
 * keeps its own build until it is loaded again.
 */
@Injectable({ providedIn: 'root' })
export class AppUpdate {
  private readonly injector = inject(EnvironmentInjector);
  private readonly document = inject(DOCUMENT);
  private readonly destroyed = inject(DestroyRef);

  private readonly ready = signal(false);
  private readonly broken = signal(false);

  /** Whether a new build is on the tablet and waits. */
  readonly isReady = this.ready.asReadonly();
  /** Whether parts of the running build are gone, so that only loading again helps. */
  readonly isBroken = this.broken.asReadonly();

  /**
   * Registers the service worker and begins to look for new builds, in idle time: the way to the first step need not
   * wait for it. Call it once the app is shown.
   */
  start(): void {
    const window = this.document.defaultView;
    if (isDevMode() || window === null || !('serviceWorker' in window.navigator)) return;
    const begin = (): void => void this.begin();
    // Not every browser tells of idle time.
    if ('requestIdleCallback' in window) window.requestIdleCallback(begin, { timeout: idleWithinMs });
    else setTimeout(begin, idleWithinMs);
  }

  /** Loads the page again, with the new build. Call it from the Bench alone. */
  take(): void {
    this.document.defaultView?.location.reload();
  }

  private async begin(): Promise<void> {
    const { provideServiceWorker, SwUpdate } = await import('@angular/service-worker');
    const own = createEnvironmentInjector([provideServiceWorker('ngsw-worker.js')], this.injector);
    for (const initialise of own.get(APP_INITIALIZER)) runInInjectionContext(own, initialise);
    const updates = own.get(SwUpdate);
    const seen = updates.versionUpdates.subscribe((event) => {
      if (event.type === 'VERSION_READY') this.ready.set(true);
    });
    const lost = updates.unrecoverable.subscribe(() => this.broken.set(true));
    const timer = setInterval(() => void this.look(updates), lookEveryMs);
    this.destroyed.onDestroy(() => {
      clearInterval(timer);
      seen.unsubscribe();
      lost.unsubscribe();
      own.destroy();
    });
  }

  private async look(updates: SwUpdate): Promise<void> {
    try {
      await updates.checkForUpdate();
    } catch {
      // Without a network there is nothing to find; the next look comes by itself.
    }
  }
}
