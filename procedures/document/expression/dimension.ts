import type { UnitKind } from '../../calculations/for-a-run';

/**
 * Exponents of kilogram, metre, second, kelvin, ampere and decibel: what a value measures, whatever its unit is. The
 * decibel stands for itself: levels are compared and subtracted, never mixed with a plain number.
 */
export type Dimension = readonly [
  mass: number,
  length: number,
  time: number,
  temperature: number,
  current: number,
  level: number,
];

const dimensions: Readonly<Record<UnitKind, Dimension>> = {
  ratio: [0, 0, 0, 0, 0, 0],
  pressure: [1, -1, -2, 0, 0, 0],
  temperature: [0, 0, 0, 1, 0, 0],
  volumeFlow: [0, 3, -1, 0, 0, 0],
  massFlow: [1, 0, -1, 0, 0, 0],
  volume: [0, 3, 0, 0, 0, 0],
  distance: [0, 1, 0, 0, 0, 0],
  torque: [1, 2, -2, 0, 0, 0],
  voltage: [1, 2, -3, 0, -1, 0],
  resistance: [1, 2, -3, 0, -2, 0],
  time: [0, 0, 1, 0, 0, 0],
  speed: [0, 1, -1, 0, 0, 0],
  frequency: [0, 0, -1, 0, 0, 0],
  soundLevel: [0, 0, 0, 0, 0, 1],
};

const words: Readonly<Record<UnitKind, string>> = {
  ratio: 'a plain number',
  pressure: 'a pressure',
  temperature: 'a temperature',
  volumeFlow: 'a volume flow',
  massFlow: 'a mass flow',
  volume: 'a volume',
  distance: 'a distance',
  torque: 'a torque',
  voltage: 'a voltage',
  resistance: 'a resistance',
  time: 'a time',
  speed: 'a speed',
  frequency: 'a number of turns in a time',
  soundLevel: 'a sound level',
};

/** What the units of a kind measure. */
export function dimensionOf(kind: UnitKind): Dimension {
  return dimensions[kind];
}

export function isSameDimension(a: Dimension, b: Dimension): boolean {
  return a.every((exponent, index) => exponent === b[index]);
}

/** The dimension of a product (`sign` 1) or a quotient (`sign` -1). */
export function combineDimensions(a: Dimension, b: Dimension, sign: 1 | -1): Dimension {
  return [
    a[0] + sign * b[0],
    a[1] + sign * b[1],
    a[2] + sign * b[2],
    a[3] + sign * b[3],
    a[4] + sign * b[4],
    a[5] + sign * b[5],
  ];
}

/** The kind of unit that measures this; undefined for a product that has no unit of its own here. */
export function unitKindOf(dimension: Dimension): UnitKind | undefined {
  return kinds.find((kind) => isSameDimension(dimensions[kind], dimension));
}

const kinds = Object.keys(dimensions) as readonly UnitKind[];
const baseUnits = ['kg', 'm', 's', 'K', 'A', 'dB'] as const;

/** `a pressure`, or for a product without a name `something in kg m2 s-1`. */
export function dimensionInWords(dimension: Dimension): string {
  const kind = unitKindOf(dimension);
  if (kind !== undefined) return words[kind];
  const factors = dimension.flatMap((exponent, index) => {
    if (exponent === 0) return [];
    return [exponent === 1 ? (baseUnits[index] ?? '') : `${baseUnits[index]}${exponent}`];
  });
  return `something in ${factors.join(' ')}`;
}
