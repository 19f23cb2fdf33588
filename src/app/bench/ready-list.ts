import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { dayTime, howLong } from '../core/time-words';
import type { WaitingCounts } from '../core/sync-view';
import type { ReadyView } from './bench-store';

/** What works without a network, and what waits for one. */
@Component({
  selector: 'bay-ready-list',
  template: `
    <ul>
      <li>
        <b class="num">{{ ready().procedures }}</b> {{ ready().procedures === 1 ? 'procedure' : 'procedures'
        }}{{ newest() }}
      </li>
      <li>
        <b class="num">{{ ready().instruments }}</b> {{ instrumentWords() }}
        @if (due(); as says) {
          <span [class.overdue]="says.isOverdue">{{ says.words }}</span>
        }
      </li>
      <li>{{ unsent() }}</li>
      @if (photosLeft() !== undefined) {
        <li>
          room for about <b class="num">{{ photosLeft()?.toLocaleString('en') }}</b> photos
        </li>
      }
    </ul>
  `,
  styles: `
    ul {
      list-style: none;
    }
    li {
      padding: 9px 4px;
      border-bottom: 1px solid var(--rule);
    }
    .overdue {
      color: var(--out);
      font-weight: 600;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReadyList {
  readonly ready = input.required<ReadyView>();
  readonly waiting = input.required<WaitingCounts>();
  readonly photosLeft = input<number>();
  /** Device clock, milliseconds. */
  readonly now = input.required<number>();

  protected readonly newest = computed(() => {
    const { newestAt } = this.ready();
    return newestAt === undefined ? '' : `, newest from ${dayTime(Date.parse(newestAt), this.now())}`;
  });
  protected readonly instrumentWords = computed(() => {
    const word = this.ready().instruments === 1 ? 'instrument' : 'instruments';
    return this.due() ? `${word},` : word;
  });
  protected readonly due = computed(() => {
    const next = this.ready().nextDue;
    if (!next || next.days > 30) return undefined;
    if (next.days < 0) return { words: `${next.label} is overdue`, isOverdue: true };
    const when = next.days === 0 ? 'due today' : next.days === 1 ? 'due tomorrow' : `due in ${next.days} days`;
    return { words: `${next.label} ${when}`, isOverdue: false };
  });
  protected readonly unsent = computed(() => {
    const { runs, evidence, documents, oldestSince } = this.waiting();
    const parts = [
      count(runs, 'run', 'runs'),
      count(documents, 'visit', 'visits'),
      count(evidence, 'photo or series', 'photos and series'),
    ].filter((part) => part !== '');
    if (parts.length === 0) return 'nothing waits to be sent';
    const oldest = oldestSince === undefined ? '' : `, oldest ${howLong(this.now() - oldestSince)}`;
    return `${parts.join(' and ')} ${runs + documents + evidence === 1 ? 'waits' : 'wait'} to be sent${oldest}`;
  });
}

const count = (number: number, one: string, many: string): string =>
  number === 0 ? '' : number === 1 ? `1 ${one}` : `${number} ${many}`;
