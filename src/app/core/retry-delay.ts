const firstCeilingMs = 2_000;
const lastCeilingMs = 300_000;

/**
 * How long to wait before the next try: a random share of a ceiling that doubles with each failure, from 2 s to at
 * most 5 min (full jitter, so that tablets that lost the same network do not come back at the same moment).
 *
 * `failures` counts from 1; `share` lies from 0 up to but not 1.
 */
export function retryDelayMs(failures: number, share: number): number {
  const ceiling = Math.min(lastCeilingMs, firstCeilingMs * 2 ** Math.max(0, failures - 1));
  return Math.round(share * ceiling);
}
