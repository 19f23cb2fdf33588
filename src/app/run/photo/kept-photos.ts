import { computed, DestroyRef, effect, inject, Injectable, signal } from '@angular/core';
import { RunJournal } from '../../core/run-journal';
import { RunStore } from '../run-store';

/** A kept photo that can be shown. */
export interface ShownPhoto {
  readonly sha256: string;
  /** An address that holds as long as the page. */
  readonly url: string;
}

/** The kept photos of the current photo step, read back from the tablet. Provided by the steps after the first. */
@Injectable()
export class KeptPhotos {
  private readonly store = inject(RunStore);
  private readonly journal = inject(RunJournal);

  private readonly urls = signal<ReadonlyMap<string, string>>(new Map());
  private readonly kept = computed(() => {
    const view = this.store.view();
    const step = view?.state.current === undefined ? undefined : view.procedure.step(view.state.current.id);
    return step?.kind === 'photo' ? (view?.state.photos[step.name]?.photos ?? []) : [];
  });

  /** In the order in which they were taken; one whose bytes are being read is not among them yet. */
  readonly shown = computed<readonly ShownPhoto[]>(() =>
    this.kept().flatMap(({ sha256 }) => {
      const url = this.urls().get(sha256);
      return url === undefined ? [] : [{ sha256, url }];
    }),
  );

  constructor() {
    // Towards the store of evidence: the bytes of what was kept have to be read before they can be looked at.
    effect(() => this.kept().forEach(({ sha256, mediaType }) => void this.read(sha256, mediaType)));
    inject(DestroyRef).onDestroy(() => this.urls().forEach((url) => URL.revokeObjectURL(url)));
  }

  private async read(sha256: string, type: string): Promise<void> {
    if (this.urls().has(sha256)) return;
    const bytes = await this.journal.blob(sha256);
    if (bytes === undefined || this.urls().has(sha256)) return;
    const url = URL.createObjectURL(new Blob([new Uint8Array(bytes)], { type }));
    this.urls.update((urls) => new Map(urls).set(sha256, url));
  }
}
