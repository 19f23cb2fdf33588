import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { clockTime } from '../../core/time-words';
import { PrimaryButton } from '../primary-action';
import type { RunView } from '../run-view';
import { SheetBody } from './sheet-body';
import { SheetHand } from './sheet-hand';

/** What was taken apart or blocked in this run and is not yet put back. */
@Component({
  selector: 'bay-open-list-sheet',
  imports: [PrimaryButton, SheetBody, SheetHand],
  template: `
    <bay-sheet-hand>
      <bay-sheet-body>
        <h2>{{ items().length === 0 ? 'Nothing is disturbed' : 'Disturbed, not yet put back' }}</h2>
        <ul>
          @for (item of items(); track item.item) {
            <li>
              <b>{{ item.label }}</b>
              <span>since step {{ item.number }}, {{ item.time }}</span>
              <span>{{ item.restore }}</span>
            </li>
          } @empty {
            <li class="none">Whatever a step takes apart or blocks stands here until it is back in its place.</li>
          }
        </ul>
      </bay-sheet-body>
      <button type="button" bayPrimary (click)="left.emit()">Back to the step</button>
    </bay-sheet-hand>
  `,
  styles: `
    :host {
      display: contents;
    }
    h2 {
      padding: 0 6px 4px;
      border-bottom: 3px solid var(--live);
      font-size: 26px;
      color: var(--ink);
    }
    ul {
      flex: 1;
      display: grid;
      align-content: start;
      gap: 12px;
      list-style: none;
    }
    li {
      display: grid;
      gap: 2px;
      padding: 12px 16px;
      border: 2px solid var(--live);
      border-radius: var(--r);
      background: var(--live-wash);
      color: var(--live);
    }
    li b {
      font-size: 24px;
      line-height: 1.2;
    }
    .none {
      border-color: var(--rule);
      background: var(--sheet);
      color: var(--ink-2);
    }
    button {
      flex: none;
      min-height: var(--touch-primary);
      font-size: 26px;
    }
    @media (max-width: 640px) {
      h2 {
        font-size: 20px;
      }
      li b {
        font-size: 19px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OpenListSheet {
  readonly run = input.required<RunView>();
  readonly left = output();

  protected readonly items = computed(() => {
    const { procedure, state, events } = this.run();
    return state.disturbed.map((item) => ({
      ...item,
      number: procedure.step(item.step)?.number ?? item.step,
      time: clockTime(events[item.seq - 1]?.at ?? state.lastAt),
    }));
  });
}
