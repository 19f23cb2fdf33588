import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';

/** *Stop, supply off* in its one fixed place, and why the run came here at a safe distance from it. */
@Component({
  selector: 'bay-stop-row',
  template: `
    <button type="button" class="stop" (click)="stopped.emit()">
      <svg viewBox="0 0 30 30" width="32" height="32" aria-hidden="true">
        <path d="M9 2h12l7 7v12l-7 7H9l-7-7V9z" fill="currentColor" />
        <path d="M9 15h12" stroke="var(--sheet)" stroke-width="4" />
      </svg>
      Stop, supply off
    </button>
    @if (hasWay()) {
      <button type="button" class="why" (click)="whyAsked.emit()">Why this way?</button>
    }
  `,
  styles: `
    :host {
      grid-area: stop;
      display: flex;
      align-items: end;
      justify-content: space-between;
      gap: var(--clear);
      min-width: 0;
      padding: 0 20px var(--below-stop) 24px;
    }
    /* Always at the far side of the hand that taps. */
    :host-context([data-hand='left']) {
      flex-direction: row-reverse;
    }
    button {
      min-height: var(--touch);
    }
    .stop {
      flex: none;
      padding: 0 26px 0 20px;
      gap: 14px;
      border-width: 3px;
    }
    .why {
      padding: 0 22px;
      font-weight: 500;
    }
    @media (max-width: 1100px) and (orientation: landscape) {
      .stop {
        padding: 0 16px 0 12px;
        font-size: 18px;
      }
      .why {
        padding: 0 10px;
        line-height: 1.1;
      }
    }
    @media (max-width: 640px) {
      :host {
        padding: 0 12px var(--below-stop);
        gap: calc(3 * var(--mm));
      }
      .stop {
        padding: 0 14px 0 10px;
        gap: 8px;
        font-size: 17px;
      }
      .why {
        padding: 0 8px;
        font-size: 16px;
        line-height: 1.1;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StopRow {
  /** Whether a decision led to this step that can be explained. */
  readonly hasWay = input(false);
  readonly stopped = output();
  readonly whyAsked = output();
}
