import { medianInPlace } from './median';

/** One moment of a pressure ramp; what was not recorded at that moment is left out. */
export interface RampSample {
  /** Seconds from any zero; never less than the sample before. */
  readonly timeS: number;
  /** Test gauge, kPa above the station pressure. */
  readonly gaugeKpa?: number | undefined;
  /** Manifold pressure sensor, kPa absolute. */
  readonly mapKpa: number;
  /** Boost pressure sensor, kPa absolute. */
  readonly boostKpa?: number | undefined;
  /** Sound level at the stethoscope, dB from any zero. */
  readonly soundDb?: number | undefined;
}

/** One column of a ramp: values with the times at which there was one. */
export interface Series {
  readonly timeS: Float64Array;
  readonly value: Float64Array;
}

/** A ramp taken apart into the columns that the analysis reads. */
export interface RampSeries {
  readonly sound: Series;
  /** The gauge where at least half of the samples carry one, else the manifold pressure. */
  readonly pressure: Series;
  readonly isGauge: boolean;
  /** How many samples at most stand behind one value; above 1 for a ramp of very many samples. */
  readonly blockSize: number;
}

/** Up to so many samples each one counts by itself. */
const wholeSamples = 20_000;
/** Beyond that neighbours are averaged, over no more than this. */
const longestBlockS = 0.5;

function refuseReading(name: string, index: number, value: number): never {
  throw new RangeError(`${name} of sample ${index} is ${value}; allowed: a finite number`);
}

function refuseTime(index: number, timeS: number, beforeS: number): never {
  const allowed = Number.isFinite(timeS) ? `${beforeS} or more` : 'a finite number';
  throw new RangeError(`timeS of sample ${index} is ${timeS}; allowed: ${allowed}`);
}

/** A series that grows, of averages over blocks of samples. */
class BlockSeries {
  private timeS = new Float64Array(1024);
  private value = new Float64Array(1024);
  private length = 0;
  private count = 0;
  private startS = 0;
  private times = 0;
  private sum = 0;

  constructor(private readonly blockSize: number) {}

  add(timeS: number, value: number): void {
    if (this.count > 0 && (this.count >= this.blockSize || timeS - this.startS > longestBlockS)) this.close();
    if (this.count === 0) this.startS = timeS;
    this.times += timeS - this.startS;
    this.sum += value;
    this.count++;
  }

  finish(): Series {
    this.close();
    return { timeS: this.timeS.subarray(0, this.length), value: this.value.subarray(0, this.length) };
  }

  private close(): void {
    if (this.count === 0) return;
    if (this.length === this.value.length) {
      this.timeS = doubled(this.timeS);
      this.value = doubled(this.value);
    }
    this.timeS[this.length] = this.startS + this.times / this.count;
    this.value[this.length++] = this.sum / this.count;
    this.count = this.times = this.sum = 0;
  }
}

function doubled(values: Float64Array): Float64Array<ArrayBuffer> {
  const longer = new Float64Array(2 * values.length);
  longer.set(values);
  return longer;
}

/**
 * Takes the samples apart in one pass, averaging neighbours where there are very many.
 *
 * Throws RangeError on a time that is not finite or runs backwards, and on a reading that is not finite.
 */
export function rampSeries(samples: readonly RampSample[]): RampSeries {
  const blockSize = Math.ceil(samples.length / wholeSamples);
  const [sounds, gauges, maps] = [new BlockSeries(blockSize), new BlockSeries(blockSize), new BlockSeries(blockSize)];
  let withGauge = 0;
  let last = -Infinity;
  let index = 0;
  for (const { timeS, gaugeKpa, mapKpa, soundDb } of samples) {
    if (!(timeS >= last && timeS < Infinity)) refuseTime(index, timeS, last);
    last = timeS;
    if (!Number.isFinite(mapKpa)) refuseReading('mapKpa', index, mapKpa);
    maps.add(timeS, mapKpa);
    if (gaugeKpa !== undefined) {
      if (!Number.isFinite(gaugeKpa)) refuseReading('gaugeKpa', index, gaugeKpa);
      gauges.add(timeS, gaugeKpa);
      withGauge++;
    }
    if (soundDb !== undefined) {
      if (!Number.isFinite(soundDb)) refuseReading('soundDb', index, soundDb);
      sounds.add(timeS, soundDb);
    }
    index++;
  }
  const isGauge = withGauge > 0 && withGauge * 2 >= samples.length;
  return { sound: sounds.finish(), pressure: (isGauge ? gauges : maps).finish(), isGauge, blockSize };
}

/** The samples from `fromS` to before `toS`. Logarithmic time, and that of the copy. */
export function samplesBetween(samples: readonly RampSample[], fromS: number, toS: number): readonly RampSample[] {
  const timeAt = (index: number): number => samples[index]?.timeS ?? NaN;
  return samples.slice(lowerBound(samples.length, timeAt, fromS), lowerBound(samples.length, timeAt, toS));
}

function lowerBound(length: number, timeAt: (index: number) => number, timeS: number): number {
  let low = 0;
  let high = length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (timeAt(middle) < timeS) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** The index of the first time that is not below `timeS`; the length when there is none. Logarithmic time. */
export function indexAt(times: Float64Array, timeS: number): number {
  return lowerBound(times.length, (index) => times[index] ?? NaN, timeS);
}

/** Steps between neighbours that are smaller than this are rounding, not a display's step. */
const smallestStepKpa = 1e-6;

/** So many steps show a display's step if it has one. */
const enoughSteps = 2000;

/** The smallest step between neighbouring readings, which is a display's resolution; 0 when nothing ever changes. */
export function smallestStep(samples: readonly RampSample[], name: 'gaugeKpa' | 'mapKpa'): number {
  let smallest = Infinity;
  let before: number | undefined;
  let steps = 0;
  for (const { [name]: value } of samples) {
    if (value === undefined) continue;
    const step = before === undefined ? 0 : Math.abs(value - before);
    before = value;
    if (!(step > smallestStepKpa)) continue;
    if (step < smallest) smallest = step;
    if (++steps === enoughSteps) break;
  }
  return Number.isFinite(smallest) ? smallest : 0;
}

/** A median of absolute values of a normal scatter is this much of its standard deviation. */
const medianOfNormal = 0.6745;

/**
 * The standard deviation of values[from..to) about a slowly moving level, from the steps between neighbours: neither a
 * slope nor a single clank moves it. 0 for fewer than 3 values.
 */
export function scatterOf(values: Float64Array, from: number, to: number): number {
  if (to - from < 3) return 0;
  const steps = new Float64Array(to - from - 1);
  for (let index = from + 1; index < to; index++)
    steps[index - from - 1] = Math.abs((values[index] ?? NaN) - (values[index - 1] ?? NaN));
  return medianInPlace(steps) / (medianOfNormal * Math.SQRT2);
}
