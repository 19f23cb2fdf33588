import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { layOutGauge, placeEndTexts } from './band-gauge-layout';
import { hostSize } from './element-size';
import { ResultShape } from './result-shape';
import { resultWords, type ShownResult } from './result-words';

const colours: Readonly<Record<ShownResult, string>> = {
  in: 'var(--in)',
  out: 'var(--out)',
  'too-close': 'var(--close)',
  'not-judged': 'var(--ink)',
  done: 'var(--ink)',
  'not-measured': 'var(--ink)',
};

/**
 * A reading against its band: the band as a washed bracket with its ends written over it, the value as its result's
 * shape, the expanded uncertainty as a whisker. Figures may come in any unit as long as it is one; the texts are what
 * is read.
 */
@Component({
  selector: 'bay-band-gauge',
  imports: [ResultShape],
  templateUrl: './band-gauge.html',
  styleUrl: './band-gauge.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BandGauge {
  /** The band's lower end; absent when it has none. */
  readonly low = input<number>();
  /** The band's upper end; absent when it has none. */
  readonly high = input<number>();
  /** The reading; absent while there is none. */
  readonly value = input<number>();
  /** Expanded uncertainty (k = 2) in the same unit. */
  readonly uncertainty = input<number>();
  /** The unit of the texts. */
  readonly unit = input.required<string>();
  /** How the reading was judged; absent when it is not judged. */
  readonly result = input<ShownResult>();
  readonly lowText = input<string>();
  readonly highText = input<string>();
  /** The reading as text, for those who hear the gauge. */
  readonly valueText = input<string>();
  /** Whether it stands in a table: lower, with smaller texts. */
  readonly small = input(false);

  protected readonly size = hostSize({ width: 560, height: 62 });
  protected readonly height = computed(() => (this.small() ? 42 : 62));
  protected readonly middle = computed(() => (this.small() ? 29 : 42));
  protected readonly fontSize = computed(() => (this.small() ? 14 : 18));
  protected readonly radius = computed(() => (this.small() ? 9 : 13));
  /** Half the bracket's height. */
  protected readonly reach = computed(() => (this.small() ? 11 : 17));

  protected readonly layout = computed(() =>
    layOutGauge(
      { low: this.low(), high: this.high(), value: this.value(), uncertainty: this.uncertainty() ?? 0 },
      this.size().width,
    ),
  );
  protected readonly shape = computed<ShownResult>(() => this.result() ?? 'done');
  protected readonly colour = computed(() => colours[this.shape()]);
  protected readonly wash = computed(() => {
    const { low, high, lineStart, lineEnd } = this.layout();
    return { from: low ?? lineStart, to: high ?? lineEnd, isShown: low !== undefined || high !== undefined };
  });
  protected readonly lowLabel = computed(() => {
    const text = this.lowText();
    if (text === undefined) return undefined;
    return this.highText() === undefined ? `from ${text} ${this.unit()}` : text;
  });
  protected readonly highLabel = computed(() => {
    const text = this.highText();
    if (text === undefined) return undefined;
    return this.lowText() === undefined ? `up to ${text} ${this.unit()}` : `${text} ${this.unit()}`;
  });
  protected readonly textAt = computed(() => {
    const { low, high } = this.layout();
    return placeEndTexts(this.endText(this.lowLabel(), low), this.endText(this.highLabel(), high), this.size().width);
  });
  protected readonly spoken = computed(() => {
    const unit = this.unit();
    const value = this.valueText() ?? (this.value() === undefined ? undefined : String(this.value()));
    const reading = value === undefined ? 'no reading yet' : `${value} ${unit}`;
    const result = this.result();
    const low = this.lowText();
    const high = this.highText();
    const band =
      low !== undefined && high !== undefined
        ? `band from ${low} to ${high} ${unit}`
        : (this.lowLabel() ?? this.highLabel() ?? 'no band');
    return [reading, ...(result ? [resultWords[result]] : []), band].join(', ');
  });

  /** Inter's digits are 0.62 em wide at weight 600; other characters are not wider on average. */
  private endText(text: string | undefined, x: number | undefined): { x: number; width: number } | undefined {
    if (text === undefined || x === undefined) return undefined;
    return { x, width: text.length * this.fontSize() * 0.62 };
  }
}
