import { ChangeDetectionStrategy, Component, input, linkedSignal, output } from '@angular/core';

/**
 * What ends or throws away a ramp: the first tap only asks, beside a way out of it, and the second does it. Whatever else
 * happens in the run meanwhile takes the question away.
 */
@Component({
  selector: 'bay-sure-button',
  template: `
    @if (isAsked()) {
      <!-- Where the first tap was stands the way out: a bounce of the finger undoes, and does not confirm. -->
      <button type="button" (click)="isAsked.set(false)">Leave it</button>
    }
    <button type="button" [class.asked]="isAsked()" [disabled]="isBusy() || !isReady()" (click)="press()">
      {{ isAsked() ? 'Sure? ' + label() : label() }}
    </button>
  `,
  styles: `
    :host {
      display: contents;
    }
    button {
      min-height: var(--touch);
      padding: 4px 8px;
      font-weight: 500;
      line-height: 1.15;
    }
    button:disabled {
      color: var(--ink-2);
    }
    .asked {
      background: var(--live-wash);
      border-color: var(--live);
      font-weight: 700;
    }
    @media (max-width: 640px) {
      button {
        font-size: 16px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SureButton {
  readonly label = input.required<string>();
  /** What the question is about: when it changes, the question is gone. */
  readonly about = input.required<number>();
  readonly isReady = input(true);
  readonly isBusy = input(false);
  readonly done = output();

  protected readonly isAsked = linkedSignal<number, boolean>({
    source: () => this.about(),
    computation: () => false,
  });

  protected press(): void {
    if (this.isAsked()) this.done.emit();
    this.isAsked.update((isAsked) => !isAsked);
  }
}
