import { ChangeDetectionStrategy, Component } from '@angular/core';

/** The hand side of a card that is laid over the step: over the entry and the ways out. */
@Component({
  selector: 'bay-sheet-hand',
  template: '<ng-content />',
  styles: `
    :host {
      grid-column: entry;
      grid-row: entry-start / ways-end;
      z-index: 4;
      /* Out of the flow, so that what is on the card never moves the rows under it. */
      position: absolute;
      inset: 0;
      min-width: 0;
      min-height: 0;
      display: flex;
      flex-direction: column;
      padding: 10px var(--hand-edge) var(--foot-edge);
      background: var(--shade);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SheetHand {}
