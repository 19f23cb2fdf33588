import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { PrimaryButton } from '../primary-action';
import { padKeyOf, type PadKey } from './number-text';

const rows: readonly PadKey[] = ['7', '8', '9', '4', '5', '6', '1', '2', '3', '-', '0', '.'];

/**
 * The number pad with the primary action beside it. A hardware keyboard's digits work as well, wherever the focus is,
 * except in a field of text; no letter gets in.
 */
@Component({
  selector: 'bay-number-pad',
  imports: [PrimaryButton],
  template: `
    @for (key of keys; track key) {
      <button
        type="button"
        [class]="'key k' + $index"
        [attr.aria-label]="words[key] ?? null"
        [disabled]="!takes(key)"
        [title]="takes(key) ? '' : 'An absolute pressure is never below zero'"
        (click)="pressed.emit(key)"
      >
        {{ key === '-' ? '−' : key }}
      </button>
    }
    <button type="button" class="erase" (click)="erased.emit()">{{ eraseLabel() }}</button>
    <button
      type="button"
      bayPrimary
      class="go"
      [disabled]="isBusy()"
      [attr.aria-disabled]="isReady() ? null : 'true'"
      (click)="done.emit()"
    >
      {{ primaryLabel() }}
    </button>
  `,
  styleUrl: './number-pad.css',
  host: { '(window:keydown)': 'take($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NumberPad {
  readonly primaryLabel = input.required<string>();
  /** Whether there is something to record; a tap before that is answered in words. */
  readonly isReady = input(true);
  readonly isBusy = input(false);
  /** Whether what is read can be below zero; an absolute pressure cannot. */
  readonly isSigned = input(true);
  readonly eraseLabel = input('Erase');
  readonly pressed = output<PadKey>();
  readonly erased = output();
  readonly done = output();

  protected readonly keys = rows;
  protected readonly words: Partial<Record<PadKey, string>> = { '-': 'minus', '.': 'decimal point' };

  protected takes(key: PadKey): boolean {
    return key !== '-' || this.isSigned();
  }

  protected take(event: KeyboardEvent): void {
    if (event.defaultPrevented || event.ctrlKey || event.metaKey || event.altKey || isTyping(event.target)) return;
    const key = padKeyOf(event.key);
    if (key === undefined) return;
    event.preventDefault();
    if (this.takes(key)) this.pressed.emit(key);
  }
}

const isTyping = (target: EventTarget | null): boolean =>
  target instanceof HTMLInputElement || target instanceof HTMLTextAreaElement || target instanceof HTMLSelectElement;
