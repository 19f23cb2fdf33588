import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { shownUnit, type NamedValue } from '../../../../procedures/engine/showing';
import { ReadingDisplay } from '../readings/reading-display';

/** What the marks give, in the largest figures and over its band; what the gauge shows there stands below, small. */
@Component({
  selector: 'bay-found-display',
  imports: [ReadingDisplay],
  template: `
    <bay-reading-display
      [label]="value().label"
      [text]="value().text"
      [unit]="unit()"
      [value]="value()"
      [refusal]="refusal()"
    />
    <p class="remark" role="status">{{ remark() }}</p>
  `,
  styles: `
    :host {
      display: block;
      flex: none;
    }
    .remark {
      padding: 0 6px;
      color: var(--ink-2);
      line-height: 1.3;
    }
    @media (max-width: 640px) {
      /* The plot needs the room: in words the result stands beside the figure. */
      :host {
        --display-band: none;
      }
      :host-context(bay-mark-controls) .remark {
        display: none;
      }
      .remark {
        font-size: 15px;
        line-height: 1.2;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FoundDisplay {
  readonly value = input.required<NamedValue>();
  readonly remark = input('');
  readonly refusal = input<string>();

  protected readonly unit = computed(() => {
    const { unit, uncertaintyText } = this.value();
    return `${uncertaintyText === '0' ? '' : `\u00b1 ${uncertaintyText} `}${shownUnit(unit)}`;
  });
}
