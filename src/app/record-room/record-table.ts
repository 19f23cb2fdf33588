import { CdkFixedSizeVirtualScroll, CdkVirtualForOf, CdkVirtualScrollViewport } from '@angular/cdk/scrolling';
import {
  afterNextRender,
  afterRenderEffect,
  ChangeDetectionStrategy,
  Component,
  computed,
  DestroyRef,
  type ElementRef,
  inject,
  input,
  linkedSignal,
  output,
  untracked,
  viewChild,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { RouterLink } from '@angular/router';
import { ResultMark } from '../shared/result-mark';
import { resultWords } from '../shared/result-words';
import type { RecordColumn, RecordSort } from './record-archive';
import { clockTime } from '../core/time-words';
import { dayText, momentOf } from './record-time';
import type { RecordRow } from './record-wire';
import { statusWords } from './record-words';

/** Rows of the list from `start` to before `end` came into sight. */
export interface ShownRange {
  readonly start: number;
  readonly end: number;
}

interface Column {
  readonly sortBy: RecordColumn;
  readonly label: string;
}

/**
 * The dense list of records. Only the rows in sight are in the page. It is one tab stop: arrows, Page Up, Page Down,
 * Home and End move the current row, Enter opens it.
 */
@Component({
  selector: 'bay-record-table',
  imports: [CdkFixedSizeVirtualScroll, CdkVirtualForOf, CdkVirtualScrollViewport, ResultMark, RouterLink],
  templateUrl: './record-table.html',
  styleUrl: './record-table.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RecordTable {
  private readonly destroyed = inject(DestroyRef);

  /** As many entries as there are records; undefined where the row is not fetched yet. */
  readonly rows = input.required<readonly (RecordRow | undefined)[]>();
  /** What the rows answer: when it changes, the list starts from its top. */
  readonly question = input.required<unknown>();
  readonly sort = input.required<RecordSort>();
  /** Whether a new question is under way: the rows are still those of the earlier one. */
  readonly isBusy = input(false);
  /** Height of a row in CSS pixels; the rows' own layout follows the room there is. */
  readonly rowHeight = input(60);

  readonly openRow = output<string>();
  readonly sortChange = output<RecordSort>();
  readonly shown = output<ShownRange>();

  private readonly grid = viewChild.required<ElementRef<HTMLElement>>('grid');
  private readonly viewport = viewChild.required(CdkVirtualScrollViewport);

  protected readonly current = linkedSignal<unknown, number>({ source: this.question, computation: () => 0 });
  protected readonly words = resultWords;
  protected readonly status = statusWords;
  protected readonly isEnded = ({ status }: RecordRow): boolean => status === 'closed' || status === 'signed';
  protected readonly columns: readonly Column[] = [
    { sortBy: 'openedAt', label: 'Opened' },
    { sortBy: 'repairOrder', label: 'Order' },
    { sortBy: 'car', label: 'Car' },
    { sortBy: 'procedureTitle', label: 'Procedure' },
    { sortBy: 'status', label: 'State' },
    { sortBy: 'verdict', label: 'Finding' },
    { sortBy: 'person', label: 'By' },
  ];
  protected readonly direction = computed(() => (this.sort().startsWith('-') ? 'descending' : 'ascending'));
  protected readonly sortedBy = computed(() => this.sort().replace('-', ''));

  constructor() {
    afterNextRender(() => {
      this.viewport()
        .renderedRangeStream.pipe(takeUntilDestroyed(this.destroyed))
        .subscribe(({ start, end }) => this.shown.emit({ start, end }));
    });
    // The scroll position is the DOM's own state.
    afterRenderEffect(() => {
      this.question();
      untracked(() => this.viewport().scrollToIndex(0));
    });
  }

  /** Rows are told apart by their place: a page that comes fills the places that waited. */
  protected readonly place = (index: number): number => index;

  /** Puts the keyboard on the list. */
  focus(): void {
    this.grid().nativeElement.focus();
  }

  protected sortBy(column: RecordColumn): void {
    const isSame = this.sortedBy() === column;
    // Moments start with the newest, words with the first letter; a second press turns it round.
    const first: RecordSort = column === 'openedAt' ? '-openedAt' : column;
    const turned: RecordSort = this.sort().startsWith('-') ? column : `-${column}`;
    this.sortChange.emit(isSame ? turned : first);
  }

  protected move(event: KeyboardEvent): void {
    // The columns' buttons lie in here too, and have keys of their own.
    if (event.target instanceof Element && event.target.closest('button') !== null) return;
    const last = this.rows().length - 1;
    const page = Math.max(1, Math.floor(this.viewport().getViewportSize() / this.rowHeight()) - 1);
    const current = this.current();
    const target = {
      ArrowDown: current + 1,
      ArrowUp: current - 1,
      PageDown: current + page,
      PageUp: current - page,
      Home: 0,
      End: last,
    }[event.key];
    if (event.key === 'Enter') this.open(this.rows()[current]);
    if (target === undefined || last < 0) return;
    event.preventDefault();
    this.current.set(Math.min(last, Math.max(0, target)));
    this.keepInSight();
  }

  protected open(row: RecordRow | undefined): void {
    if (row) this.openRow.emit(row.runId);
  }

  protected day(row: RecordRow): string {
    return dayText(momentOf(row.openedAt));
  }

  protected time(row: RecordRow): string {
    return clockTime(momentOf(row.openedAt));
  }

  private keepInSight(): void {
    const viewport = this.viewport();
    const top = this.current() * this.rowHeight();
    const from = viewport.measureScrollOffset();
    const size = viewport.getViewportSize();
    if (top < from) viewport.scrollToOffset(top);
    else if (top + this.rowHeight() > from + size) viewport.scrollToOffset(top + this.rowHeight() - size);
  }
}
