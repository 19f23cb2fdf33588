import { changedDocument } from '../testing/changed-document';
import { everyKind } from '../testing/every-kind';
import { action, errorsOf, insert, place, type RefusedCase } from '../testing/lint-cases';

describe('expressions and references: what publishing refuses', () => {
  test.each<RefusedCase>([
    {
      what: 'a missing way on',
      rule: 'schema',
      message: /^Step 7: `otherwise` is missing: say where it goes on\.$/,
      changes: [[place('judge'), (step) => delete step['otherwise']]],
    },
    {
      what: 'an expression that cannot be read',
      rule: 'expression',
      message: /^Step 7, branch 1: .*breaks off/,
      changes: [
        [`${place('judge')}/next/0`, (branch) => (branch['when'] = 'noiseHeard and (noiseStopped or')],
        [`${place('judge')}/next/0`, (branch) => (branch['when'] = 'highestGauge >')],
      ],
    },
    {
      what: 'a gauge pressure against an absolute one',
      rule: 'expression',
      message:
        /^Step 7, branch 1: A gauge pressure and an absolute pressure cannot be compared.*absolute\(.*It reads: `highestGauge > manifoldPressure`\.$/,
      changes: [[`${place('judge')}/next/0`, (branch) => (branch['when'] = 'highestGauge > manifoldPressure')]],
    },
    {
      what: 'a unit of another kind',
      rule: 'expression',
      message: /^Step 10, what is waited for: .*cannot be compared/,
      changes: [[place('settle'), (step) => (step['until'] = 'gaugeLeft <= 0.2 s')]],
    },
    {
      what: 'a name that nothing gives',
      rule: 'expression',
      message: /`sealPiont` is not declared/,
      changes: [[`${place('raise')}/next/0`, (branch) => (branch['when'] = 'outOfBand(sealPiont)')]],
    },
    {
      what: 'a name with two meanings',
      rule: 'names',
      message: /^Step 9, name sealHigh: `sealHigh` already stands for something else/,
      changes: [[`${place('still-quiet')}/options/0`, (option) => (option['name'] = 'sealHigh')]],
    },
    {
      what: 'a way into nothing',
      rule: 'references',
      message: /^Step 8, otherwise: leads to `stil-quiet`, and no step is called that\.$/,
      changes: [[`${place('hold')}/otherwise`, (exit) => (exit['to'] = 'stil-quiet')]],
    },
    {
      what: 'a stop into nothing',
      rule: 'references',
      message: /^The stop sheet: leads to `nowhere`/,
      changes: [['stop/exit', (exit) => (exit['to'] = 'nowhere')]],
    },
    {
      what: 'a verdict that is no finding',
      rule: 'references',
      message: /^Step 4, branch 1: heads for `settle`, and no finding is called that\.$/,
      changes: [
        [`${place('manifold')}/next/0`, (branch) => (branch['verdict'] = 'settle')],
        [place('sensorOff'), (step) => (step['verdict'] = 'Off.')],
      ],
    },
    {
      what: 'two steps of one id',
      rule: 'references',
      message: /^Two steps are called judge/,
      changes: [['steps', insert(action('judge', 'codes-before'))]],
    },
    {
      what: 'two steps of one number',
      rule: 'references',
      message: /^Two step numbers are called 7/,
      changes: [[place('hold'), (step) => (step['number'] = '7')]],
    },
    {
      what: 'gear that is not named',
      rule: 'references',
      message: /^Step 10: uses gear `spare`/,
      changes: [[`${place('settle')}/reads/0`, (read) => (read['gear'] = 'spare')]],
    },
    {
      what: 'a limit on nothing',
      rule: 'references',
      message: /^Limit ceiling: is held against `gaugeRight`/,
      changes: [['limits/0', (limit) => (limit['of'] = ['gauge', 'gaugeRight'])]],
    },
    {
      what: 'codes compared with nothing',
      rule: 'references',
      message: /^Step 12: compares with `codesEarlier`/,
      changes: [[place('codes-after'), (step) => (step['comparedWith'] = 'codesEarlier')]],
    },
    {
      what: 'new codes against nothing',
      rule: 'references',
      message: /^Step 12: `newCodes` needs `comparedWith`/,
      changes: [[place('codes-after'), (step) => delete step['comparedWith']]],
    },
    {
      what: 'a text that names nothing',
      rule: 'references',
      message: /^Step 4: the text names \{stationPresure\}/,
      changes: [[place('manifold'), (step) => (step['why'] = 'It must show {stationPresure}.')]],
    },
    {
      what: 'a text that names a truth',
      rule: 'references',
      message: /^Step 4: the text names \{stillQuiet\}/,
      changes: [[place('manifold'), (step) => (step['why'] = 'It is {stillQuiet}.')]],
    },
    {
      what: 'a reason that names nothing',
      rule: 'references',
      message: /^Step 5: the text names \{whistle\}/,
      changes: [[`${place('dipstick')}/otherwise`, (exit) => (exit['because'] = 'the {whistle} is there')]],
    },
  ])('$what', ({ rule, message, changes }) => {
    const errors = errorsOf(changedDocument(everyKind, ...changes));
    expect(errors).toContainEqual(expect.objectContaining({ rule, message: expect.stringMatching(message) }));
  });
});

it('shows the part of a long expression that is wrong', () => {
  const when = [...Array.from({ length: 9 }, () => 'highestGauge > 2 kPa'), 'whistle', 'noiseHeard'].join(' or ');
  const document = changedDocument(everyKind, [`${place('judge')}/next/0`, (branch) => (branch['when'] = when)]);
  const [{ message = '' } = {}] = errorsOf(document);
  expect(message).toMatch(
    /^Step 7, branch 1: `whistle` is not declared: .* It reads: `….* or whistle or noiseHeard`\.$/,
  );
  expect(message.length).toBeLessThan(300);
});

it('lets a text name a finding for its title, and what the visit gives', () => {
  const document = changedDocument(everyKind, [
    `${place('hold')}/otherwise`,
    (exit) => (exit['because'] = '{car} heads for {seals}'),
  ]);
  expect(errorsOf(document)).toEqual([]);
});
