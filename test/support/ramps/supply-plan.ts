import { type SeededRandom } from './seeded-random';

/** How the supply is turned up. */
export type SupplyKind =
  | 'steady'
  /** By hand, a little at a time. */
  | 'stepped'
  /** Steadily, with pauses in which the pressure is held. */
  | 'held'
  /** Until the regulator gives no more. */
  | 'end-of-travel'
  /** Steadily, and off again at the end: the pressure bleeds back. */
  | 'bled';

/** What the ramp is laid out for. */
export interface SupplyFrame {
  readonly restS: number;
  /** The supply pressure to come to, and how long a steady ramp takes to it. */
  readonly targetKpa: number;
  readonly rampS: number;
  /** How long it goes on after that. */
  readonly afterS: number;
  /** Whether the target has to be passed: a valve is to shut there. */
  readonly passesTarget: boolean;
}

export interface SupplyPlan {
  readonly supplyKpa: (timeS: number) => number;
  readonly endS: number;
}

type Corner = readonly [timeS: number, kpa: number];

function alongCorners(corners: readonly Corner[]): (timeS: number) => number {
  const never = Infinity;
  let passed = 0;
  return (timeS) => {
    while (passed > 0 && (corners[passed]?.[0] ?? 0) > timeS) passed--;
    while ((corners[passed + 1]?.[0] ?? never) <= timeS) passed++;
    const from = corners[passed];
    const to = corners[passed + 1];
    if (from === undefined) return 0;
    if (to === undefined || timeS <= from[0]) return from[1];
    return from[1] + ((to[1] - from[1]) * (timeS - from[0])) / (to[0] - from[0] || 1);
  };
}

function steadyTo(corners: Corner[], kpa: number, ratePerS: number): void {
  const [lastS, lastKpa] = corners.at(-1) ?? [0, 0];
  corners.push([lastS + (kpa - lastKpa) / ratePerS, kpa]);
}

function rest(corners: Corner[], seconds: number): void {
  const [lastS, lastKpa] = corners.at(-1) ?? [0, 0];
  corners.push([lastS + seconds, lastKpa]);
}

function addSteps(corners: Corner[], endKpa: number, ratePerS: number, random: SeededRandom): void {
  for (let kpa = 0; kpa < endKpa;) {
    const everyS = random.between(2, 5);
    const slewS = random.between(0.3, 0.8);
    kpa += everyS * ratePerS * random.between(0.7, 1.3);
    steadyTo(corners, kpa, (kpa - (corners.at(-1)?.[1] ?? 0)) / slewS);
    rest(corners, everyS - slewS);
  }
}

function addHolds(corners: Corner[], { targetKpa, afterS }: SupplyFrame, ratePerS: number, random: SeededRandom): void {
  const shares = Array.from({ length: random.whole(1, 3) }, () => random.between(0.2, 0.99)).sort((a, b) => a - b);
  for (const share of shares) {
    steadyTo(corners, share * targetKpa, ratePerS);
    rest(corners, random.between(2, 10));
  }
  steadyTo(corners, targetKpa + ratePerS * afterS, ratePerS);
  rest(corners, random.between(2, 10));
}

/** Lays out a supply of one kind. */
export function planSupply(kind: SupplyKind, frame: SupplyFrame, random: SeededRandom): SupplyPlan {
  const { restS, targetKpa, rampS, afterS, passesTarget } = frame;
  const ratePerS = targetKpa / rampS;
  const beyondKpa = targetKpa + ratePerS * afterS;
  const corners: Corner[] = [[restS, 0]];
  switch (kind) {
    case 'steady':
      steadyTo(corners, beyondKpa, ratePerS);
      break;
    case 'stepped':
      addSteps(corners, beyondKpa, ratePerS, random);
      break;
    case 'held':
      addHolds(corners, frame, ratePerS, random);
      break;
    case 'end-of-travel':
      steadyTo(corners, targetKpa * (passesTarget ? random.between(1.05, 1.3) : random.between(0.4, 1)), ratePerS);
      rest(corners, afterS + 8);
      break;
    case 'bled':
      steadyTo(corners, beyondKpa, ratePerS);
      steadyTo(corners, 0, -beyondKpa / random.between(1, 8));
      rest(corners, random.between(4, 10));
      break;
  }
  return { supplyKpa: alongCorners(corners), endS: corners.at(-1)?.[0] ?? restS };
}
