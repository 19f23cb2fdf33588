import { ChangeDetectionStrategy, Component, computed, input, linkedSignal, output } from '@angular/core';
import { PrimaryButton } from '../primary-action';
import { RefusalLine } from './refusal-line';

/**
 * The one primary action of a step without a number pad: as large as the room allows, in the bottom corner of the hand.
 * Over it stands what it has to say: why it was refused, or what is missing. It can always be pressed, and answers.
 */
@Component({
  selector: 'bay-big-action',
  imports: [PrimaryButton, RefusalLine],
  template: `
    <bay-refusal-line [refusal]="said()" [missing]="missing()" />
    <button
      type="button"
      bayPrimary
      [class.live]="isLive()"
      [disabled]="isBusy()"
      [attr.aria-disabled]="isReady() && missing() === undefined ? null : 'true'"
      (click)="press()"
    >
      {{ label() }}
    </button>
  `,
  styles: `
    :host {
      flex: 1 0 auto;
      display: flex;
      flex-direction: column;
      justify-content: flex-end;
      margin-top: auto;
      padding-bottom: var(--gap);
    }
    button {
      flex: 1 1 var(--big-height, var(--touch-primary));
      min-height: 0;
      max-height: calc(43 * var(--mm));
      font-size: 34px;
      font-weight: 700;
      line-height: 1.1;
      white-space: pre-line;
    }
    button[aria-disabled='true'] {
      background: var(--shade);
      border-color: var(--edge);
      color: var(--ink-2);
    }
    @media (max-width: 640px) {
      :host {
        padding-bottom: 10px;
      }
      button {
        font-size: 26px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BigAction {
  readonly label = input.required<string>();
  /** Whether it is the live thing, a clock or a noise that is listened to, rather than the way on. */
  readonly isLive = input(false);
  readonly isReady = input(true);
  readonly isBusy = input(false);
  /** Why what it asked for was not done. */
  readonly refusal = input<string>();
  /** What has to be entered before it does anything. */
  readonly missing = input<string>();
  readonly done = output();

  /** What was missing when it was pressed, as long as it is missing still. */
  private readonly answered = linkedSignal<string | undefined, string | undefined>({
    source: this.missing,
    computation: () => undefined,
  });
  protected readonly said = computed(() => this.refusal() ?? this.answered());

  protected press(): void {
    const missing = this.missing();
    if (missing === undefined) this.done.emit();
    else this.answered.set(missing);
  }
}
