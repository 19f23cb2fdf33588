import { computed, DestroyRef, inject, Injectable, resource, signal } from '@angular/core';
import type { RunEvent } from '../../../procedures/engine/showing';
import { ApiProblem } from '../core/api-problem';
import { wordOfChain } from './chain-word';
import { DamagedSeries, readSeries } from './read-series';
import { RecordArchive, recordResource } from './record-archive';
import { retellRecord } from './retell-record';
import { photoOf, type PhotoLoad } from './photo-load';
import type { SeriesLoad } from './series-load';

/** One record: fetched, its chain computed here again, replayed by the core, its series fetched one by one. */
@Injectable()
export class RecordStore {
  private readonly archive = inject(RecordArchive);

  private readonly runId = signal<string | undefined>(undefined);
  private readonly loads = signal<ReadonlyMap<string, SeriesLoad>>(new Map());
  private readonly photoLoads = signal<ReadonlyMap<string, PhotoLoad>>(new Map());

  private readonly fetched = recordResource(this.runId);
  private readonly replayed = resource({
    params: () => this.record(),
    loader: async ({ params }) => {
      const retold = await retellRecord(params);
      void this.fetchSeries(params.events);
      void this.fetchPhotos(params.events);
      return retold;
    },
  });

  /** The record as it came; undefined until then. */
  readonly record = computed(() => (this.fetched.hasValue() ? this.fetched.value() : undefined));
  /** What the fetching failed with. */
  readonly problem = computed(() => this.fetched.error() ?? this.replayed.error());
  /** The replay of the record that is shown; undefined while it goes on. */
  readonly retold = computed(() => (this.replayed.hasValue() ? this.replayed.value() : undefined));
  /** What can be said of the chain; needs no replay. */
  readonly chain = computed(() => {
    const record = this.record();
    return record && wordOfChain(record.header, record.events, record.countersigned);
  });
  /** The series by the hash of their bytes. */
  readonly series = this.loads.asReadonly();

  /** The photos by the hash of their bytes. */
  readonly photos = this.photoLoads.asReadonly();

  constructor() {
    inject(DestroyRef).onDestroy(() => this.forgetPhotos());
  }

  /** Shows another record. */
  show(runId: string): void {
    this.loads.set(new Map());
    this.forgetPhotos();
    this.runId.set(runId);
  }

  /** Fetches the record again. */
  again(): void {
    this.fetched.reload();
  }

  private async fetchSeries(events: readonly RunEvent[]): Promise<void> {
    const hashes = events.flatMap((event) => (event.type === 'series-recorded' ? [event.data.sha256] : []));
    await Promise.all([...new Set(hashes)].map((sha256) => this.fetchOne(sha256)));
  }

  private async fetchOne(sha256: string): Promise<void> {
    this.note(sha256, { status: 'loading' });
    try {
      const series = await readSeries(await this.archive.attachment(sha256), sha256);
      this.note(sha256, { status: 'there', series });
    } catch (error) {
      if (error instanceof ApiProblem && error.status === 404) return this.note(sha256, { status: 'missing' });
      if (error instanceof ApiProblem || error instanceof DamagedSeries) {
        return this.note(sha256, { status: 'failed', why: error.message });
      }
      throw error;
    }
  }

  private async fetchPhotos(events: readonly RunEvent[]): Promise<void> {
    const photos = events.flatMap((event) => (event.type === 'photo-attached' ? [event.data] : []));
    const asked = new Set<string>();
    for (const { sha256, mediaType } of photos) {
      if (asked.has(sha256) || this.photoLoads().has(sha256)) continue;
      asked.add(sha256);
      await this.fetchPhoto(sha256, mediaType);
    }
  }

  private async fetchPhoto(sha256: string, mediaType: string): Promise<void> {
    const note = (load: PhotoLoad): void => this.photoLoads.update((loads) => new Map(loads).set(sha256, load));
    note({ status: 'loading' });
    try {
      note(photoOf(await this.archive.attachment(sha256), sha256, mediaType));
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error;
      note(error.status === 404 ? { status: 'missing' } : { status: 'failed', why: error.message });
    }
  }

  private forgetPhotos(): void {
    for (const load of this.photoLoads().values()) if (load.status === 'there') URL.revokeObjectURL(load.url);
    this.photoLoads.set(new Map());
  }

  private note(sha256: string, load: SeriesLoad): void {
    this.loads.update((loads) => new Map(loads).set(sha256, load));
  }
}
