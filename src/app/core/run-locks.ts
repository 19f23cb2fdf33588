import { inject, Injectable, InjectionToken } from '@angular/core';

/** The browser's locks; undefined where it has none (no secure context). */
export const webLocks = new InjectionToken<LockManager | undefined>('webLocks', {
  factory: () => (typeof navigator === 'undefined' ? undefined : navigator.locks),
});

/**
 * One lock per run, so that two tabs cannot both write it. Without locks in the browser the store's own key still
 * refuses a second event at a taken place; only the early warning is missing.
 */
@Injectable({ providedIn: 'root' })
export class RunLocks {
  private readonly locks = inject(webLocks);
  private readonly held = new Map<string, () => void>();

  /** Takes the run for this tab until `release`; false when another tab has it. */
  async hold(runId: string): Promise<boolean> {
    const { locks } = this;
    if (locks === undefined || this.held.has(runId)) return true;
    return new Promise((resolve, reject) => {
      locks
        .request(nameOf(runId), { ifAvailable: true }, (lock) => {
          if (lock === null) return resolve(false);
          return new Promise<void>((release) => {
            this.held.set(runId, release);
            resolve(true);
          });
        })
        .catch(reject);
    });
  }

  /** Gives the run up, so that another tab may take it. */
  release(runId: string): void {
    this.held.get(runId)?.();
    this.held.delete(runId);
  }

  /** Runs `write` while this tab has the run; `isElsewhere` answers when another has it. */
  async during<T>(runId: string, write: () => Promise<T>, isElsewhere: () => T): Promise<T> {
    if (this.held.has(runId) || this.locks === undefined) return write();
    return (await this.hold(runId)) ? write().finally(() => this.release(runId)) : isElsewhere();
  }
}

const nameOf = (runId: string): string => `bayhand-run-${runId}`;
