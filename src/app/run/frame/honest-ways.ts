import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';

/** Which honest way out was asked for. */
export type HonestWay = 'cannot-measure' | 'not-sure' | 'set-aside';

/** The three honest ways out of a step, always at the same place. */
@Component({
  selector: 'bay-honest-ways',
  template: `
    <button type="button" [attr.aria-disabled]="canMeasure() ? null : 'true'" (click)="asked.emit('cannot-measure')">
      Cannot measure
    </button>
    <button type="button" (click)="asked.emit('not-sure')">Not sure</button>
    <button type="button" (click)="asked.emit('set-aside')">Set aside</button>
  `,
  styles: `
    :host {
      grid-area: ways;
      display: grid;
      grid-template-columns: repeat(3, 1fr);
      gap: var(--gap);
      padding: 0 var(--hand-edge) var(--foot-edge);
    }
    button {
      min-height: var(--touch);
      padding: 4px 6px;
      font-weight: 500;
      line-height: 1.15;
    }
    [aria-disabled='true'] {
      color: var(--ink-2);
      background: none;
    }
    @media (max-width: 640px) {
      button {
        font-size: 16px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HonestWays {
  /** Whether there is anything to be measured in the step; where there is not, the button says what to do instead. */
  readonly canMeasure = input(true);
  readonly asked = output<HonestWay>();
}
