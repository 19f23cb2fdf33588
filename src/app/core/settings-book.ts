import { inject, Injectable } from '@angular/core';
import { OfflineStore } from './offline-store';

/** Small values that outlive a reload: settings of the tablet or of a person, cursors, drafts of forms. */
@Injectable({ providedIn: 'root' })
export class SettingsBook {
  private readonly store = inject(OfflineStore);

  /** The value under a key; undefined when there is none. The caller knows what it once put there. */
  async read<T>(key: string): Promise<T | undefined> {
    const row = await this.store.settings.get(key);
    return row?.value as T | undefined;
  }

  /** Keeps a value. */
  async write(key: string, value: unknown): Promise<void> {
    await this.store.settings.put({ key, value });
  }

  /** Forgets a value. */
  async forget(key: string): Promise<void> {
    await this.store.settings.delete(key);
  }
}
