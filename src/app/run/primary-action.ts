import { DestroyRef, Directive, ElementRef, inject, Injectable, input } from '@angular/core';

/**
 * Knows which button is the one primary action now, for the pedal and for Enter and Space. The newest one on the
 * screen counts: a card laid over the step takes its place until it is gone.
 */
@Injectable()
export class PrimaryAction {
  private readonly buttons: PrimaryButton[] = [];

  add(button: PrimaryButton): void {
    this.buttons.push(button);
  }

  remove(button: PrimaryButton): void {
    this.buttons.splice(this.buttons.indexOf(button), 1);
  }

  /** Presses it, unless it is for the hand alone. */
  press(): void {
    this.buttons.at(-1)?.pressByPedal();
  }
}

/** The primary action of a screen. `hand-only` keeps the pedal off: what ends, acknowledges a limit or signs. */
@Directive({ selector: 'button[bayPrimary]', host: { '[class.primary]': 'true' } })
export class PrimaryButton {
  private readonly action = inject(PrimaryAction, { optional: true });
  private readonly button = inject<ElementRef<HTMLButtonElement>>(ElementRef).nativeElement;

  readonly bayPrimary = input<'' | 'hand-only'>('');

  constructor() {
    this.action?.add(this);
    inject(DestroyRef).onDestroy(() => this.action?.remove(this));
  }

  pressByPedal(): void {
    // What lies under a card is out of reach, for the pedal as for the hand.
    if (this.bayPrimary() === '' && this.button.closest('[inert]') === null) this.button.click();
  }
}
