import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { StepPicture } from '../../../../procedures/document';
import { AirPath } from '../../shared/air-path';

/** A step's picture: the drawn sheet that it names, with the marked parts. */
@Component({
  selector: 'bay-step-picture',
  imports: [AirPath],
  template: `
    @switch (picture().sheet) {
      @case ('air-path') {
        <bay-air-path [marks]="picture().marks" [labels]="labels()" />
      }
    }
  `,
  styles: `
    :host {
      display: flex;
      flex: 1 1 0 !important;
      min-height: 146px;
      border: var(--rule-width) solid var(--rule);
      border-radius: var(--r);
      background: var(--sheet);
      overflow: hidden;
    }
    bay-air-path {
      flex: 1;
      min-width: 0;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StepPictureView {
  readonly picture = input.required<StepPicture>();

  protected readonly labels = computed(() => this.picture().labels ?? {});
}
