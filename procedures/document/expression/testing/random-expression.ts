import { declaredKind, truth, type Kind } from '../kinds';

/** Our unit -> mathjs's. */
const written: Readonly<Record<string, string>> = {
  kPa: 'kPa',
  Pa: 'Pa',
  hPa: 'hPa',
  bar: 'bar',
  psi: 'lbf/inch^2', // mathjs's own psi is off in the 11th figure
  degC: 'degC',
  degF: 'degF',
  K: 'K',
  'L/min': 'L/minute',
  'm3/s': 'm^3/s',
  'g/s': 'g/s',
  'kg/h': 'kg/hour',
  L: 'L',
  cm3: 'cm^3',
  mm: 'mm',
  m: 'm',
  km: 'km',
  V: 'V',
  mV: 'mV',
  ohm: 'ohm',
  kohm: 'kohm',
  s: 's',
  min: 'minute',
  h: 'hour',
  'km/h': 'km/hour',
  dB: 'level',
  rpm: 'minute^-1',
};

/** A wanted kind: which units a number of it is written in, and which names have it. */
export type Want =
  | 'absolute'
  | 'gauge'
  | 'difference'
  | 'temperature'
  | 'kelvins'
  | 'plain'
  | 'flow'
  | 'mass'
  | 'volume'
  | 'time'
  | 'distance'
  | 'level'
  | 'turning'
  | 'hole';

export const unitsOf: Readonly<Record<Want, readonly string[]>> = {
  absolute: ['kPa', 'Pa', 'hPa', 'bar', 'psi'],
  gauge: ['kPa', 'psi', 'hPa'],
  difference: ['kPa', 'Pa', 'psi'],
  temperature: ['degC', 'degF'],
  kelvins: ['K'],
  plain: [''],
  flow: ['L/min', 'm3/s'],
  mass: ['g/s', 'kg/h'],
  volume: ['L', 'cm3'],
  time: ['s', 'min', 'h'],
  distance: ['m', 'km'],
  level: ['dB'],
  turning: ['rpm'],
  hole: ['mm'],
};

export const kinds: Readonly<Record<string, Kind>> = {
  absoluteA: declaredKind('kPa', 'absolute'),
  absoluteB: declaredKind('psi', 'absolute'),
  stationPressure: declaredKind('kPa', 'absolute'),
  gaugeA: declaredKind('kPa', 'gauge'),
  gaugeB: declaredKind('psi', 'gauge'),
  differenceA: declaredKind('kPa'),
  differenceB: declaredKind('Pa'),
  temperatureA: declaredKind('degC'),
  temperatureB: declaredKind('degF'),
  kelvinsA: declaredKind('K'),
  plainA: declaredKind('1'),
  plainB: declaredKind('1'),
  flowA: declaredKind('L/min'),
  massA: declaredKind('g/s'),
  volumeA: declaredKind('L'),
  timeA: declaredKind('s'),
  distanceA: declaredKind('m'),
  levelA: declaredKind('dB'),
  turningA: declaredKind('rpm'),
  holeA: declaredKind('mm'),
  truthA: truth,
  truthB: truth,
};
export const baseUnitOf: Readonly<Record<string, string>> = {
  absolute: 'Pa',
  gauge: 'Pa',
  difference: 'Pa',
  temperature: 'K',
  kelvins: 'K',
  flow: 'm^3/s',
  mass: 'kg/s',
  volume: 'm^3',
  time: 's',
  distance: 'm',
  level: 'level',
  turning: 's^-1',
  hole: 'm',
};
export const valueRange: Readonly<Record<string, readonly [number, number]>> = {
  absolute: [60_000, 140_000],
  gauge: [-2_000, 34_500],
  difference: [-5_000, 5_000],
  temperature: [250, 380],
  kelvins: [1, 40],
  flow: [0, 0.2],
  mass: [0, 0.3],
  volume: [0.001, 0.02],
  time: [1, 90],
  distance: [0, 3_000],
  level: [-80, -10],
  turning: [5, 120],
  hole: [0.0001, 0.005],
  plain: [-3, 3],
};

/** The same expression in both languages. */
export interface Pair {
  readonly ours: string;
  readonly theirs: string;
}

/** Mulberry32: a small seeded generator, so that a failure can be run again. */
export class Dice {
  constructor(private state: number) {}

  next(): number {
    this.state = (this.state + 0x6d2b79f5) | 0;
    let bits = Math.imul(this.state ^ (this.state >>> 15), 1 | this.state);
    bits = (bits + Math.imul(bits ^ (bits >>> 7), 61 | bits)) ^ bits;
    return ((bits ^ (bits >>> 14)) >>> 0) / 4_294_967_296;
  }

  pick<T>(options: readonly T[]): T {
    return options[Math.floor(this.next() * options.length)] as T;
  }

  between([low, high]: readonly [number, number]): number {
    return low + this.next() * (high - low);
  }
}

export class ExpressionAuthor {
  constructor(private readonly dice: Dice) {}

  truth(depth: number): Pair {
    const form = depth <= 0 ? 'name' : this.dice.pick(['name', 'and', 'or', 'not', 'compare', 'compare', 'compare']);
    if (form === 'name') return same(this.dice.pick(['truthA', 'truthB']));
    if (form === 'not') return wrap('not (', [this.truth(depth - 1)], ')');
    if (form === 'compare') {
      const want = this.dice.pick(Object.keys(unitsOf) as Want[]);
      const operator = this.dice.pick(['<', '<=', '>', '>=', '==', '!=']);
      return wrap('(', [this.quantity(want, depth - 1), this.quantity(want, depth - 1)], ')', ` ${operator} `);
    }
    return wrap('(', [this.truth(depth - 1), this.truth(depth - 1)], ')', ` ${form} `);
  }

  quantity(want: Want, depth: number): Pair {
    return this.dice.next() < 0.2 ? this.literal(want) : this.anchored(want, depth);
  }

  /** What has its kind by itself: `2 kPa + rise` is a difference, though `2 kPa` may be an absolute pressure. */
  private anchored(want: Want, depth: number): Pair {
    const forms = [() => this.name(want), ...(depth <= 0 ? [] : this.compounds(want, depth - 1))];
    return this.dice.pick(forms)();
  }

  private compounds(want: Want, depth: number): (() => Pair)[] {
    const of = (kind: Want): Pair => this.anchored(kind, depth);
    const any = (kind: Want): Pair => this.quantity(kind, depth);
    const many = () => wrap(`${this.dice.pick(['min', 'max', 'mean'])}(`, [of(want), any(want), any(want)], ')', ', ');
    const sums = (a: Want, b: Want, sign: string) => () =>
      wrap('(', [of(a), ['difference', 'kelvins', 'plain'].includes(b) ? any(b) : of(b)], ')', ` ${sign} `);
    const scaled = () => wrap('(', [of(want), any('plain')], ')', this.dice.pick([' * ', ' / ']));
    const abs = () => wrap('abs(', [of(want)], ')');
    const negative = () => wrap('-(', [of(want)], ')');
    switch (want) {
      case 'absolute':
        return [
          many,
          scaled,
          sums(want, 'difference', '+'),
          sums(want, 'difference', '-'),
          sums('difference', want, '+'),
          () => wrap('absolute(', [any('gauge')], ')'),
          () => wrap('standardPressure(', [any('distance')], ')'),
          () => wrap('stationPressure(', [same('1013.25 hPa'), any('distance')], ')', ', '),
        ];
      case 'gauge':
        return [
          many,
          scaled,
          abs,
          negative,
          sums(want, 'difference', '+'),
          sums(want, 'difference', '-'),
          () => wrap('gauge(', [any('absolute')], ')'),
        ];
      case 'difference':
        return [
          many,
          scaled,
          abs,
          negative,
          sums('absolute', 'absolute', '-'),
          sums('gauge', 'gauge', '-'),
          sums(want, want, '+'),
        ];
      case 'temperature':
        return [many, sums(want, 'kelvins', '+'), sums(want, 'kelvins', '-')];
      case 'kelvins':
        return [many, scaled, abs, negative, sums('temperature', 'temperature', '-'), sums(want, want, '+')];
      case 'plain':
        return [
          many,
          abs,
          negative,
          sums(want, want, '+'),
          sums(want, want, '*'),
          sums(want, want, '/'),
          sums('absolute', 'absolute', '/'),
          sums('difference', 'absolute', '/'),
          sums('time', 'time', '/'),
          sums('temperature', 'temperature', '/'),
          () => same('volumetricEfficiency(volumeA, turningA, absoluteA, temperatureA, massA)'),
        ];
      case 'flow':
        return [
          many,
          scaled,
          sums('volume', 'time', '/'),
          sums(want, want, '-'),
          () => same('decayLeakRate(volumeA, absoluteA, absoluteB, temperatureA, temperatureB, timeA)'),
        ];
      case 'mass':
        return [
          many,
          scaled,
          sums(want, want, '+'),
          () => same('speedDensityAirflow(volumeA, turningA, absoluteA, temperatureA, plainA)'),
          () => same('orificeMassFlow(holeA, absoluteA, absoluteB, temperatureB)'),
        ];
      case 'hole':
        return [many, scaled, () => same('orificeDiameter(massA, absoluteB, absoluteA, temperatureA)')];
      case 'distance':
        return [many, scaled, sums(want, want, '-'), () => same('elevationOf(absoluteA)')];
      case 'volume':
        return [many, scaled, sums('flow', 'time', '*'), sums(want, want, '+')];
      default:
        return [many, scaled, abs, negative, sums(want, want, '+'), sums(want, want, '-')];
    }
  }

  private name(want: Want): Pair {
    return same(this.dice.pick(Object.keys(kinds).filter((name) => name.startsWith(want))));
  }

  private literal(want: Want): Pair {
    const range = want === 'temperature' ? ([-30, 110] as const) : ([0.001, 250] as const);
    const figure = this.dice.between(range).toPrecision(4);
    const unit = this.dice.pick(unitsOf[want]);
    if (unit === '') return same(figure);
    const theirs = want === 'temperature' ? `onScale(${figure}, "${unit}")` : `unit("${figure} ${written[unit]}")`;
    return { ours: `${figure} ${unit}`, theirs };
  }
}

function same(text: string): Pair {
  return { ours: text, theirs: text.endsWith(' hPa') ? `unit("${text}")` : text };
}

function wrap(before: string, parts: readonly Pair[], after: string, between = ''): Pair {
  const join = (texts: readonly string[]): string => `${before}${texts.join(between)}${after}`;
  return { ours: join(parts.map(({ ours }) => ours)), theirs: join(parts.map(({ theirs }) => theirs)) };
}
