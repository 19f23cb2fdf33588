import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { dayTime } from '../core/time-words';
import { ResultMark } from '../shared/result-mark';
import type { ShownResult } from '../shared/result-words';
import type { PracticeTry } from './practice-book';

/** One's own practice runs, the newest on top; an open one can be gone back to. */
@Component({
  selector: 'bay-try-list',
  imports: [ResultMark, RouterLink],
  template: `
    <ul>
      @for (entry of entries(); track entry.runId) {
        <li [class.open]="entry.isOpen">
          @if (entry.isOpen) {
            <div class="words">
              <b>{{ entry.title }}</b>
              <span class="muted">{{ entry.when }}{{ entry.step ? ', ' + entry.step : '' }}</span>
            </div>
            <a class="primary live" [routerLink]="['/run', entry.runId]">Go on</a>
          } @else {
            <div class="words">
              <b>{{ entry.title }}</b>
              <span class="result">
                <bay-result-mark [result]="entry.mark" [size]="20" [isSilent]="true" />
                {{ entry.outcome }}
              </span>
              <span class="muted">{{ entry.when }}{{ entry.found ? ', finding: ' + entry.found : '' }}</span>
            </div>
            <a class="plain" [routerLink]="['/practice', entry.runId]">Debrief</a>
          }
        </li>
      } @empty {
        <li class="none">
          <p>
            No try yet. Take a car: its instruments show what they would show at the real one. What is wrong with it is
            told at the end.
          </p>
        </li>
      }
    </ul>
  `,
  styles: `
    ul {
      list-style: none;
      display: grid;
    }
    li {
      display: flex;
      gap: 14px;
      align-items: center;
      justify-content: space-between;
      padding: 14px 4px;
      border-bottom: var(--rule-width) solid var(--rule);
    }
    li.open {
      padding: 16px;
      border: 3px solid var(--live);
      border-radius: 12px;
      background: var(--sheet);
    }
    .words {
      display: grid;
      gap: 2px;
      min-width: 0;
    }
    b {
      font-size: 19px;
      font-weight: 600;
      line-height: 1.25;
    }
    .result {
      display: flex;
      gap: 8px;
      align-items: center;
    }
    a {
      flex: none;
    }
    .none {
      border: 0;
      color: var(--ink-2);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TryList {
  readonly tries = input.required<readonly PracticeTry[]>();
  /** Device clock, milliseconds. */
  readonly now = input.required<number>();

  protected readonly entries = computed(() =>
    this.tries().map((entry) => ({
      ...entry,
      when: dayTime(entry.changedAt, this.now()),
      mark: markOf(entry),
      outcome: entry.isFound === undefined ? 'no finding' : entry.isFound ? 'found' : 'not found',
    })),
  );
}

function markOf({ isFound }: PracticeTry): ShownResult {
  if (isFound === undefined) return 'not-measured';
  return isFound ? 'in' : 'out';
}
