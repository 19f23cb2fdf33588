import type { CalculationName, QuestionName } from './expression';

/** How many arguments a calculation takes. */
export interface Arity {
  readonly least: number;
  readonly most: number;
  /** How it is written, for messages. */
  readonly form: string;
}

/** Every function that the language knows, and there is no other. */
export const calculations: Readonly<Record<CalculationName, Arity>> = {
  abs: { least: 1, most: 1, form: 'abs(x)' },
  min: { least: 2, most: 20, form: 'min(a, b)' },
  max: { least: 2, most: 20, form: 'max(a, b)' },
  mean: { least: 2, most: 20, form: 'mean(a, b)' },
  standardPressure: { least: 1, most: 1, form: 'standardPressure(elevation)' },
  stationPressure: { least: 2, most: 2, form: 'stationPressure(altimeterSetting, elevation)' },
  elevationOf: { least: 1, most: 1, form: 'elevationOf(pressure)' },
  speedDensityAirflow: {
    least: 5,
    most: 5,
    form: 'speedDensityAirflow(displacement, speed, manifold, intakeTemperature, efficiency)',
  },
  volumetricEfficiency: {
    least: 5,
    most: 5,
    form: 'volumetricEfficiency(displacement, speed, manifold, intakeTemperature, airflow)',
  },
  orificeMassFlow: { least: 4, most: 4, form: 'orificeMassFlow(diameter, upstream, downstream, temperature)' },
  orificeDiameter: { least: 4, most: 4, form: 'orificeDiameter(flow, upstream, downstream, temperature)' },
  decayLeakRate: {
    least: 6,
    most: 6,
    form: 'decayLeakRate(volume, start, end, startTemperature, endTemperature, time)',
  },
  absolute: { least: 1, most: 1, form: 'absolute(x)' },
  gauge: { least: 1, most: 1, form: 'gauge(x)' },
};

export const questions: readonly QuestionName[] = ['inBand', 'outOfBand', 'tooClose', 'measured', 'uncertainty'];

/** What a person may try, and what to write instead. */
export const refusedWords: Readonly<Record<string, string>> = {
  true: 'name an option or a result instead',
  false: 'name an option or a result instead',
  null: 'ask measured(name) instead',
  undefined: 'ask measured(name) instead',
  mod: 'the language has only + - * /',
  xor: 'write it with and, or, not',
  to: 'units convert by themselves',
  in: 'units convert by themselves',
  AND: 'write and',
  OR: 'write or',
  NOT: 'write not',
};

export function isCalculation(name: string): name is CalculationName {
  return Object.hasOwn(calculations, name);
}

export function isQuestion(name: string): name is QuestionName {
  return (questions as readonly string[]).includes(name);
}

/** All functions as they are written, for messages. */
export const functionForms: string = [
  ...Object.values(calculations).map(({ form }) => form),
  ...questions.map((name) => `${name}(name)`),
].join(', ');
