import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { EntryWay } from '../../../../procedures/document';

/** The ways in which a quantity can be known, as tiles: one tap chooses. */
@Component({
  selector: 'bay-way-tiles',
  template: `
    @for (way of ways(); track way.id) {
      <button type="button" [disabled]="isBusy()" (click)="chosen.emit(way.id)">
        <b>{{ way.label }}</b>
        <span>{{ way.hint }}</span>
      </button>
    }
  `,
  styles: `
    :host {
      flex: 1;
      min-height: 0;
      display: flex;
      flex-direction: column;
      gap: var(--gap);
      padding: 4px 0 var(--gap);
      overflow: auto;
    }
    button {
      flex: 1 0 auto;
      display: grid;
      align-content: center;
      gap: 4px;
      min-height: calc(15 * var(--mm));
      padding: 8px 18px;
      text-align: left;
      line-height: 1.25;
    }
    b {
      font-size: 22px;
      font-weight: 600;
    }
    span {
      color: var(--ink-2);
    }
    @media (max-width: 640px) {
      button {
        padding: 6px 12px;
        min-height: calc(9.6 * var(--mm));
      }
      b {
        font-size: 18px;
      }
      span {
        font-size: 15px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WayTiles {
  readonly ways = input.required<readonly EntryWay[]>();
  readonly isBusy = input(false);
  readonly chosen = output<string>();
}
