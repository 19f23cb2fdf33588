import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { PrimaryButton } from '../primary-action';

/** The one primary action of a step without a number pad: as large as the room allows, in the bottom corner of the hand. */
@Component({
  selector: 'bay-big-action',
  imports: [PrimaryButton],
  template: `
    <button
      type="button"
      bayPrimary
      [class.live]="isLive()"
      [disabled]="isBusy()"
      [attr.aria-disabled]="isReady() ? null : 'true'"
      (click)="done.emit()"
    >
      {{ label() }}
    </button>
  `,
  styles: `
    :host {
      flex: 1 0 var(--touch-primary);
      display: flex;
      max-height: calc(46 * var(--mm));
      margin-top: auto;
      padding-bottom: var(--gap);
    }
    button {
      flex: 1;
      font-size: 34px;
      font-weight: 700;
      line-height: 1.1;
      white-space: pre-line;
    }
    button[aria-disabled='true'] {
      background: var(--shade);
      border-color: var(--edge);
      color: var(--ink-2);
    }
    @media (max-width: 640px) {
      :host {
        padding-bottom: 10px;
      }
      button {
        font-size: 26px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BigAction {
  readonly label = input.required<string>();
  /** Whether it is the live thing, a clock or a noise that is listened to, rather than the way on. */
  readonly isLive = input(false);
  readonly isReady = input(true);
  readonly isBusy = input(false);
  readonly done = output();
}
