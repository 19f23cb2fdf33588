import { BreakpointObserver } from '@angular/cdk/layout';
import { ChangeDetectionStrategy, Component, computed, inject, input, viewChild } from '@angular/core';
import { takeUntilDestroyed, toObservable, toSignal } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { Router } from '@angular/router';
import { debounceTime, distinctUntilChanged, map } from 'rxjs';
import { LoadProblem } from '../shared/load-problem';
import { TopBar } from '../shared/top-bar';
import { KnownFindings } from './known-findings';
import type { RecordQuery, RecordSort } from './record-archive';
import { RecordListStore } from './record-list-store';
import { RecordTable } from './record-table';
import { statusWords } from './record-words';

/** Long enough for a word to be typed, short enough to feel immediate. */
const typingPauseMs = 250;
const narrow = '(max-width: 1000px)';

/** The Record room's list: find a run among all that were ever received. What is asked stands in the address. */
@Component({
  selector: 'bay-record-list-page',
  imports: [LoadProblem, ReactiveFormsModule, RecordTable, TopBar],
  templateUrl: './record-list-page.html',
  styleUrl: './record-list-page.css',
  providers: [RecordListStore],
  host: { class: 'desk', '(document:keydown)': 'findByKey($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RecordListPage {
  protected readonly store = inject(RecordListStore);
  private readonly router = inject(Router);
  private readonly forms = inject(NonNullableFormBuilder);
  private readonly breakpoints = inject(BreakpointObserver);
  private readonly known = inject(KnownFindings);

  /** Of the address: what the list is asked for. */
  readonly text = input<string>();
  readonly finding = input<string>();
  readonly status = input<string>();
  readonly sort = input<string>();

  private readonly table = viewChild(RecordTable);

  protected readonly form = this.forms.group({ text: '', finding: '', status: '' });
  protected readonly findings = this.known.groups;
  protected readonly states = states;
  protected readonly rowHeight = toSignal(
    this.breakpoints.observe(narrow).pipe(map(({ matches }) => (matches ? 84 : 60))),
    { initialValue: 60 },
  );
  protected readonly countText = computed(() => {
    const total = this.store.total();
    if (this.store.status() === 'failed') return '';
    if (total === undefined) return 'Looking';
    return `${total.toLocaleString('en-GB')} ${total === 1 ? 'record' : 'records'}`;
  });
  protected readonly isFiltered = computed(() => {
    const { text, finding, status } = this.store.query();
    return text !== '' || finding !== '' || status !== '';
  });
  private readonly asked = computed<RecordQuery>(
    () => ({
      text: this.text() ?? '',
      finding: this.finding() ?? '',
      status: statusOf(this.status()),
      sort: sortOf(this.sort()),
    }),
    { equal: (a, b) => JSON.stringify(a) === JSON.stringify(b) },
  );

  constructor() {
    this.followAddress();
    this.followForm();
  }

  protected open(runId: string): void {
    void this.router.navigate(['/records', runId]);
  }

  protected sortBy(sort: RecordSort): void {
    void this.rememberInAddress({ sort: sort === '-openedAt' ? null : sort });
  }

  protected clear(): void {
    this.form.setValue({ text: '', finding: '', status: '' });
  }

  /** Down from the field goes to the list. */
  protected enterList(event: Event): void {
    event.preventDefault();
    this.table()?.focus();
  }

  /** A slash goes to the field, from anywhere where it does not write one. */
  protected findByKey(event: KeyboardEvent): void {
    const isTyping = event.target instanceof HTMLInputElement || event.target instanceof HTMLSelectElement;
    if (event.key !== '/' || isTyping || event.ctrlKey || event.metaKey || event.altKey) return;
    event.preventDefault();
    document.getElementById('record-text')?.focus();
  }

  private followAddress(): void {
    toObservable(this.asked)
      .pipe(takeUntilDestroyed())
      .subscribe((query) => {
        const { text, finding, status } = query;
        this.form.setValue({ text, finding, status }, { emitEvent: false });
        void this.store.ask(query);
      });
  }

  private followForm(): void {
    this.form.valueChanges
      .pipe(
        debounceTime(typingPauseMs),
        map(({ text = '', finding = '', status = '' }) => ({ text: text.trim(), finding, status })),
        distinctUntilChanged((a, b) => a.text === b.text && a.finding === b.finding && a.status === b.status),
        takeUntilDestroyed(),
      )
      .subscribe(({ text, finding, status }) => {
        void this.rememberInAddress({ text: text || null, finding: finding || null, status: status || null });
      });
  }

  private rememberInAddress(queryParams: Record<string, string | null>): Promise<boolean> {
    return this.router.navigate([], { queryParams, queryParamsHandling: 'merge', replaceUrl: true });
  }
}

const columns = new Set(['openedAt', 'repairOrder', 'car', 'person', 'procedureTitle', 'status', 'verdict']);
const states = (Object.keys(statusWords) as (keyof typeof statusWords)[]).map((status) => ({
  status,
  words: statusWords[status],
}));

/** What the address says, where it is a state; else any. */
function statusOf(text: string | undefined): RecordQuery['status'] {
  return states.find(({ status }) => status === text)?.status ?? '';
}

/** What the address says, where it says something that can be sorted by; else the newest first. */
function sortOf(text: string | undefined): RecordSort {
  return text !== undefined && columns.has(text.replace(/^-/, '')) ? (text as RecordSort) : '-openedAt';
}
