import { ChangeDetectionStrategy, Component } from '@angular/core';

/** What may scroll on a card's hand side; the controls under it never do. */
@Component({
  selector: 'bay-sheet-body',
  template: '<ng-content />',
  styles: `
    :host {
      flex: 1;
      min-height: 0;
      display: flex;
      flex-direction: column;
      gap: 13px;
      padding: 0 4px var(--gap);
      margin: 0 -4px;
      overflow: auto;
      overscroll-behavior: contain;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SheetBody {}
