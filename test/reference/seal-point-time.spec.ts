import { findSealPoint } from '../../procedures/calculations';
import { simulateRamp } from '../support/ramps/simulated-ramp';

const { samples, stationKpa } = simulateRamp({ valve: 'chatters-then-seals', coughs: true }, 3);
const lengthS = samples.at(-1)?.timeS ?? 0;

/** The ramp with so many samples, drawn through those that it has. */
function drawnThrough(count: number) {
  let before = 0;
  return Array.from({ length: count }, (_, index) => {
    const timeS = (lengthS * index) / count;
    while ((samples[before + 1]?.timeS ?? Infinity) <= timeS) before++;
    return { ...samples[before]!, timeS };
  });
}

/** Processor time of this process, which a busy machine does not stretch; the least of several. */
function costOf(count: number): number {
  const ramp = drawnThrough(count);
  const costs = Array.from({ length: 5 }, () => {
    const began = process.cpuUsage();
    expect(findSealPoint(ramp, { stationKpa }).sealed).toBe(true);
    const { user, system } = process.cpuUsage(began);
    return user + system;
  });
  return Math.min(...costs);
}

describe('the time of findSealPoint', () => {
  it.each([2_000, 20_000])('is ten to twelve times that of %d samples for ten times as many', (count) => {
    costOf(count);
    expect(costOf(10 * count) / costOf(count)).toBeLessThan(12);
  });
});
