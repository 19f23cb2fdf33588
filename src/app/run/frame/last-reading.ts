import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { shownUnit } from '../../../../procedures/engine/showing';
import { ResultMark } from '../../shared/result-mark';
import type { RunView } from '../run-view';
import { latestValue } from '../walked-steps';

/** The value that was recorded last, so that it is in sight on steps that read nothing. */
@Component({
  selector: 'bay-last-reading',
  imports: [ResultMark],
  template: `
    @if (last(); as value) {
      <p class="label">
        <span>Recorded last, step {{ number() }}</span>
        <span>{{ value.label }}</span>
      </p>
      <p class="figure">
        @if (value.judgement?.result; as result) {
          <bay-result-mark [result]="result" [size]="24" />
        }
        <span class="num">{{ value.text }}</span> <span class="unit">{{ unit() }}</span>
      </p>
    } @else {
      <p class="label">Nothing is recorded yet</p>
    }
  `,
  styles: `
    :host {
      flex: none;
      display: flex;
      align-items: flex-end;
      justify-content: space-between;
      gap: 16px;
      height: 60px;
      padding: 0 6px 6px;
      border-bottom: 3px solid var(--live);
      color: var(--ink-2);
    }
    .label {
      display: grid;
      line-height: 1.15;
      min-width: 0;
    }
    .label span {
      overflow: hidden;
      text-overflow: ellipsis;
      white-space: nowrap;
    }
    .figure {
      flex: none;
      display: flex;
      align-items: baseline;
      gap: 8px;
      line-height: 1;
    }
    .num {
      font-size: 40px;
      color: var(--ink);
    }
    .unit {
      font-size: 22px;
      font-weight: 500;
    }
    @media (max-width: 640px) {
      :host {
        height: 52px;
      }
      .label {
        font-size: 15px;
      }
      .num {
        font-size: 30px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LastReading {
  readonly run = input.required<RunView>();

  protected readonly last = computed(() => latestValue(this.run()));
  protected readonly number = computed(() => {
    const step = this.last()?.step;
    return step === undefined ? '' : (this.run().procedure.step(step)?.number ?? step);
  });
  protected readonly unit = computed(() => shownUnit(this.last()?.unit ?? ''));
}
