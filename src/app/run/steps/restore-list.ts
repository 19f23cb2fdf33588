import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { DisturbedItem } from '../../../../procedures/engine/showing';

/** What is disturbed, each with the sentence that puts it back and one big tick. */
@Component({
  selector: 'bay-restore-list',
  template: `
    @for (item of items(); track item.item) {
      <button type="button" [disabled]="isBusy()" (click)="restored.emit(item.item)">
        <svg viewBox="0 0 40 40" width="44" height="44" aria-hidden="true">
          <rect x="3" y="3" width="34" height="34" rx="7" />
        </svg>
        <span>
          <b>{{ item.restore }}</b>
          <small>{{ item.label }}</small>
        </span>
      </button>
    }
  `,
  styles: `
    :host {
      display: flex;
      flex-direction: column;
      gap: var(--gap);
      min-height: 0;
      padding: 4px;
      margin: 0 -4px;
      overflow: auto;
    }
    button {
      flex: none;
      display: grid;
      grid-template-columns: auto 1fr;
      align-items: center;
      gap: 18px;
      min-height: calc(15 * var(--mm));
      padding: 8px 20px;
      border: 3px solid var(--live);
      text-align: left;
      line-height: 1.2;
    }
    svg {
      fill: none;
      stroke: var(--live);
      stroke-width: 3;
    }
    span {
      display: grid;
      gap: 2px;
    }
    b {
      font-size: 22px;
      font-weight: 600;
    }
    small {
      font-size: 18px;
      color: var(--ink-2);
    }
    @media (max-width: 640px) {
      button {
        min-height: calc(9.6 * var(--mm));
        gap: 12px;
        padding: 6px 12px;
      }
      b {
        font-size: 18px;
      }
      small {
        font-size: 15px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RestoreList {
  readonly items = input.required<readonly DisturbedItem[]>();
  readonly isBusy = input(false);
  readonly restored = output<string>();
}
