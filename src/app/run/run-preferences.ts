import { inject, Injectable, signal } from '@angular/core';
import { Session } from '../core/session';
import { SettingsBook } from '../core/settings-book';

/** How a person likes the run's screens; kept with the person on this tablet. */
export interface RunPreferencesRow {
  /** Whether tones sound; the limit's always does. */
  readonly hasSound: boolean;
  /** Whether step, limit and value are drawn large enough to be read from 1.5 m. */
  readonly isFromAfar: boolean;
  /** Whether a step is said in the few words that its author gave for whoever knows the procedure. */
  readonly isBrief: boolean;
}

const usual: RunPreferencesRow = { hasSound: true, isFromAfar: false, isBrief: false };

/** Reads and keeps how a person likes the run's screens. */
@Injectable({ providedIn: 'root' })
export class RunPreferences {
  private readonly settings = inject(SettingsBook);
  private readonly session = inject(Session);

  private readonly chosen = signal<RunPreferencesRow>(usual);

  readonly current = this.chosen.asReadonly();

  async recall(): Promise<void> {
    const kept = await this.settings.read<Partial<RunPreferencesRow>>(this.key());
    this.chosen.set({ ...usual, ...kept });
  }

  async change(change: Partial<RunPreferencesRow>): Promise<void> {
    this.chosen.update((current) => ({ ...current, ...change }));
    await this.settings.write(this.key(), this.chosen());
  }

  private readonly key = (): string => `run-preferences:${this.session.person()?.id ?? 'nobody'}`;
}
