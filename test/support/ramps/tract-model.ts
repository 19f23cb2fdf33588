/** An intake tract under test: a supply through a hose, a valve into the crankcase, a small leak that stays. */
export interface Tract {
  readonly volumeL: number;
  /** Effective flow areas. */
  readonly hoseMm2: number;
  readonly valveMm2: number;
  readonly leakMm2: number;
  readonly temperatureK: number;
}

/** How the valve behaves; pressures are above the station's. */
export type Valve =
  /** It stays open whatever comes, or shut. */
  | { readonly kind: 'open' }
  | { readonly kind: 'shut' }
  /** It begins to close at `sealKpa - travelKpa` and is shut from `sealKpa` on, open again `reopensKpa` below that. */
  | { readonly kind: 'seals'; readonly sealKpa: number; readonly travelKpa: number; readonly reopensKpa: number }
  /** From `fromKpa` on it is shut and open by turns, for these seconds, and then shut or open for good. */
  | {
      readonly kind: 'chatters';
      readonly fromKpa: number;
      readonly shutThenOpenS: readonly number[];
      readonly endsShut: boolean;
    };

/** What happened in the tract, in steps of `stepS` from 0. */
export interface TractHistory {
  readonly stepS: number;
  readonly gaugeKpa: Float64Array;
  readonly valveGps: Float64Array;
  readonly leakGps: Float64Array;
  /** When the valve shut for good, before any bleeding back, and the pressure then. */
  readonly seal: { readonly timeS: number; readonly gaugeKpa: number } | undefined;
}

// A test runner looks globals up slowly, and these are called millions of times.
const { abs, max, sign, sqrt } = Math;

/** Short against the 40 ms or so in which a valve runs shut by itself. */
const stepS = 0.002;
const airJPerKgK = 287.05;
const stationPa = 93_900;

/**
 * Integrates the pressure in the tract while the supply follows `supplyKpa` (above the station pressure, by the second).
 *
 * The tract is an isothermal volume; flows are those of an orifice at constant density, which at 13 kPa above the
 * station is within 3 % of the compressible one. Explicit steps of 2 ms.
 */
export function runTract(tract: Tract, valve: Valve, supplyKpa: (timeS: number) => number, endS: number): TractHistory {
  const steps = Math.ceil(endS / stepS) + 1;
  const history = {
    stepS,
    gaugeKpa: new Float64Array(steps),
    valveGps: new Float64Array(steps),
    leakGps: new Float64Array(steps),
  };
  const gpsPerMm2 = orificeGps(tract, 1, 1);
  /** kPa per gram in the tract. */
  const kpaPerGram = (airJPerKgK * tract.temperatureK) / tract.volumeL / 1000;
  const flow = (areaMm2: number, differenceKpa: number): number =>
    areaMm2 * gpsPerMm2 * sign(differenceKpa) * sqrt(abs(differenceKpa));
  const opening = openingOf(valve);
  let gaugeKpa = 0;
  let seal: TractHistory['seal'];
  for (let index = 0; index < steps; index++) {
    const timeS = index * stepS;
    const { share, isShutForGood } = opening(gaugeKpa, timeS);
    if (isShutForGood) seal ??= { timeS, gaugeKpa };
    const valveGps = flow(share * tract.valveMm2, gaugeKpa);
    const leakGps = flow(tract.leakMm2, gaugeKpa);
    history.gaugeKpa[index] = gaugeKpa;
    history.valveGps[index] = valveGps;
    history.leakGps[index] = leakGps;
    const netGps = flow(tract.hoseMm2, supplyKpa(timeS) - gaugeKpa) - valveGps - leakGps;
    gaugeKpa = max(0, gaugeKpa + kpaPerGram * netGps * stepS);
  }
  return { ...history, seal };
}

interface Opening {
  /** 1 for wide open. */
  readonly share: number;
  readonly isShutForGood: boolean;
}

const wideOpen: Opening = { share: 1, isShutForGood: false };
const shut: Opening = { share: 0, isShutForGood: false };
const shutForGood: Opening = { share: 0, isShutForGood: true };

function openingOf(valve: Valve): (gaugeKpa: number, timeS: number) => Opening {
  if (valve.kind === 'open' || valve.kind === 'shut') return () => (valve.kind === 'open' ? wideOpen : shut);
  if (valve.kind === 'seals') {
    const { sealKpa, travelKpa, reopensKpa } = valve;
    let isShut = false;
    return (gaugeKpa) => {
      isShut = isShut ? gaugeKpa > sealKpa - reopensKpa : gaugeKpa >= sealKpa;
      if (isShut) return shutForGood;
      const share = (sealKpa - gaugeKpa) / travelKpa;
      return share >= 1 ? wideOpen : { share, isShutForGood: false };
    };
  }
  const { fromKpa, shutThenOpenS, endsShut } = valve;
  let beganS: number | undefined;
  return (gaugeKpa, timeS) => {
    if (gaugeKpa >= fromKpa) beganS ??= timeS;
    if (beganS === undefined) return wideOpen;
    let untilS = beganS;
    for (const [turn, lengthS] of shutThenOpenS.entries()) {
      untilS += lengthS;
      if (timeS < untilS) return turn % 2 === 0 ? shut : wideOpen;
    }
    return endsShut ? shutForGood : wideOpen;
  };
}

/** Flow in g/s through an effective area at a pressure difference, at constant density. */
export function orificeGps({ temperatureK }: Tract, areaMm2: number, differenceKpa: number): number {
  const density = stationPa / (airJPerKgK * temperatureK);
  return areaMm2 * 1e-3 * sqrt(2 * density * 1000 * differenceKpa);
}

/** The pressure that the supply needs to hold the tract at `gaugeKpa` with the valve open. */
export function supplyToHoldKpa({ hoseMm2, valveMm2, leakMm2 }: Tract, gaugeKpa: number): number {
  return gaugeKpa * (1 + ((valveMm2 + leakMm2) / hoseMm2) ** 2);
}
