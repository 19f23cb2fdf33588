import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { shownUnit, type NamedValue } from '../../../../procedures/engine/showing';
import { BandGauge } from '../../shared/band-gauge';
import { ResultMark } from '../../shared/result-mark';
import { resultWords } from '../../shared/result-words';

/** A value in one line, with its result in words and its band below. */
@Component({
  selector: 'bay-judged-line',
  imports: [BandGauge, ResultMark],
  template: `
    <p>
      <span class="label">{{ value().label }}</span>
      <b class="num">{{ value().text }}</b>
      @if (value().uncertaintyText !== '0') {
        <span>&plusmn; {{ value().uncertaintyText }}</span>
      }
      <span>{{ unit() }}</span>
      @if (value().judgement?.result; as result) {
        <span class="result" [class]="result"
          ><bay-result-mark [result]="result" [size]="18" [isSilent]="true" /> {{ words[result] }}</span
        >
      }
    </p>
    @if (value().judgement; as judgement) {
      @if (judgement.unjudged; as unjudged) {
        <p class="muted">{{ unjudged }}</p>
      } @else {
        <bay-band-gauge
          [low]="judgement.low"
          [high]="judgement.high"
          [lowText]="judgement.lowText"
          [highText]="judgement.highText"
          [value]="value().value"
          [valueText]="value().text"
          [uncertainty]="value().judgement?.guard ?? value().uncertainty"
          [result]="judgement.result"
          [unit]="unit()"
        />
      }
    }
  `,
  styles: `
    :host {
      display: block;
      flex: none;
    }
    p {
      display: flex;
      flex-wrap: wrap;
      align-items: baseline;
      gap: 0 8px;
      padding: 0 6px;
      line-height: 1.3;
    }
    .label {
      color: var(--ink-2);
    }
    .num {
      font-size: 24px;
      line-height: 1.1;
    }
    .result {
      display: inline-flex;
      align-items: center;
      gap: 6px;
      margin-left: auto;
      font-weight: 600;
      white-space: nowrap;
    }
    .in {
      color: var(--in);
    }
    .out {
      color: var(--out);
    }
    .too-close {
      color: var(--close);
    }
    @media (max-width: 640px) {
      p {
        font-size: 15px;
      }
      .num {
        font-size: 19px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JudgedLine {
  readonly value = input.required<NamedValue>();

  protected readonly words = resultWords;
  protected readonly unit = computed(() => shownUnit(this.value().unit));
}
