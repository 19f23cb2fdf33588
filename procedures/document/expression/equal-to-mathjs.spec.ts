import { all, create, type MathJsInstance, type Unit } from 'mathjs';
import {
  decayLeakRate,
  elevationOf,
  orificeDiameter,
  orificeMassFlow,
  speedDensityAirflow,
  standardPressure,
  stationPressure,
  toAbsolute,
  toGauge,
  volumetricEfficiency,
} from '../../calculations';
import type { Environment } from './environment';
import { compileEvaluation } from './evaluate';
import type { Expression } from './expression';
import { inferKind } from './infer-kind';
import { numberPart } from './number-part';
import { partsOf } from './names-in';
import { isPhysical } from './signatures';
import { parseExpression } from './parse';
import { baseUnitOf, Dice, ExpressionAuthor, kinds, unitsOf, valueRange, type Want } from './testing/random-expression';
import { calculations } from './vocabulary';

/*
 * The closures against mathjs's own evaluation with its own units (mathjs 15), for random expressions. Units that
 * mathjs does not have, or has with other figures than SP 811, are left out here: units.spec.ts checks those.
 */
const math = create(all ?? {}) as MathJsInstance;
math.createUnit('level');
const plainDivide = math.divide.bind(math) as (a: unknown, b: unknown) => unknown;
math.import(
  {
    // Ours has no value where mathjs goes on with an infinity.
    divide: (a: unknown, b: unknown): unknown => {
      const result = plainDivide(a, b);
      if (!Number.isFinite(inBaseUnits(result))) throw new RangeError('not finite');
      return result;
    },
  },
  { override: true },
);

function inBaseUnits(value: unknown): number {
  if (typeof value === 'number') return value;
  // `value` is mathjs's figure in SI base units, whatever the unit is shown in.
  return (value as Unit as unknown as { readonly value: number }).value;
}

const inPascal = (pascal: number): Unit => math.unit(pascal, 'Pa');

function engineAir([displacement, speed, manifold, intake]: readonly [Unit, Unit, Unit, Unit, unknown]) {
  return {
    displacementL: displacement.toNumber('L'),
    rpm: speed.toNumber('minute^-1'),
    manifoldKpa: manifold.toNumber('kPa'),
    intakeC: intake.toNumber('degC'),
  };
}

function orifice([upstream, downstream, temperature]: readonly [Unit, Unit, Unit]) {
  return {
    upstreamKpa: upstream.toNumber('kPa'),
    downstreamKpa: downstream.toNumber('kPa'),
    upstreamC: temperature.toNumber('degC'),
  };
}

function theirScope(values: Readonly<Record<string, number | boolean>>): Record<string, unknown> {
  const stationKpa = (values['stationPressure'] as number) / 1000;
  const scope: Record<string, unknown> = {
    // mathjs converts degC to K but adds and divides as if both scales began together, so it is given kelvins.
    onScale: (figure: number, scale: string) => math.unit(math.unit(figure, scale).toNumber('K'), 'K'),
    standardPressure: (elevation: Unit) => inPascal(standardPressure(elevation.toNumber('m')) * 1000),
    stationPressure: (setting: Unit, elevation: Unit) =>
      inPascal(
        stationPressure({ altimeterSettingKpa: setting.toNumber('kPa'), elevationM: elevation.toNumber('m') }) * 1000,
      ),
    elevationOf: (pressure: Unit) => math.unit(elevationOf(pressure.toNumber('kPa')), 'm'),
    speedDensityAirflow: (...engine: [Unit, Unit, Unit, Unit, number]) =>
      math.unit(speedDensityAirflow({ ...engineAir(engine), volumetricEfficiency: engine[4] }), 'g/s'),
    volumetricEfficiency: (...engine: [Unit, Unit, Unit, Unit, Unit]) =>
      volumetricEfficiency({ ...engineAir(engine), airflowGps: engine[4].toNumber('g/s') }),
    orificeMassFlow: (diameter: Unit, ...sides: [Unit, Unit, Unit]) =>
      math.unit(orificeMassFlow({ diameterMm: diameter.toNumber('mm'), ...orifice(sides) }).gps, 'g/s'),
    orificeDiameter: (flow: Unit, ...sides: [Unit, Unit, Unit]) =>
      math.unit(orificeDiameter({ flowGps: flow.toNumber('g/s'), ...orifice(sides) }), 'mm'),
    decayLeakRate: (volume: Unit, start: Unit, end: Unit, startT: Unit, endT: Unit, time: Unit) =>
      math.unit(
        decayLeakRate({
          volumeL: volume.toNumber('L'),
          startKpa: start.toNumber('kPa'),
          endKpa: end.toNumber('kPa'),
          startC: startT.toNumber('degC'),
          endC: endT.toNumber('degC'),
          seconds: time.toNumber('s'),
        }).standardCm3PerMin,
        'cm^3/minute',
      ),
    absolute: (gauge: Unit) => inPascal(toAbsolute(gauge.toNumber('kPa'), stationKpa) * 1000),
    gauge: (absolute: Unit) => inPascal(toGauge(absolute.toNumber('kPa'), stationKpa) * 1000),
  };
  for (const [name, value] of Object.entries(values)) {
    const want = /^[a-z]+/.exec(name)?.[0] ?? '';
    const unit = name === 'stationPressure' ? 'Pa' : baseUnitOf[want];
    if (name === 'stationPressure') continue;
    scope[name] = unit === undefined ? value : math.unit(value as number, unit);
  }
  return scope;
}

/** How large the figures are that went into a result: rounding is judged against that, not against what is left. */
function magnitude(node: Expression, environment: Environment): number {
  const of = (part: Expression): number => magnitude(part, environment);
  switch (node.node) {
    case 'arithmetic': {
      if (node.operator === '*') return of(node.left) * of(node.right);
      if (node.operator !== '/') return of(node.left) + of(node.right);
      const divisor = Math.abs(numberPart(node.right)(environment) ?? Number.NaN);
      return (of(node.left) / divisor) * (of(node.right) / divisor);
    }
    case 'negate':
      return of(node.of);
    case 'call':
      if (node.calls === 'standardPressure' || node.calls === 'stationPressure')
        return 2e5 + 20 * of(node.arguments.at(-1) as Expression);
      // Their arguments are names alone; the pressures of both sides may be near each other.
      if (isPhysical(node.calls)) return 1e3 * Math.abs(numberPart(node)(environment) ?? Number.NaN);
      return node.arguments.reduce(
        (sum, argument) => sum + of(argument),
        node.calls === 'absolute' || node.calls === 'gauge' ? 1e5 : 0,
      );
    default:
      return Math.abs(numberPart(node)(environment) ?? Number.NaN);
  }
}

interface Tally {
  numbers: number;
  truths: number;
  without: number;
  /** Ours is decided by the other side of `and` or `or`, where mathjs stops at the first side. */
  decided: number;
  /** How often each function was called where both gave a value. */
  readonly calls: Map<string, number>;
}

function countCalls(node: Expression, calls: Map<string, number>): void {
  if (node.node === 'call') calls.set(node.calls, (calls.get(node.calls) ?? 0) + 1);
  partsOf(node).forEach((part) => countCalls(part, calls));
}

function compareOne(seed: number, tally: Tally): void {
  const dice = new Dice(seed);
  const author = new ExpressionAuthor(dice);
  const wantsTruth = dice.next() < 0.5;
  const pair = wantsTruth ? author.truth(5) : author.quantity(dice.pick(Object.keys(unitsOf) as Want[]), 4);
  const values: Record<string, number | boolean> = {};
  for (const [name, kind] of Object.entries(kinds)) {
    const want = name === 'stationPressure' ? 'absolute' : (/^[a-z]+/.exec(name)?.[0] ?? '');
    values[name] =
      kind.kind === 'truth' ? dice.next() < 0.5 : dice.between(valueRange[want] as readonly [number, number]);
  }
  const environment: Environment = {
    number: (name) => values[name] as number,
    truth: (name) => values[name] as boolean,
    result: () => undefined,
    uncertainty: () => undefined,
    isMeasured: () => true,
  };
  const what = `seed ${seed}: ${pair.ours}`;
  if (pair.ours.length > 2000) return;
  const parsed = parseExpression(pair.ours);
  if (!parsed.ok) {
    // What is too large is refused; anything else the author of this spec must not have written.
    expect([what, parsed.problem.message]).toEqual([what, expect.stringMatching(/more than/)]);
    return;
  }
  const inferred = inferKind(parsed.expression, (name) => kinds[name]);
  if (!inferred.ok) throw new Error(`${what}: ${inferred.problem.message}`);
  const ours = compileEvaluation(parsed.expression, inferred.kind.kind)(environment);
  const theirs = outcomeOf(pair.theirs, theirScope(values));
  if (!ours.ok) {
    tally.without += 1;
    expect([what, theirs]).toEqual([what, expect.stringMatching(/no value/)]);
  } else if (typeof ours.value === 'boolean' && typeof theirs === 'string') {
    tally.decided += 1;
    expect([what, pair.ours]).toEqual([what, expect.stringMatching(/ and | or /)]);
  } else if (typeof ours.value === 'boolean') {
    tally.truths += 1;
    expect([what, theirs]).toEqual([what, ours.value]);
  } else {
    tally.numbers += 1;
    countCalls(parsed.expression, tally.calls);
    if (typeof theirs !== 'number') throw new Error(`${what}: they give ${String(theirs)}, we ${ours.value}`);
    const scale = magnitude(parsed.expression, environment);
    expect([what, Math.abs(ours.value - theirs) <= 1e-11 * scale]).toEqual([what, true]);
  }
}

/** What mathjs gives: a truth, a number in SI base units, or `no value`. */
function outcomeOf(text: string, scope: Record<string, unknown>): unknown {
  try {
    const value: unknown = math.evaluate(text, scope);
    if (typeof value === 'boolean') return value;
    const number = inBaseUnits(value);
    return Number.isFinite(number) ? number : 'no value: not finite';
  } catch (error) {
    if (error instanceof RangeError) return `no value: ${error.message}`;
    throw error;
  }
}

it('gives what mathjs gives, over 6,000 random expressions', () => {
  const tally: Tally = { numbers: 0, truths: 0, without: 0, decided: 0, calls: new Map() };
  for (let seed = 1; seed <= 6_000; seed += 1) compareOne(seed, tally);
  expect(tally.numbers).toBeGreaterThan(2_000);
  expect(tally.truths).toBeGreaterThan(2_000);
  expect(tally.without).toBeGreaterThan(0);
  expect(tally.decided).toBeLessThan(tally.without);
  for (const name of Object.keys(calculations)) {
    expect([name, (tally.calls.get(name) ?? 0) >= 20]).toEqual([name, true]);
  }
});
