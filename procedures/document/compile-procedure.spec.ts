import { compileProcedure, type CompiledProcedure } from './compile-procedure';
import type { Environment } from './expression/environment';
import { changedDocument, type Part } from './testing/changed-document';
import { everyKind } from './testing/every-kind';
import { place } from './testing/lint-cases';

function compiled(): CompiledProcedure {
  const outcome = compileProcedure(everyKind);
  if (!outcome.ok) throw new Error(JSON.stringify(outcome.problems));
  return outcome.procedure;
}

const environment: Environment = {
  number: (name) => ({ stationPressure: 94_000, manifoldPressure: 93_900 })[name],
  uncertainty: (name) => ({ stationPressure: 300, manifoldPressure: 400 })[name],
  truth: (name) => name === 'noiseHeard',
  result: (name) => (name === 'manifoldPressure' ? 'in' : undefined),
  isMeasured: (name) => name === 'manifoldPressure' || name === 'stationPressure',
};

describe('a compiled procedure', () => {
  const procedure = compiled();

  it('gives its document and its steps', () => {
    expect(procedure.document).toBe(everyKind);
    expect(procedure.step('judge')).toBe(everyKind.steps.find(({ id }) => id === 'judge'));
    expect(procedure.step('constructor')).toBeUndefined();
  });

  it('gives an expression by its text, with its names and its value in base units', () => {
    const offset = procedure.expression('manifoldPressure - stationPressure');
    expect(offset.names).toEqual(['manifoldPressure', 'stationPressure']);
    expect(offset.evaluate(environment)).toEqual({ ok: true, value: -100 });
    expect(offset.expandedUncertainty(environment)).toBeCloseTo(500, 6);
    expect(procedure.expression('manifoldPressure - stationPressure')).toBe(offset);
  });

  it('gives truths, and says what is missing', () => {
    expect(procedure.expression('noiseHeard and not noiseStopped').evaluate(environment)).toEqual({
      ok: true,
      value: true,
    });
    expect(procedure.expression('outOfBand(manifoldPressure)').evaluate(environment)).toEqual({
      ok: true,
      value: false,
    });
    expect(procedure.expression('sealHigh - highestGauge').evaluate(environment)).toMatchObject({
      ok: false,
      problem: { code: 'not-measured', name: 'sealHigh' },
    });
    expect(() => procedure.expression('noiseAgain').expandedUncertainty(environment)).toThrow(RangeError);
  });

  it('refuses a text that the document does not hold', () => {
    expect(() => procedure.expression('1 kPa > 2 kPa')).toThrow(
      /expression is 1 kPa > 2 kPa; allowed: one of the document's own/,
    );
  });

  it('says what each name stands for', () => {
    expect(procedure.declared('manifoldPressure')).toEqual({
      kind: 'quantity',
      name: 'manifoldPressure',
      label: 'Manifold pressure',
      unit: 'kPa',
      sense: 'absolute',
      hasBand: true,
      step: 'manifold',
    });
    expect(procedure.declared('altimeterSetting')).toMatchObject({ kind: 'quantity', unit: 'hPa', step: 'air' });
    expect(procedure.declared('elevation')).toMatchObject({ kind: 'quantity', unit: 'm' });
    for (const name of ['cold', 'stillQuiet', 'noiseHeard', 'codesAppeared', 'idleWindow', 'seals']) {
      expect([name, procedure.declared(name)?.kind]).toEqual([name, 'truth']);
    }
    expect(procedure.declared('constructor')).toBeUndefined();
    expect(procedure.declared('ramp')).toBeUndefined();
  });
});

interface Refused {
  readonly what: string;
  readonly path: string;
  readonly change: (part: Part) => void;
  readonly problem: { readonly step?: string; readonly where: string; readonly message: RegExp };
}

describe('what does not compile', () => {
  const reading = `${place('manifold')}/reads/0`;
  test.each<Refused>([
    {
      what: 'a condition that is no truth',
      path: `${place('judge')}/next/0`,
      change: (branch) => (branch['when'] = 'highestGauge'),
      problem: { step: 'judge', where: 'branch 1', message: /gets a gauge pressure: compare it with something/ },
    },
    {
      what: 'a result that is a truth',
      path: `${place('judge')}/results/0`,
      change: (result) => (result['is'] = 'noiseHeard'),
      problem: { step: 'judge', where: 'result spare', message: /needs a quantity/ },
    },
    {
      what: 'a result of another kind',
      path: `${place('judge')}/results/0`,
      change: (result) => (result['unit'] = 'degC'),
      problem: {
        step: 'judge',
        where: 'result spare',
        message: /needs a temperature \(degC\), and gets a pressure difference/,
      },
    },
    {
      what: 'a difference that is called absolute',
      path: `${place('judge')}/results/0`,
      change: (result) => (result['sense'] = 'absolute'),
      problem: {
        step: 'judge',
        where: 'result spare',
        message: /needs an absolute pressure \(kPa\), and gets a pressure difference/,
      },
    },
    {
      what: 'a band end of the other sense',
      path: `${reading}/band`,
      change: (band) => (band['high'] = 'sealHigh'),
      problem: {
        step: 'manifold',
        where: 'upper end of the band of manifoldPressure',
        message: /needs an absolute pressure \(kPa\), and gets a gauge pressure/,
      },
    },
    {
      what: 'a band condition that is no truth',
      path: `${reading}/band`,
      change: (band) => (band['when'] = 'stationPressure'),
      problem: { step: 'manifold', where: 'condition of the band of manifoldPressure', message: /compare it/ },
    },
    {
      what: 'a way of another kind',
      path: `${place('air')}/reads/0/ways/1`,
      change: (way) => (way['is'] = 'elevation'),
      problem: {
        step: 'air',
        where: 'way elevation of stationPressure',
        message: /needs an absolute pressure \(kPa\), and gets a distance/,
      },
    },
    {
      what: 'an uncertainty that is an absolute pressure',
      path: `${place('air')}/reads/0/ways/1`,
      change: (way) => (way['uncertainty'] = 'stationPressure'),
      problem: {
        step: 'air',
        where: 'uncertainty of the way elevation of stationPressure',
        message: /needs a pressure difference/,
      },
    },
    {
      what: 'a limit over anything but the gauge',
      path: 'limits/0',
      change: (limit) => (limit['holds'] = 'gauge <= sealHigh'),
      problem: { where: 'limit ceiling', message: /`sealHigh` is not declared/ },
    },
    {
      what: 'a limit on an absolute pressure',
      path: 'limits/0',
      change: (limit) => (limit['holds'] = 'absolute(gauge) <= 134 kPa'),
      problem: { where: 'limit ceiling', message: /needs the air of the place/ },
    },
    {
      what: 'the gauge outside a limit',
      path: `${place('judge')}/next/0`,
      change: (branch) => (branch['when'] = 'gauge > 2 kPa'),
      problem: { step: 'judge', where: 'branch 1', message: /`gauge` is not declared/ },
    },
    {
      what: 'a sentence under a value',
      path: `${place('seals')}/cause/0`,
      change: (sentence) => (sentence['when'] = 'sealPoint'),
      problem: { step: 'seals', where: 'cause, sentence 1', message: /compare it/ },
    },
    {
      what: 'a question about what has no band',
      path: `${place('judge')}/next/0`,
      change: (branch) => (branch['when'] = 'inBand(highestGauge)'),
      problem: { step: 'judge', where: 'branch 1', message: /`highestGauge` has no band/ },
    },
    {
      what: 'a name that is a word of the language',
      path: `${place('still-quiet')}/options/0`,
      change: (option) => (option['name'] = 'measured'),
      problem: { step: 'still-quiet', where: 'name measured', message: /is a word of the expression language/ },
    },
    {
      what: 'a name in two units',
      path: `${place('settle')}/reads/0`,
      change: (read) => Object.assign(read, { name: 'highestGauge', unit: 'psi' }),
      problem: {
        step: 'settle',
        where: 'name highestGauge',
        message: /already stands for something else \(step raise\)/,
      },
    },
    {
      what: 'an option with the name of a finding',
      path: `${place('still-quiet')}/options/0`,
      change: (option) => (option['name'] = 'seals'),
      problem: {
        step: 'seals',
        where: 'name seals',
        message: /already stands for something else \(step still-quiet\)/,
      },
    },
  ])('$what', ({ path, change, problem }) => {
    const outcome = compileProcedure(changedDocument(everyKind, [path, change]));
    if (outcome.ok) throw new Error('it compiled');
    expect(outcome.problems).toContainEqual(
      expect.objectContaining({ ...problem, message: expect.stringMatching(problem.message) }),
    );
  });

  it('comes back all together, each with its place in the document and in the text', () => {
    const outcome = compileProcedure(
      changedDocument(
        everyKind,
        [`${place('judge')}/next/0`, (branch) => (branch['when'] = 'noiseHeard and sealPoint')],
        [`${place('judge')}/results/0`, (result) => (result['is'] = 'sealHigh - ')],
      ),
    );
    if (outcome.ok) throw new Error('it compiled');
    expect(outcome.problems).toMatchObject([
      { pointer: `/${place('judge')}/results/0/is`, at: { start: 10, end: 10 } },
      { pointer: `/${place('judge')}/next/0/when`, at: { start: 15, end: 24 } },
    ]);
  });

  it('lets one name be read at two steps, with a band at either', () => {
    const outcome = compileProcedure(
      changedDocument(
        everyKind,
        [
          `${place('settle')}/reads/0`,
          (read) => Object.assign(read, { name: 'highestGauge', band: { high: '1 kPa', source: 'invented' } }),
        ],
        [place('settle'), (step) => (step['until'] = 'inBand(highestGauge)')],
      ),
    );
    expect(outcome.ok).toBe(true);
  });
});
