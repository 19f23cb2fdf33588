import { ChangeDetectionStrategy, Component, computed, input, model } from '@angular/core';
import { ResultMark } from '../shared/result-mark';
import { caretIn, groupVin, tidyVin, vinLength } from './vin-text';
import { vinVerdict } from './vin-words';

/** The VIN, grouped while it is typed and checked at once. One that does not fit may be kept after a second look. */
@Component({
  selector: 'bay-vin-field',
  imports: [ResultMark],
  templateUrl: './vin-field.html',
  styleUrl: './vin-field.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VinField {
  /** The number without blanks. */
  readonly vin = model.required<string>();
  /** Whether a number that does not fit is kept nevertheless. */
  readonly isKept = model.required<boolean>();
  readonly thisYear = input.required<number>();
  /** What is wrong, once it is time to say so. */
  readonly problem = input<string>();

  protected readonly grouped = computed(() => groupVin(this.vin()));
  protected readonly verdict = computed(() => vinVerdict(this.vin(), this.thisYear()));
  protected readonly words = computed(() => {
    const verdict = this.verdict();
    return verdict.is === 'empty' ? '' : verdict.words;
  });
  protected readonly count = computed(() => `${this.vin().length} of ${vinLength}`);

  protected type(field: HTMLInputElement): void {
    const before = tidyVin(field.value.slice(0, field.selectionStart ?? field.value.length)).length;
    const vin = tidyVin(field.value);
    const grouped = groupVin(vin);
    field.value = grouped;
    const caret = caretIn(grouped, before);
    field.setSelectionRange(caret, caret);
    if (vin !== this.vin()) this.isKept.set(false);
    this.vin.set(vin);
  }
}
