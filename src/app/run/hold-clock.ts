/** A clock that a hold step runs by, as its event left it. */
export interface RunningHold {
  /** The device's clock when it was started, milliseconds. */
  readonly startedAt: number;
  /** The run's monotonic time when it was started, milliseconds. */
  readonly startedElapsed: number;
  readonly seconds: number;
}

/** What a hold's clock shows now. */
export interface HoldReading {
  /** Never below 0. */
  readonly leftS: number;
  readonly isOver: boolean;
  /** Whether the time can be trusted: false when the device's clock was changed while the app was closed. */
  readonly isCertain: boolean;
}

/** The two clocks now, and what happened to the device's while the app was closed. */
export interface ClocksNow {
  /** The run's monotonic time, milliseconds. */
  readonly elapsed: number;
  /** The run's monotonic time when this window took the run up; before it only the device's clock counted. */
  readonly loadedElapsed: number;
  /** By how much the device's clock stood before the last event's when this window took the run up. */
  readonly clockBackMs: number;
}

/**
 * Reads a hold's clock. Monotonic time decides, so that a changed clock cannot shorten a hold while the app is open.
 * While it was closed only the device's clock went on: when that was set back over the hold, nobody knows how long it
 * was, and it says so.
 */
export function readHold(hold: RunningHold, now: ClocksNow): HoldReading {
  const leftS = Math.max(0, hold.seconds - (now.elapsed - hold.startedElapsed) / 1000);
  const wasClosed = hold.startedElapsed < now.loadedElapsed;
  return { leftS, isOver: leftS === 0, isCertain: !(wasClosed && now.clockBackMs > 0) };
}

/** Minutes and seconds, rounded up: `0:30` until a whole second is over. */
export function clockText(seconds: number): string {
  const whole = Math.ceil(seconds);
  return `${Math.floor(whole / 60)}:${String(whole % 60).padStart(2, '0')}`;
}
