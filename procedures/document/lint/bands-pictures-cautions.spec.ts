import { lintProcedure } from '../lint';
import type { ProcedureDocument } from '../procedure-document';
import { changedDocument } from '../testing/changed-document';
import { everyKind } from '../testing/every-kind';
import { errorsOf, place, type RefusedCase, type PassingCase } from '../testing/lint-cases';

describe('bands, pictures, conditions and cautions: what publishing refuses', () => {
  test.each<RefusedCase>([
    {
      what: 'a band beyond a limit',
      rule: 'limit-and-band',
      message:
        /^Step 10: the high end of the band of gaugeLeft is 40 kPa, beyond the limit ceiling \(gauge <= 34\.5 kPa\)/,
      changes: [[`${place('settle')}/reads/0`, (read) => (read['band'] = { high: '40 kPa', source: 'invented' })]],
    },
    {
      what: 'an absolute band beyond a limit',
      rule: 'limit-and-band',
      message: /^Step 4: the high end of the band of manifoldPressure is 36 kPa above the air of the place, beyond/,
      changes: [
        [`${place('manifold')}/reads/0/band`, (band) => (band['high'] = 'stationPressure + 36 kPa')],
        ['limits/0', (limit) => (limit['of'] = ['manifoldPressure'])],
      ],
    },
    {
      what: 'a ramp beyond a limit',
      rule: 'limit-and-band',
      message: /^Step 6: raises to 35 kPa, beyond the limit ceiling/,
      changes: [[place('raise'), (step) => (step['target'] = 35)]],
    },
    {
      what: 'a picture that is not listed',
      rule: 'picture-parts',
      message: /^Step 4: shows other-sheet, which `pictures` does not name/,
      changes: [[`${place('manifold')}/picture`, (picture) => (picture['sheet'] = 'other-sheet')]],
    },
    {
      what: 'and mixed with or',
      rule: 'one-connective',
      message: /^Step 7, branch 1: mixes and with or/,
      changes: [
        [`${place('judge')}/next/0`, (branch) => (branch['when'] = 'noiseHeard and not (noiseStopped or stillQuiet)')],
      ],
    },
    {
      what: 'two warnings on a step',
      rule: 'cautions',
      message: /^Step 4: has 2 warnings; at most one of each/,
      changes: [[`${place('manifold')}/cautions/1`, (caution) => (caution['word'] = 'warning')]],
    },
    {
      what: 'two cautions on a step',
      rule: 'cautions',
      message: /^Step 4: has 2 cautions/,
      changes: [[`${place('manifold')}/cautions/2`, (caution) => (caution['word'] = 'caution')]],
    },
  ])('$what', ({ rule, message, changes }) => {
    const errors = errorsOf(changedDocument(everyKind, ...changes));
    expect(errors).toContainEqual(expect.objectContaining({ rule, message: expect.stringMatching(message) }));
  });
});

describe('bands, pictures, conditions and cautions: what passes beside it', () => {
  test.each<PassingCase>([
    {
      what: 'a warning, a caution and any notices',
      changes: [
        [
          `${place('manifold')}/cautions`,
          (list) => (list as unknown as object[]).push({ word: 'notice', text: 'And one more.' }),
        ],
      ],
    },
    {
      what: 'or beside or',
      changes: [[`${place('judge')}/next/0`, (branch) => (branch['when'] = 'noiseHeard or noiseAgain or stillQuiet')]],
    },
    {
      what: 'a band that reaches to the limit itself',
      changes: [[`${place('settle')}/reads/0`, (read) => (read['band'] = { high: '34.5 kPa', source: 'invented' })]],
    },
    { what: 'a ramp up to the limit', changes: [[place('raise'), (step) => (step['target'] = 34.5)]] },
  ])('$what', ({ changes }) => {
    expect(errorsOf(changedDocument(everyKind, ...changes))).toEqual([]);
  });
});

describe('pictures against the drawings', () => {
  it('pass where the drawing has every part that is marked', () => {
    expect(errorsOf(everyKind, { parts: { 'air-path': ['manifold-sensor', 'dipstick'] } })).toEqual([]);
  });

  it('are refused where it has not, and where there is no drawing', () => {
    expect(errorsOf(everyKind, { parts: { 'air-path': ['dipstick'] } })).toEqual([
      expect.objectContaining({
        rule: 'picture-parts',
        message: expect.stringMatching(
          /^Step 4: marks manifold-sensor, which air-path does not have\. It has: dipstick\.$/,
        ),
      }),
    ]);
    expect(errorsOf(everyKind, { parts: { engine: [] } })).toContainEqual(
      expect.objectContaining({ message: 'The picture air-path is not drawn. Drawn are: engine.' }),
    );
  });
});

describe('a band and the gear that shows it', () => {
  const withSteps = (resolution: number): ProcedureDocument =>
    changedDocument(everyKind, ['gear/1/shows', (shows) => (shows['resolution'] = resolution)]);

  it('gives the arithmetic where too little is left', () => {
    // Steps of 4 kPa: U = 2 * 4 / (2 sqrt 3) = 2.31 kPa (JCGM 100, F.2.2.1), so 2 U = 4.62 kPa of 4 kPa.
    const [warning] = lintProcedure(withSteps(4)).warnings;
    expect(warning).toEqual({
      rule: 'band-and-gear',
      step: 'manifold',
      pointer: `/${place('manifold')}/reads/0/band`,
      message:
        'Step 4: the band of manifoldPressure is 4 kPa wide, and Scan tool shows steps of 4 kPa, so U is at least 2.31 kPa; with 4.62 kPa (2 U) too close to call, nothing can ever be called in band. Name finer gear or a wider band.',
    });
  });

  it('warns from the point where less than half of the band is left', () => {
    // Half of 4 kPa is left at 2 U = 2 kPa, that is at steps of 1.73 kPa.
    expect(lintProcedure(withSteps(1.7)).warnings).toEqual([]);
    expect(lintProcedure(withSteps(1.8)).warnings[0]?.message).toMatch(/only 1\.92 kPa of it can be called in band/);
    expect(lintProcedure(withSteps(1.8)).errors).toEqual([]);
  });

  it('counts in the unit of the quantity', () => {
    const inPsi = changedDocument(everyKind, [
      'gear/0/shows',
      (shows) => Object.assign(shows, { unit: 'psi', resolution: 0.5 }),
    ]);
    // 1.5 to 5 kPa is 3.5 kPa wide; 0.5 psi is 3.45 kPa (NIST SP 811), so 2 U is 3.98 kPa.
    expect(lintProcedure(inPsi).warnings).toEqual([
      expect.objectContaining({
        step: 'raise',
        message: expect.stringMatching(/steps of 3\.45 kPa.*3\.98 kPa \(2 U\)/),
      }),
    ]);
  });
});
