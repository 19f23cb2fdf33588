/** A second tap within this time is a bounce or a hasty double tap, never a decision about the next step. */
export const tapGuardMs = 400;

/** Lets one tap through, and the next one only when the guard time is over. */
export class TapGuard {
  private last = Number.NEGATIVE_INFINITY;

  constructor(private readonly monotonic: () => number) {}

  /** Whether a tap now counts; one that counts starts the guard time anew. */
  admit(): boolean {
    const now = this.monotonic();
    if (now - this.last < tapGuardMs) return false;
    this.last = now;
    return true;
  }
}
