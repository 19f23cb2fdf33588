import { ChangeDetectionStrategy, Component } from '@angular/core';

/** The wide side of a card that is laid over the step: text that may scroll. */
@Component({
  selector: 'bay-sheet-wide',
  template: '<ng-content />',
  styles: `
    :host {
      grid-area: wide;
      z-index: 4;
      position: absolute;
      inset: 0 0 14px;
      min-width: 0;
      min-height: 0;
      display: flex;
      flex-direction: column;
      gap: 14px;
      padding: 16px 20px 24px 24px;
      background: var(--paper);
      overflow: auto;
      overscroll-behavior: contain;
    }
    @media (max-width: 640px) {
      :host {
        padding: 8px 12px 20px;
        gap: 8px;
      }
    }
  `,
  host: { class: 'scrolls' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SheetWide {}
