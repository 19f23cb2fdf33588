import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/**
 * Why the primary action below it did nothing, or what is still missing for it. It stands directly over the action,
 * where the eye and the hand are, and never scrolls away.
 */
@Component({
  selector: 'bay-refusal-line',
  template: `
    @if (refusal(); as refusal) {
      <p class="error" role="alert">{{ refusal }}</p>
    } @else if (missing(); as missing) {
      <p class="missing" role="status">{{ missing }}</p>
    }
  `,
  styles: `
    :host {
      flex: none;
      display: block;
    }
    p {
      padding: 4px 6px 8px;
      line-height: 1.2;
    }
    .missing {
      color: var(--ink-2);
    }
    @media (max-width: 640px) {
      p {
        padding-bottom: 6px;
        font-size: 16px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RefusalLine {
  /** Why it was refused. */
  readonly refusal = input<string>();
  /** What is missing, while nothing was refused. */
  readonly missing = input<string>();
}
