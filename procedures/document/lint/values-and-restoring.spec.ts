import { changedDocument } from '../testing/changed-document';
import { everyKind } from '../testing/every-kind';
import { errorsOf, place, type RefusedCase, type PassingCase } from '../testing/lint-cases';

describe('values before their use, and parts put back: what publishing refuses', () => {
  test.each<RefusedCase>([
    {
      what: 'a value used before it is there',
      rule: 'value-before-use',
      message: /^Step 4, branch 1: uses `highestGauge`, which has no value yet on the way 1, 2, 3, 4\./,
      changes: [[`${place('manifold')}/next/0`, (branch) => (branch['when'] = 'highestGauge > 2 kPa')]],
    },
    {
      what: 'a value that one of two ways skips',
      rule: 'value-before-use',
      message: /^Step 7, result spare: uses `highestGauge`, which has no value yet on the way 1, 7\./,
      changes: [
        ['steps/0', (step) => (step['next'] = [{ when: 'cold', to: 'judge', because: 'odd', verdict: 'seals' }])],
      ],
    },
    {
      what: 'a band whose end comes later',
      rule: 'value-before-use',
      message: /^Step 4, upper end of the band of manifoldPressure: uses `leftAbsolute`/,
      changes: [
        [`${place('manifold')}/reads/0/band`, (band) => (band['high'] = 'leftAbsolute')],
        [
          place('settle'),
          (step) =>
            (step['results'] = [
              { name: 'leftAbsolute', label: 'Left', unit: 'kPa', sense: 'absolute', is: 'absolute(gaugeLeft)' },
            ]),
        ],
      ],
    },
    {
      what: 'a reason that needs a later value',
      rule: 'value-before-use',
      message: /^Step 3, the reason of otherwise: uses `manifoldPressure`/,
      changes: [[`${place('air')}/otherwise`, (exit) => (exit['because'] = '{manifoldPressure} is read next')]],
    },
    {
      what: 'a verdict that needs a value that a way skips',
      rule: 'value-before-use',
      message: /^Step F4, the verdict: uses `sealPoint`, which has no value yet on the way 1, 2, 3, F4/,
      changes: [[place('notCompleted'), (step) => (step['verdict'] = 'Left off at {sealPoint}.')]],
    },
    {
      what: 'a part that is never put back',
      rule: 'restored',
      message: /^Step 5: the dipstick is disturbed and on the way 1, 2, 3, 4, 5, 6, 10, 12, F4 never put back/,
      changes: [[`${place('settle')}/otherwise`, (exit) => (exit['to'] = 'codes-after')]],
    },
    {
      what: 'a part that a stop never puts back',
      rule: 'restored',
      message: /^Step 5: the dipstick is disturbed and on the way 1, 2, 3, 4, 5, 12, F4 never put back/,
      changes: [['stop/exit', (exit) => (exit['to'] = 'codes-after')]],
    },
    {
      what: 'a part that is disturbed after the restore step',
      rule: 'restored',
      message: /^Step 13: the plug is disturbed/,
      changes: [
        [place('drive'), (step) => (step['disturbs'] = [{ item: 'plug', label: 'plug', restore: 'Take it out.' }])],
      ],
    },
  ])('$what', ({ rule, message, changes }) => {
    const errors = errorsOf(changedDocument(everyKind, ...changes));
    expect(errors).toContainEqual(expect.objectContaining({ rule, message: expect.stringMatching(message) }));
  });
});

describe('values before their use, and parts put back: what passes beside it', () => {
  test.each<PassingCase>([
    {
      what: 'a value that is asked for first',
      changes: [
        [
          `${place('manifold')}/next/0`,
          (branch) => Object.assign(branch, { when: 'measured(highestGauge) and highestGauge > 2 kPa', to: 'restore' }),
        ],
        [`${place('manifold')}/cannotMeasure`, (exit) => (exit['to'] = 'restore')],
        [
          place('raise'),
          (step) =>
            (step['next'] = [
              {
                when: 'noiseHeard',
                to: 'manifold',
                because: 'again',
                atMost: 1,
                thenceforth: { to: 'judge', because: 'enough', verdict: 'doesNotSeal' },
              },
            ]),
        ],
      ],
    },
    {
      what: 'a value behind a truth that comes after it',
      changes: [
        [
          place('dipstick'),
          (step) =>
            (step['next'] = [{ when: 'noiseHeard', to: 'judge', because: 'it was raised before', verdict: 'seals' }]),
        ],
        [
          place('judge'),
          (step) =>
            (step['next'] = [
              {
                when: 'noiseAgain',
                to: 'dipstick',
                because: 'again',
                atMost: 1,
                thenceforth: { to: 'settle', because: 'enough' },
              },
              ...(step['next'] as unknown as object[]),
            ]),
        ],
      ],
    },
    {
      what: 'a restore step on every way',
      changes: [
        [place('hold'), (step) => (step['disturbs'] = [{ item: 'plug', label: 'plug', restore: 'Take it out.' }])],
      ],
    },
  ])('$what', ({ changes }) => {
    expect(errorsOf(changedDocument(everyKind, ...changes))).toEqual([]);
  });
});
