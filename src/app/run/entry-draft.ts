import { computed, effect, inject, Injectable, signal } from '@angular/core';
import { SettingsBook } from '../core/settings-book';
import { RunStore } from './run-store';

interface KeptDraft {
  /** The claim that it belongs to. */
  readonly place: string;
  readonly value: unknown;
}

/**
 * What was entered in the current claim and is not recorded yet, kept on the tablet so that a reload loses nothing.
 * It is no part of the record. Provided by the run's page.
 */
@Injectable()
export class EntryDraft {
  private readonly settings = inject(SettingsBook);
  private readonly store = inject(RunStore);

  private readonly kept = signal<KeptDraft | undefined>(undefined);
  private readonly runId = computed(() => this.store.view()?.header.runId);
  private readonly place = computed(() => {
    const state = this.store.state();
    return state === undefined ? undefined : `${state.header.runId}:${state.current?.claimedSeq ?? 'finding'}`;
  });

  /** The draft of this claim; undefined when there is none. Whoever reads it knows what it once put there. */
  readonly value = computed(() => (this.kept()?.place === this.place() ? this.kept()?.value : undefined));

  constructor() {
    // Towards the settings: a reload finds what was entered before it.
    effect(() => {
      const runId = this.runId();
      if (runId !== undefined) void this.recall(runId);
    });
  }

  /** Keeps what stands in the fields now. */
  async keep(value: unknown): Promise<void> {
    const place = this.place();
    const runId = this.runId();
    if (place === undefined || runId === undefined) return;
    this.kept.set({ place, value });
    await this.settings.write(keyOf(runId), { place, value });
  }

  /** Forgets it, when the run is closed. */
  async forget(): Promise<void> {
    const runId = this.runId();
    this.kept.set(undefined);
    if (runId !== undefined) await this.settings.forget(keyOf(runId));
  }

  private async recall(runId: string): Promise<void> {
    const kept = await this.settings.read<KeptDraft>(keyOf(runId));
    if (kept !== undefined && this.kept() === undefined) this.kept.set(kept);
  }
}

const keyOf = (runId: string): string => `entry-draft:${runId}`;
