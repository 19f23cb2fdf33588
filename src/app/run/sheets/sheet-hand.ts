import { ChangeDetectionStrategy, Component } from '@angular/core';

/** The hand side of a card that is laid over the step: its controls, over the entry and the ways out. */
@Component({
  selector: 'bay-sheet-hand',
  template: '<ng-content />',
  styles: `
    :host {
      grid-column: entry;
      grid-row: entry-start / ways-end;
      z-index: 4;
      position: relative;
      min-width: 0;
      min-height: 0;
      display: flex;
      flex-direction: column;
      gap: var(--gap);
      padding: 10px var(--hand-edge) var(--foot-edge);
      background: var(--shade);
      overflow: auto;
      overscroll-behavior: contain;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SheetHand {}
