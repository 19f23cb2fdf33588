import { ChangeDetectionStrategy, Component } from '@angular/core';

/** The hand side of a step: what to enter, and the one primary action in its bottom corner. */
@Component({
  selector: 'bay-hand-side',
  template: '<ng-content />',
  styles: `
    :host {
      grid-area: entry;
      position: relative;
      display: flex;
      flex-direction: column;
      gap: 8px;
      min-width: 0;
      min-height: 0;
      padding: 8px var(--hand-edge) 0;
      overflow: auto;
      overscroll-behavior: contain;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HandSide {}
