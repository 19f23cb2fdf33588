import type { EventDraft } from '../../../procedures/engine/showing';

/** A clock that jumped by more than this is an event of its own; less is what network time corrects every day. */
export const notedJumpMs = 120_000;

/** Notices when someone sets the device's clock, by comparing it with the one that nobody can set. */
export class ClockWatch {
  private offset = 0;
  private pendingMs = 0;

  constructor(
    private readonly now: () => number,
    private readonly monotonic: () => number,
  ) {}

  /** Starts watching; `backMs` is by how much the clock already stands before the run's last event. */
  begin(backMs: number): void {
    this.offset = this.now() - this.monotonic();
    this.pendingMs = -backMs;
  }

  /** The event that is to be written first, when the clock has jumped since the last call. */
  drafts(): readonly EventDraft[] {
    const offset = this.now() - this.monotonic();
    const byMs = Math.round(offset - this.offset + this.pendingMs);
    if (Math.abs(byMs) < notedJumpMs) return [];
    this.offset = offset;
    this.pendingMs = 0;
    return [{ type: 'clock-jumped', data: { byMs } }];
  }
}
