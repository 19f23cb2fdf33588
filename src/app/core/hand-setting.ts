import { DOCUMENT, effect, inject, Injectable, signal } from '@angular/core';
import { SettingsBook } from './settings-book';

export type Hand = 'right' | 'left';

const handKey = 'hand';
const sizeKey = 'px-per-mm';
/** ISO/IEC 7810 ID-1: a bank card's width. */
export const cardWidthMm = 85.6;
/** 160 px/in tablets, until the screen has been measured. */
export const assumedPxPerMm = 6.3;
/** What a measured screen can plausibly have. */
export const pxPerMmRange = { low: 3, high: 12 } as const;

/** How this tablet is held and how large its pixels are: the page carries both, so that touch is laid out in millimetres. */
@Injectable({ providedIn: 'root' })
export class HandSetting {
  private readonly settings = inject(SettingsBook);
  private readonly root = inject(DOCUMENT).documentElement;

  private readonly chosenHand = signal<Hand>('right');
  private readonly measured = signal<number | undefined>(undefined);

  /** Resolves once what this tablet keeps has been read. */
  readonly recalled: Promise<void>;
  /** The hand that taps; what it taps stands on its side. */
  readonly hand = this.chosenHand.asReadonly();
  /** CSS pixels in a millimetre of this screen; undefined until a card was laid on it. */
  readonly pxPerMm = this.measured.asReadonly();

  constructor() {
    // Towards the page: css reads the hand and the millimetre there.
    effect(() => {
      this.root.dataset['hand'] = this.chosenHand();
      const size = this.measured();
      if (size === undefined) this.root.style.removeProperty('--mm');
      else this.root.style.setProperty('--mm', `${size}px`);
    });
    this.recalled = this.recall();
  }

  async chooseHand(hand: Hand): Promise<void> {
    this.chosenHand.set(hand);
    await this.settings.write(handKey, hand);
  }

  /** Keeps the measured size; undefined goes back to the assumed one. Throws RangeError for an implausible one. */
  async measure(pxPerMm: number | undefined): Promise<void> {
    if (pxPerMm !== undefined && !(pxPerMm >= pxPerMmRange.low && pxPerMm <= pxPerMmRange.high)) {
      throw new RangeError(`pxPerMm is ${pxPerMm}; allowed: ${pxPerMmRange.low} to ${pxPerMmRange.high}`);
    }
    this.measured.set(pxPerMm);
    if (pxPerMm === undefined) await this.settings.forget(sizeKey);
    else await this.settings.write(sizeKey, pxPerMm);
  }

  private async recall(): Promise<void> {
    const hand = await this.settings.read<Hand>(handKey);
    if (hand === 'left' || hand === 'right') this.chosenHand.set(hand);
    const size = await this.settings.read<number>(sizeKey);
    if (typeof size === 'number') this.measured.set(size);
  }
}
