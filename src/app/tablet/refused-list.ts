import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { RefusedItem } from './refused-store';

/** What the server refused, each with the reason and what can be done about it. */
@Component({
  selector: 'bay-refused-list',
  template: `
    <ul>
      @for (item of items(); track item.id) {
        <li>
          <p>
            <b>{{ item.what }}</b>
          </p>
          <p class="error">{{ item.reason }}</p>
          <div class="does">
            @if (item.isWaiting) {
              <button type="button" class="plain" (click)="offered.emit(item.id)">Offer again</button>
            }
            @if (item.isRun) {
              <button type="button" class="plain" (click)="saved.emit(item.id)">Save as a file</button>
            }
          </div>
        </li>
      }
    </ul>
  `,
  styles: `
    ul {
      list-style: none;
    }
    li {
      display: grid;
      gap: 8px;
      padding: 14px 0;
      border-top: 1px solid var(--rule);
    }
    .does {
      display: flex;
      flex-wrap: wrap;
      gap: 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RefusedList {
  readonly items = input.required<readonly RefusedItem[]>();

  readonly offered = output<string>();
  readonly saved = output<string>();
}
