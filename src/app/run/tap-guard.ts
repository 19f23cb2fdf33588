/** A second tap within this time is a bounce or a hasty double tap, never a decision about the next step. */
export const tapGuardMs = 400;

/**
 * What a tap is for. A point or a mark of a ramp follows its own moment, as close to the one before as it comes; to stop
 * is never too soon.
 */
export type TapKind = 'decision' | 'ramp' | 'stop';

/** Lets one tap through, and the next one only when the guard time is over. */
export class TapGuard {
  private last = Number.NEGATIVE_INFINITY;
  private lastDecision = Number.NEGATIVE_INFINITY;

  constructor(private readonly monotonic: () => number) {}

  /** Whether a tap now counts; one that counts starts the guard time anew. */
  admit(kind: TapKind = 'decision'): boolean {
    const now = this.monotonic();
    const since = kind === 'ramp' ? this.lastDecision : this.last;
    if (kind !== 'stop' && now - since < tapGuardMs) return false;
    this.last = now;
    if (kind !== 'ramp') this.lastDecision = now;
    return true;
  }
}

/** The same control again within this time, milliseconds, is the finger bouncing on it. */
export const bounceMs = { key: 150, mark: 250 } as const;

/** Tells a finger's bounce on one control from a tap on another. */
export class BounceGuard {
  private readonly last = new Map<string, number>();

  constructor(private readonly monotonic: () => number) {}

  /** Whether a tap on the control counts now. A bounce does not lengthen the time. */
  admit(control: string, withinMs: number = bounceMs.key): boolean {
    const now = this.monotonic();
    if (now - (this.last.get(control) ?? Number.NEGATIVE_INFINITY) < withinMs) return false;
    this.last.set(control, now);
    return true;
  }
}
