import { changedDocument } from '../testing/changed-document';
import { everyKind } from '../testing/every-kind';
import { errorsOf, place, type PassingCase, type RefusedCase } from '../testing/lint-cases';
import { decimalsIn, decimalsOfStep, pressuresIn } from './figures-in-text';

describe('limits, their gear and their words: what publishing refuses', () => {
  test.each<RefusedCase>([
    {
      what: 'a band with more digits than the gear shows',
      rule: 'limit-and-gear',
      message:
        /^Step 6, the low end of the band of sealPoint: 1\.55 kPa has more digits than Test gauge shows, steps of 0\.1 kPa\. Round it to 1 decimals/,
      changes: [[`${place('raise')}/finds/0/band`, (band) => (band['low'] = '1.55 kPa')]],
    },
    {
      what: 'a nought that the gear does not show',
      rule: 'limit-and-gear',
      message: /^Step 6, the low end of the band of sealPoint: 1\.50 kPa has more digits/,
      changes: [[`${place('raise')}/finds/0/band`, (band) => (band['low'] = '1.50 kPa')]],
    },
    {
      what: 'an input with more digits than the gear shows',
      rule: 'limit-and-gear',
      message: /^Step 6, the high end of the band of sealPoint: 5\.25 kPa has more digits/,
      changes: [['inputs/1', (input) => (input['default'] = '5.25')]],
    },
    {
      what: 'a condition with more digits than the gear shows',
      rule: 'limit-and-gear',
      message: /^Step 10, what is waited for: the figure for gaugeLeft: 0\.25 kPa has more digits/,
      changes: [[place('settle'), (step) => (step['until'] = 'gaugeLeft <= 0.25 kPa')]],
    },
    {
      what: 'a band beyond what the gear shows',
      rule: 'limit-and-gear',
      message:
        /^Step 6, the low end of the band of sealPoint: 1\.5 kPa lies outside of what Test gauge shows, 2 to 60 kPa\. Name gear that reaches it\.$/,
      changes: [['gear/0/shows', (shows) => (shows['low'] = 2)]],
    },
    {
      what: 'a ceiling beyond what the gear shows',
      rule: 'limit-and-gear',
      message: /^Limit ceiling: 34\.5 kPa lies outside of what Test gauge shows, 0 to 30 kPa/,
      changes: [['gear/0/shows', (shows) => (shows['high'] = 30)]],
    },
    {
      what: 'a ceiling beyond what an absolute sensor shows',
      rule: 'limit-and-gear',
      // 34.5 + 101.325 = 135.825 kPa, the standard air at sea level (ISO 2533:1975).
      message:
        /^Limit ceiling: 136 kPa, the air at sea level with it, lies outside of what Scan tool shows, 0 to 120 kPa/,
      changes: [
        [`${place('raise')}/channels/1`, (channel) => (channel['gear'] = 'scanTool')],
        ['gear/1/shows', (shows) => (shows['high'] = 120)],
      ],
    },
    {
      what: 'a ceiling with more digits than the gear shows',
      rule: 'limit-and-gear',
      message: /^Limit ceiling: 34\.47 kPa has more digits than Test gauge shows/,
      changes: [
        ['limits/0', (limit) => (limit['holds'] = 'gauge <= 34.47 kPa')],
        ['limits/0', (limit) => (limit['says'] = 'More than 34.47 kPa.')],
      ],
    },
    {
      what: 'a limit that says another figure than it holds',
      rule: 'limit-in-words',
      message: /^Limit ceiling: says 34\.5 kPa, and holds gauge <= 500 kPa\. Let both be the same figure\.$/,
      changes: [['limits/0', (limit) => (limit['holds'] = 'gauge <= 500 kPa')]],
    },
    {
      what: 'an action that asks for more than the limit',
      rule: 'limit-in-words',
      message: /^Step 6: "60 kPa" in `action` is more than the limit ceiling allows, 34\.5 kPa gauge/,
      changes: [[place('raise'), (step) => (step['action'] = 'Raise the pressure to 60 kPa.')]],
    },
    {
      what: 'an action that asks for more in another unit',
      rule: 'limit-in-words',
      message: /^Step 6: "0\.4 bar" in `action` is more than the limit ceiling allows, 0\.345 bar gauge/,
      changes: [[place('raise'), (step) => (step['action'] = 'Raise the pressure to 0.4 bar.')]],
    },
    {
      what: 'a caution that names a higher ceiling',
      rule: 'limit-in-words',
      message: /^Step 4: "50 kPa" in `text` is more than the limit/,
      changes: [[`${place('manifold')}/cautions/1`, (part) => (part['text'] = 'The ceiling of the hose is 50 kPa.')]],
    },
    {
      what: 'what is done beyond the limit, at more than the limit',
      rule: 'limit-in-words',
      message: /^Limit ceiling: "40 kPa" in `then` is more than the limit/,
      changes: [['limits/0', (limit) => (limit['then'] = 'Lower it to 40 kPa.')]],
    },
  ])('$what', ({ rule, message, changes }) => {
    const errors = errorsOf(changedDocument(everyKind, ...changes));
    expect(errors).toContainEqual(expect.objectContaining({ rule, message: expect.stringMatching(message) }));
  });
});

describe('limits, their gear and their words: what passes beside it', () => {
  test.each<PassingCase>([
    {
      what: 'as many digits as the gear shows',
      changes: [
        [`${place('raise')}/finds/0/band`, (band) => (band['low'] = '1.5 kPa')],
        ['inputs/1', (input) => (input['default'] = '5')],
      ],
    },
    {
      what: 'steps of 0.2 for one decimal',
      changes: [
        ['gear/0/shows', (shows) => (shows['resolution'] = 0.2)],
        [`${place('raise')}/finds/0/band`, (band) => (band['low'] = '1.5 kPa')],
      ],
    },
    { what: 'the end of what the gear shows', changes: [['gear/0/shows', (shows) => (shows['high'] = 34.5)]] },
    {
      what: 'the limit in another unit, rounded',
      changes: [['limits/0', (limit) => (limit['says'] = 'More than 5.0 psi gauge.')]],
    },
    {
      what: 'a limit without a figure in its words',
      changes: [['limits/0', (limit) => (limit['says'] = 'Too much.')]],
    },
    {
      what: 'the limit itself in an action',
      changes: [[place('raise'), (step) => (step['action'] = 'Raise the pressure towards 34.5 kPa.')]],
    },
    {
      what: 'an absolute pressure above it',
      changes: [[place('manifold'), (step) => (step['action'] = 'Read at most 101 kPa absolute.')]],
    },
    {
      what: 'a higher figure that asks for nothing',
      changes: [[place('manifold'), (step) => (step['why'] = 'Under boost it sees 90 kPa more.')]],
    },
  ])('$what', ({ changes }) => {
    expect(errorsOf(changedDocument(everyKind, ...changes))).toEqual([]);
  });
});

describe('figures in a text', () => {
  it('are read with their units', () => {
    const said = (text: string): readonly [string, number][] =>
      pressuresIn(text).map(({ text: of, value }) => [of, value]);
    expect(said('From 1.5 kPa to 5kPa, 34.5 kPa at most; 10 psi.')).toEqual([
      ['1.5 kPa', 1_500],
      ['5kPa', 5_000],
      ['34.5 kPa', 34_500],
      // NIST SP 811 (2008), B.8: 1 psi = 6.894 757 E+03 Pa.
      ['10 psi', expect.closeTo(68_947.57, 2)],
    ]);
    expect(said('Step 11, 30 s, 85 degC, 2 barrels, v1.5kPa, 3 Pascal')).toEqual([]);
  });

  it('have their digits counted', () => {
    expect([decimalsIn('1.50 kPa'), decimalsIn('12'), decimalsIn('0.125')]).toEqual([2, 0, 3]);
    expect([5, 1, 0.5, 0.2, 0.25, 0.1, 0.001].map(decimalsOfStep)).toEqual([0, 0, 1, 1, 2, 1, 3]);
  });
});
