import {
  convert,
  differenceToBase,
  expandedUncertainty,
  isUnit,
  standardPressure,
  toBase,
  unitKind,
} from '../calculations/for-a-run';
import {
  findNoiseBegin,
  findSealPoint,
  sealPointFromMarks,
  steepestRise,
  trackSensors,
  type NoSealReason,
  type RampSample,
  type SealPoint,
  type SensorTracking,
} from '../calculations/ramps';
import type { CompiledProcedure, FoundQuantity, SeriesStep } from '../document';
import { isSeriesStep } from '../document/step-parts';
import { own } from './environment';
import { figureText, type FigureText } from './figures';
import { rangeFor } from './instrument-uncertainty';
import { foundQuantitiesOf } from './quantities';
import type { InstrumentRange } from './run-event';
import type { RunState } from './run-state';
import type { Series } from './series';

const noSealWords: Readonly<Record<NoSealReason, string>> = {
  'too-little-data': 'Too few samples, or none with a sound level: place the marks by hand.',
  'no-rest': 'Without a gauge the series needs some seconds of rest at its start.',
  'no-noise': 'The level never rose above its background: no air was heard.',
  'never-quiet': 'The noise was there and never stopped.',
  'quiet-too-short': 'The noise went away but came back, or the quiet was not listened to for long enough.',
  'pressure-fell': 'The noise went away because the pressure fell.',
};

/** What was found in a series: figures in the quantities' own units. */
export interface ListeningResult {
  readonly found: readonly {
    readonly quantity: FoundQuantity;
    readonly figure: FigureText;
  }[];
  /** Why a quantity could not be found, in plain words. */
  readonly problems: readonly string[];
}

/** A place for the mark `noise stops`, offered for a person to accept; or why there is none. */
export type MarkSuggestion =
  | { readonly ok: true; readonly timeS: number; readonly pressureText: string }
  | { readonly ok: false; readonly reason: string };

/**
 * The series as the ramp calculations take it: kilopascals, and the level as it came. Where manifold pressure was not
 * logged, the gauge above the station pressure stands for it; a moment with neither is left out.
 */
export function samplesOf(series: Series, stationKpa: number): readonly RampSample[] {
  const gauge = kilopascals(series, 'gauge');
  const manifold = kilopascals(series, 'manifold');
  const boost = kilopascals(series, 'boost');
  const sound = kilopascals(series, 'sound');
  return series.timeS.flatMap((timeS, index) => {
    const gaugeKpa = gauge(index);
    const mapKpa = manifold(index) ?? (gaugeKpa === undefined ? undefined : gaugeKpa + stationKpa);
    return mapKpa === undefined ? [] : [{ timeS, gaugeKpa, mapKpa, boostKpa: boost(index), soundDb: sound(index) }];
  });
}

/** A channel's column in kilopascals (a level stays as it is); nothing anywhere when the series has no such channel. */
function kilopascals(series: Series, name: string): (index: number) => number | undefined {
  const channel = series.channels.find((candidate) => candidate.name === name);
  if (channel === undefined) return () => undefined;
  const { unit, values } = channel;
  if (!isUnit(unit) || unit === 'kPa' || unitKind(unit) !== 'pressure') return (index) => values[index];
  return (index) => {
    const value = values[index];
    return value === undefined ? undefined : convert(value, unit, 'kPa');
  };
}

/** The step of the gauge channel: the chosen instrument's display. */
export function gaugeRange(state: RunState, step: SeriesStep): InstrumentRange | undefined {
  const channel = step.channels.find((candidate) => candidate.name === 'gauge');
  if (channel?.gear === undefined || !isUnit(channel.unit)) return undefined;
  return rangeFor(state.gear[channel.gear], channel.unit, 'gauge');
}

/** The air of the place as it was taken in the run; else what the sensors show at the start of the series. */
function stationKpaOf(state: RunState, series: Series): number {
  const known = own(state.values, 'stationPressure');
  if (known !== undefined) return known.value / 1000;
  const atRest = kilopascals(series, 'manifold')(0) ?? kilopascals(series, 'boost')(0);
  return atRest ?? standardPressure(0);
}

/** Where the level falls for good, by the calculation; nothing is marked until a person accepts it. */
export function suggestMark(procedure: CompiledProcedure, state: RunState, series: Series): MarkSuggestion {
  const step = currentSeriesStep(procedure, state);
  if (step === undefined) return { ok: false, reason: 'The current step does not listen.' };
  const stationKpa = stationKpaOf(state, series);
  const seal = findSealPoint(samplesOf(series, stationKpa), {
    stationKpa,
    ...resolutionOption(gaugeRange(state, step)),
  });
  if (!seal.sealed) return { ok: false, reason: noSealWords[seal.reason] };
  return {
    ok: true,
    timeS: seal.timeS,
    pressureText: figureText(seal.aboveStationKpa * 1000, seal.uncertaintyKpa * 1000, 'kPa').text,
  };
}

/** Where the level leaves its background, by the calculation; undefined where it does not tell. */
export function suggestBegin(state: RunState, series: Series): number | undefined {
  return findNoiseBegin(samplesOf(series, stationKpaOf(state, series)));
}

export function currentSeriesStep(procedure: CompiledProcedure, state: RunState): SeriesStep | undefined {
  const step = state.current === undefined ? undefined : procedure.step(state.current.id);
  return step !== undefined && isSeriesStep(step) ? step : undefined;
}

function resolutionOption(range: InstrumentRange | undefined): { readonly resolutionKpa?: number } {
  return range === undefined ? {} : { resolutionKpa: differenceToBase(range.resolution, range.unit) / 1000 };
}

/** Computes everything that the listen step looks for, from the series and the marks that stand in the state. */
export function analyseListening(state: RunState, step: SeriesStep, series: Series): ListeningResult {
  const stationKpa = stationKpaOf(state, series);
  const samples = samplesOf(series, stationKpa);
  const hasManifold = series.channels.some(({ name }) => name === 'manifold');
  const range = gaugeRange(state, step);
  const accuracy = range === undefined ? 0 : differenceToBase(range.accuracy, range.unit);
  const problems: string[] = [];
  const found = foundQuantitiesOf(step).flatMap((quantity) => {
    const outcome = lookFor(quantity.what, { state, step, samples, stationKpa, hasManifold, range, accuracy });
    if (typeof outcome === 'string') {
      problems.push(outcome);
      return [];
    }
    return outcome === undefined
      ? []
      : [{ quantity, figure: figureText(outcome.value, outcome.uncertainty, quantity.unit) }];
  });
  return { found, problems };
}

interface Search {
  readonly state: RunState;
  readonly step: SeriesStep;
  readonly samples: readonly RampSample[];
  readonly stationKpa: number;
  readonly hasManifold: boolean;
  readonly range: InstrumentRange | undefined;
  /** Of the gauge, base units. */
  readonly accuracy: number;
}

type Sought = { readonly value: number; readonly uncertainty: number } | string | undefined;

function lookFor(what: FoundQuantity['what'], search: Search): Sought {
  switch (what) {
    case 'seal-point':
      return sealPoint(search);
    case 'highest-gauge':
      return highestGauge(search);
    case 'rise-rate':
      return riseRate(search);
    case 'manifold-gain':
    case 'boost-gain':
    case 'worst-gap':
      return tracked(what, search);
  }
}

function sealPoint({ state, step, samples, stationKpa, range, accuracy }: Search): Sought {
  const options = { stationKpa, ...resolutionOption(range) };
  if (step.kind === 'ramp') return sealed(findSealPoint(samples, options), accuracy);
  const marks = own(state.series, step.name)?.marks ?? {};
  const stops = marks['noise-stops'];
  if (stops === undefined) return undefined;
  const begins = marks['noise-begins']?.timeS ?? Math.min(stops.timeS, samples[0]?.timeS ?? 0);
  const computed = stops.by === 'suggested' ? findSealPoint(samples, options) : undefined;
  const seal =
    computed?.sealed === true && Math.abs(computed.timeS - stops.timeS) < 0.05
      ? computed
      : sealPointFromMarks(samples, {
          ...options,
          noiseBeginsS: begins,
          noiseStopsS: stops.timeS,
        });
  return sealed(seal, accuracy);
}

function sealed(seal: SealPoint, accuracy: number): Sought {
  if (!seal.sealed) return noSealWords[seal.reason];
  const fromGauge = expandedUncertainty({ accuracy });
  return { value: seal.aboveStationKpa * 1000, uncertainty: Math.hypot(seal.uncertaintyKpa * 1000, fromGauge) };
}

function highestGauge({ samples, range, accuracy }: Search): Sought {
  const gauges = samples.flatMap((sample) => (sample.gaugeKpa === undefined ? [] : [sample.gaugeKpa]));
  const highest = gauges.reduce((most, gauge) => Math.max(most, gauge), Number.NEGATIVE_INFINITY);
  if (!Number.isFinite(highest)) return 'The series has no gauge pressure.';
  const resolution = range === undefined ? 0 : differenceToBase(range.resolution, range.unit);
  return { value: highest * 1000, uncertainty: expandedUncertainty({ accuracy, resolution }) };
}

/** A mark is placed late, and the pressure leaps as soon as the valve shuts: so much before it is left out. */
const leapS = 2;

/**
 * How fast the pressure was raised while it was listened to, in a second. An offset of the gauge is the same at both
 * ends of a stretch and falls out: the steps of its display are what is left open.
 */
function riseRate({ state, step, samples, range }: Search): Sought {
  const stops = own(state.series, step.name)?.marks['noise-stops']?.timeS ?? Number.POSITIVE_INFINITY;
  const rise = steepestRise(samples.filter(({ timeS }) => timeS <= stops - leapS));
  if (rise === undefined) return 'The series is too short to say how fast the pressure was raised.';
  const resolution = range === undefined ? 0 : differenceToBase(range.resolution, range.unit);
  const uncertainty = (Math.SQRT2 * expandedUncertainty({ resolution })) / (rise.toS - rise.fromS);
  return { value: rise.kpaPerS * 1000, uncertainty };
}

function tracked(
  what: 'manifold-gain' | 'boost-gain' | 'worst-gap',
  { samples, stationKpa, hasManifold }: Search,
): Sought {
  if (!hasManifold && what !== 'boost-gain') {
    return 'The sensors cannot be compared: the series has no manifold pressure.';
  }
  // A gain needs its own sensor and the gauge alone; the gap needs both sensors.
  const complete = samples.flatMap(({ gaugeKpa, mapKpa, boostKpa }) => {
    const first = what === 'boost-gain' ? boostKpa : mapKpa;
    const second = what === 'manifold-gain' ? mapKpa : boostKpa;
    return gaugeKpa === undefined || first === undefined || second === undefined ? [] : [{ gaugeKpa, first, second }];
  });
  const isRamp = new Set(complete.map(({ gaugeKpa }) => gaugeKpa)).size > 2;
  if (complete.length < 3 || !isRamp) {
    return 'The sensors cannot be compared: the series has too few samples with all pressures.';
  }
  const tracking: SensorTracking = trackSensors({
    gaugeKpa: complete.map(({ gaugeKpa }) => gaugeKpa),
    firstKpa: complete.map(({ first }) => first),
    secondKpa: complete.map(({ second }) => second),
    stationKpa,
  });
  if (what === 'worst-gap') {
    return {
      value: toBase(tracking.between.worstGapKpa, 'kPa'),
      uncertainty: toBase(tracking.between.worstGapUncertaintyKpa, 'kPa'),
    };
  }
  return { value: tracking.first.gain, uncertainty: tracking.first.gainUncertainty };
}
