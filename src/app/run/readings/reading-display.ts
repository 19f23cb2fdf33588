import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { shownUnit, type Judgement, type NamedValue } from '../../../../procedures/engine/showing';
import { BandGauge } from '../../shared/band-gauge';
import { ResultMark } from '../../shared/result-mark';
import { resultWords } from '../../shared/result-words';

/**
 * A value in large figures over its band. What stands in the way of it (a refusal, or that it is not judged) takes the
 * gauge's place, so that it is read beside the figure.
 */
@Component({
  selector: 'bay-reading-display',
  imports: [BandGauge, ResultMark],
  templateUrl: './reading-display.html',
  styleUrl: './reading-display.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReadingDisplay {
  readonly label = input.required<string>();
  /** The figure as typed or measured; empty while there is none. */
  readonly text = input.required<string>();
  readonly unit = input.required<string>();
  /** The figure that was read before, in view while the new one is judged. */
  readonly before = input<string>();
  /** Small words under the label: which take, with what. */
  readonly notes = input<readonly (string | undefined)[]>([]);
  /** The value that the figure gives: the quantity itself, or what follows from it. */
  readonly value = input<NamedValue>();
  /** The band while there is no value. */
  readonly band = input<Omit<Judgement, 'result'>>();
  /** Why the figure was not taken. */
  readonly refusal = input<string>();
  /** Whether only the figure stands here, and what belongs below it is given elsewhere. */
  readonly isBare = input(false);
  /** What is to be known where there is no refusal: not yet, or what an instrument's steps mean. */
  readonly remark = input<string>();

  protected readonly words = resultWords;
  protected readonly said = computed(() =>
    [...this.notes(), this.before()].filter((note) => note !== undefined && note !== ''),
  );
  protected readonly result = computed(() => this.value()?.judgement?.result);
  protected readonly gauge = computed(() => {
    const value = this.value();
    const band: Omit<Judgement, 'result'> | undefined = value?.judgement ?? this.band();
    if (band === undefined || (band.low === undefined && band.high === undefined)) return undefined;
    const unit = value?.unit ?? this.unit();
    return {
      ...band,
      value: value?.value,
      uncertainty: value?.judgement?.guard ?? value?.uncertainty,
      text: value?.text,
      unit: shownUnit(unit),
    };
  });
  protected readonly unjudged = computed(() => (this.value()?.judgement ?? this.band())?.unjudged);
  /** What the figure gives where that has another name or unit than what was typed. */
  protected readonly derived = computed(() => {
    const value = this.value();
    if (value === undefined || (value.text === this.text() && shownUnit(value.unit) === this.unit())) return undefined;
    return `${value.label} ${value.text} \u00b1 ${value.uncertaintyText} ${shownUnit(value.unit)}`;
  });
}
