import { computed, inject, Injectable, signal } from '@angular/core';
import { RecordArchive, type RecordQuery } from './record-archive';
import type { RecordRow } from './record-wire';

export type ListStatus = 'loading' | 'ready' | 'failed';

/**
 * The list of records, page by page: only the pages that came into sight are fetched, so that ten thousand rows cost
 * no more than the ones that are looked at.
 */
@Injectable()
export class RecordListStore {
  private readonly archive = inject(RecordArchive);

  private readonly asked = signal<RecordQuery>({ text: '', finding: '', status: '', sort: '-openedAt' });
  private readonly pages = signal<ReadonlyMap<number, readonly RecordRow[]>>(new Map());
  private readonly count = signal<number | undefined>(undefined);
  private readonly problem = signal<unknown>(undefined);
  private readonly asking = signal(false);
  /** Pages under way, so that scrolling does not ask twice. */
  private readonly underway = new Set<number>();
  /** Rises with each new question: an answer to an earlier one is dropped. */
  private question = 0;

  readonly query = this.asked.asReadonly();
  /** How many records fit the question; undefined until the first answer. */
  readonly total = this.count.asReadonly();
  /** Whether a new question is not answered yet; the earlier answer stands meanwhile. */
  readonly isAsking = this.asking.asReadonly();
  /** What went wrong with the newest question; undefined when nothing did. */
  readonly error = this.problem.asReadonly();
  readonly status = computed<ListStatus>(() => {
    if (this.problem() !== undefined) return 'failed';
    return this.count() === undefined ? 'loading' : 'ready';
  });
  /** As many entries as there are records; undefined where the page has not come yet. */
  readonly rows = computed<readonly (RecordRow | undefined)[]>(() => {
    const pages = this.pages();
    const size = this.pageSize();
    const rows = new Array<RecordRow | undefined>(this.count() ?? 0).fill(undefined);
    for (const [page, entries] of pages) entries.forEach((row, index) => (rows[(page - 1) * size + index] = row));
    return rows;
  });

  private readonly pageSize = computed(() => Math.max(1, this.pages().get(1)?.length ?? 1));

  /** Asks anew: from the first page on. */
  async ask(query: RecordQuery): Promise<void> {
    this.question += 1;
    this.underway.clear();
    this.asked.set(query);
    this.asking.set(true);
    await this.fetch(1);
  }

  /** Asks the same again. */
  again(): Promise<void> {
    return this.ask(this.asked());
  }

  /** Fetches the pages that hold the rows from `start` to before `end`, where they are not there yet. */
  async show(start: number, end: number): Promise<void> {
    // The rows in sight belong to an earlier question: the answer to the new one brings its own.
    if (this.asking()) return;
    const total = this.count() ?? 0;
    const size = this.pageSize();
    const first = Math.floor(Math.max(0, start) / size) + 1;
    const last = Math.floor(Math.max(0, Math.min(end, total) - 1) / size) + 1;
    const wanted = Array.from({ length: Math.max(0, last - first + 1) }, (_, index) => first + index);
    const missing = wanted.filter((page) => !this.pages().has(page) && !this.underway.has(page));
    await Promise.all(missing.map((page) => this.fetch(page)));
  }

  private async fetch(page: number): Promise<void> {
    const question = this.question;
    this.underway.add(page);
    try {
      const { total, rows } = await this.archive.page(this.asked(), page);
      if (question !== this.question) return;
      this.problem.set(undefined);
      this.count.set(total);
      this.pages.update((pages) => new Map(this.asking() ? [] : pages).set(page, rows));
    } catch (error) {
      // ApiProblem, or RangeError for an answer of another shape: shown where the list would be.
      if (question === this.question) this.problem.set(error);
    } finally {
      if (question === this.question) {
        this.underway.delete(page);
        this.asking.set(false);
      }
    }
  }
}
