/** One thing to be timed: `work` does `units` of what is counted and gives something that depends on all of it. */
export interface Subject {
  readonly name: string;
  readonly units: number;
  readonly work: () => unknown;
}

export interface Timing {
  readonly name: string;
  readonly units: number;
  /** Median over the rounds, processor time. */
  readonly perUnitNs: number;
  /** Of the same, the fastest and the slowest round. */
  readonly fastestNs: number;
  readonly slowestNs: number;
}

/** What the last works gave: without a reader the compiler could leave the work out. */
export const given: unknown[] = [];

/**
 * Times the subjects in turns, round by round, so that what else the machine does falls on all of them; the first
 * rounds warm up and are not counted. Processor time of this process, not time on the wall: others use the machine too.
 */
export function measure(subjects: readonly Subject[], { rounds = 9, warmUp = 3 } = {}): readonly Timing[] {
  const taken = subjects.map((): number[] => []);
  for (let round = 0; round < warmUp + rounds; round += 1) {
    for (const [index, { units, work }] of subjects.entries()) {
      const begin = process.cpuUsage();
      given[index] = work();
      const { user, system } = process.cpuUsage(begin);
      if (round >= warmUp) taken[index]?.push(((user + system) * 1000) / units);
    }
  }
  return subjects.map(({ name, units }, index) => {
    const sorted = [...(taken[index] ?? [])].sort((a, b) => a - b);
    const at = (share: number): number => sorted[Math.round(share * (sorted.length - 1))] ?? Number.NaN;
    return { name, units, perUnitNs: at(0.5), fastestNs: at(0), slowestNs: at(1) };
  });
}

/** The timing of a name. */
export function timing(timings: readonly Timing[], name: string): Timing {
  const found = timings.find((candidate) => candidate.name === name);
  if (found === undefined) throw new Error(`nothing called ${name} was measured`);
  return found;
}
