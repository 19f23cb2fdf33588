import type { Provider } from '@angular/core';
import { SettingsBook } from '../../core/settings-book';
import { EntryDraft } from '../entry-draft';

/** A tablet's settings that live as long as a spec does. */
export class SettingsForSpecs implements Pick<SettingsBook, 'read' | 'write' | 'forget'> {
  readonly rows = new Map<string, unknown>();

  async read<T>(key: string): Promise<T | undefined> {
    return structuredClone(this.rows.get(key)) as T | undefined;
  }

  async write(key: string, value: unknown): Promise<void> {
    this.rows.set(key, structuredClone(value));
  }

  async forget(key: string): Promise<void> {
    this.rows.delete(key);
  }
}

/** What a step's entry needs beside its inputs; the same settings again are the same tablet after a reload. */
export function draftsForSpecs(settings = new SettingsForSpecs()): Provider[] {
  return [EntryDraft, { provide: SettingsBook, useValue: settings }];
}
