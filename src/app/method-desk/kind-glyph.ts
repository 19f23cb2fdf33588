import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { StepKind } from '../../../procedures/document';

/** One small drawing for each kind of step; the words stand beside it. */
@Component({
  selector: 'bay-kind-glyph',
  template: `<svg viewBox="0 0 22 22" aria-hidden="true"><path [attr.d]="path()" /></svg>`,
  styles: `
    :host {
      display: inline-flex;
      flex: none;
    }
    svg {
      width: 20px;
      height: 20px;
      fill: none;
      stroke: currentColor;
      stroke-width: 2;
      stroke-linecap: round;
      stroke-linejoin: round;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class KindGlyph {
  readonly kind = input.required<StepKind>();

  protected readonly path = computed(() => paths[this.kind()]);
}

const paths: Readonly<Record<StepKind, string>> = {
  start: 'M4 4h14v14H4zM8 9h6M8 13h6',
  action: 'M3 12l5 5L18 5',
  reading: 'M4 16a8 8 0 1 1 14 0M11 12l4-5',
  choice: 'M8.5 6a2.5 2.5 0 1 0-5 0 2.5 2.5 0 1 0 5 0M8.5 15a2.5 2.5 0 1 0-5 0 2.5 2.5 0 1 0 5 0M12 6h7M12 15h7',
  listen: 'M5 14c0-8 12-8 12 0M5 14v4M17 14v4',
  ramp: 'M3 18h3L16 5h3',
  hold: 'M7 4v14M15 4v14',
  wait: 'M19 11a8 8 0 1 0-16 0 8 8 0 1 0 16 0M11 6v5l3 2',
  codes: 'M3 7h4M3 14h4M10 7h8M10 14h8',
  drive: 'M3 14v-3l2-5h12l2 5v3zM6 14v3M16 14v3M3 11h16',
  photo: 'M3 7h4l2-3h4l2 3h4v11H3zM14 12a3 3 0 1 0-6 0 3 3 0 1 0 6 0',
  call: 'M4 4h9v14H4zM9 11h9M15 8l3 3-3 3',
  compute: 'M4 8h14M4 14h14',
  restore: 'M5 12a6 6 0 1 0 2-5M5 4v4h4',
  finding: 'M4 19V3h12l-3 4 3 4H4',
};
