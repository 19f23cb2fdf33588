import { DestroyRef, DOCUMENT, inject, Injectable, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { SwUpdate } from '@angular/service-worker';

const lookEveryMs = 30 * 60_000;

/**
 * A new build waits until someone takes it on the Bench: code is never swapped while a run is open. The running page
 * keeps its own build until it is loaded again.
 */
@Injectable({ providedIn: 'root' })
export class AppUpdate {
  private readonly updates = inject(SwUpdate);
  private readonly document = inject(DOCUMENT);
  private readonly destroyed = inject(DestroyRef);

  private readonly ready = signal(false);
  private readonly broken = signal(false);

  /** Whether a new build is on the tablet and waits. */
  readonly isReady = this.ready.asReadonly();
  /** Whether parts of the running build are gone, so that only loading again helps. */
  readonly isBroken = this.broken.asReadonly();

  /** Begins to look for new builds; call it once the app is stable. */
  start(): void {
    if (!this.updates.isEnabled) return;
    this.updates.versionUpdates.pipe(takeUntilDestroyed(this.destroyed)).subscribe((event) => {
      if (event.type === 'VERSION_READY') this.ready.set(true);
    });
    this.updates.unrecoverable.pipe(takeUntilDestroyed(this.destroyed)).subscribe(() => this.broken.set(true));
    const timer = setInterval(() => void this.look(), lookEveryMs);
    this.destroyed.onDestroy(() => clearInterval(timer));
  }

  /** Loads the page again, with the new build. Call it from the Bench alone. */
  take(): void {
    this.document.defaultView?.location.reload();
  }

  private async look(): Promise<void> {
    try {
      await this.updates.checkForUpdate();
    } catch {
      // Without a network there is nothing to find; the next look comes by itself.
    }
  }
}
