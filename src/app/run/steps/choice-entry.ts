import {
  afterRenderEffect,
  ChangeDetectionStrategy,
  Component,
  computed,
  type ElementRef,
  viewChild,
} from '@angular/core';
import type { ChoiceOption } from '../../../../procedures/document';
import { entryField } from '../entry-draft';
import { BigAction } from '../frame/big-action';
import { HandSide } from '../frame/hand-side';
import { LastReading } from '../frame/last-reading';
import { StepPictureView } from '../frame/step-picture-view';
import { WideSide } from '../frame/wide-side';
import { StepEntry } from '../step-entry';

/**
 * An observation among options, as tiles. One tap chooses and a second, on the primary action, records it: what is
 * recorded is read once more on the way there.
 */
@Component({
  selector: 'bay-choice-entry',
  imports: [BigAction, HandSide, LastReading, StepPictureView, WideSide],
  templateUrl: './choice-entry.html',
  styleUrl: './choice-entry.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ChoiceEntry extends StepEntry<'choice'> {
  protected readonly chosen = entryField<readonly string[]>(this.run, 'chosen', []);
  protected readonly text = entryField(this.run, 'asked', '');
  protected readonly several = computed(() => this.step().several === true);
  /** What the options look like: of the one that was tapped last, or of all while none is. */
  protected readonly pictured = computed(() => {
    const last = this.chosen().at(-1);
    const asked = this.step().options.filter(({ name }) => last === undefined || name === last);
    return asked.flatMap(({ name, label, picture }) => (picture === undefined ? [] : [{ name, label, picture }]));
  });
  /** What is asked beside the chosen options. */
  protected readonly asks = computed(() =>
    this.step()
      .options.filter(({ name }) => this.chosen().includes(name))
      .flatMap(({ ask }) => ask ?? []),
  );
  /** What has to be entered before anything can be recorded. */
  protected readonly missing = computed(() => {
    if (this.chosen().length === 0) return 'Choose first what you see.';
    return this.asks().length > 0 && this.text().trim() === ''
      ? `Say above first: ${this.asks().join(' ')}`
      : undefined;
  });

  private readonly field = viewChild<ElementRef<HTMLTextAreaElement>>('asked');

  constructor() {
    super();
    // What an option asks for may appear below the fold: the field comes into sight, ready to be written in.
    afterRenderEffect(() => {
      const field = this.field()?.nativeElement;
      if (field === undefined) return;
      field.focus({ preventScroll: true });
      field.closest('.field')?.scrollIntoView({ block: 'nearest' });
    });
  }

  protected toggle({ name }: ChoiceOption): void {
    this.chosen.update((chosen) => {
      if (chosen.includes(name)) return chosen.filter((other) => other !== name);
      return this.several() ? [...chosen, name] : [name];
    });
  }

  protected record(): void {
    const text = this.asks().length > 0 ? this.text() : '';
    this.commanded.emit({ do: 'choose', options: this.chosen(), ...(text === '' ? {} : { text }) });
  }
}
