import { changedDocument } from '../testing/changed-document';
import { everyKind } from '../testing/every-kind';
import { action, errorsOf, insert, place, type RefusedCase, type PassingCase } from '../testing/lint-cases';

describe('the ways of a run: what publishing refuses', () => {
  test.each<RefusedCase>([
    {
      what: 'no start card',
      rule: 'start',
      message: /^Step 0 is the first and no start card/,
      changes: [['steps', (list) => (list as unknown as object[]).unshift(action('zero', 'start', { number: '0' }))]],
    },
    {
      what: 'a step that no way leads to',
      rule: 'reachable',
      message: /^Step 8 is never reached: no way that a run can take leads to it/,
      changes: [[`${place('judge')}/otherwise`, (exit) => (exit['to'] = 'still-quiet')]],
    },
    {
      what: 'a finding that nothing heads for',
      rule: 'reachable',
      message: /^Step F3 is never reached: no way that a run can take names it as its verdict/,
      changes: [[`${place('manifold')}/next/0`, (branch) => (branch['verdict'] = 'notCompleted')]],
    },
    {
      what: 'a step behind a condition that never holds',
      rule: 'reachable',
      message: /^Step 13 is never reached/,
      changes: [[`${place('codes-after')}/next/0`, (branch) => (branch['when'] = 'seals and notCompleted')]],
    },
    {
      what: 'a way round without an end',
      rule: 'ends-in-a-finding',
      message: /^Step a: from here no way ends in a finding \(reached by 1, a\)/,
      changes: [
        ['steps', insert(action('a', 'b'), action('b', 'a'))],
        ['steps/0', (step) => (step['next'] = [{ when: 'cold', to: 'a', because: 'odd' }])],
      ],
    },
    {
      what: 'a verdict that no way named',
      rule: 'verdict-named',
      message: /^Step 13, otherwise: goes to the verdict, but on the way 1, 13 no finding was named/,
      changes: [['steps/0', (step) => (step['next'] = [{ when: 'cold', to: 'drive', because: 'odd' }])]],
    },
    {
      what: 'a stop that names no finding',
      rule: 'verdict-named',
      message: /^Step 12, otherwise: goes to the verdict, but on the way 1, 11, 12/,
      changes: [['stop/exit', (exit) => delete exit['verdict']]],
    },
    {
      what: 'a loop without a bound',
      rule: 'bounded-loops',
      message:
        /^Step 9, branch 1: leads back to step 6, and nothing bounds the loop 6, 7, 9, 6\. .*`atMost` and `thenceforth`/,
      changes: [[`${place('still-quiet')}/next/0`, (branch) => (branch['to'] = 'raise')]],
    },
    {
      what: 'a step that leads to itself',
      rule: 'bounded-loops',
      message: /^Step 5, branch 1: leads back to step 5, and nothing bounds the loop 5, 5/,
      changes: [
        [place('dipstick'), (step) => (step['next'] = [{ when: 'stillQuiet', to: 'dipstick', because: 'again' }])],
      ],
    },
    {
      what: 'a bound whose thenceforth leads back',
      rule: 'bounded-loops',
      message: /^Step 4, branch 2, thenceforth: leads back to step 3/,
      changes: [[`${place('manifold')}/next/1/thenceforth`, (exit) => (exit['to'] = 'air')]],
    },
    {
      what: 'a measurement that may be repeated too often',
      rule: 'bounded-loops',
      message: /^Step 4, branch 2: may be taken 4 times; a measurement is repeated at most 3 times/,
      changes: [[`${place('manifold')}/next/1`, (branch) => (branch['atMost'] = 4)]],
    },
    {
      what: 'more rounds than five',
      rule: 'bounded-loops',
      message: /^Step 9, branch 1: may be taken 6 times; at most 5 rounds are gone/,
      changes: [
        [
          `${place('still-quiet')}/next/0`,
          (branch) =>
            Object.assign(branch, { to: 'raise', atMost: 6, thenceforth: { to: 'settle', because: 'enough' } }),
        ],
      ],
    },
    {
      what: 'a way back where it cannot be measured',
      rule: 'bounded-loops',
      message: /^Step 4, cannot measure: leads back to step 3/,
      changes: [[`${place('manifold')}/cannotMeasure`, (exit) => (exit['to'] = 'air')]],
    },
  ])('$what', ({ rule, message, changes }) => {
    const errors = errorsOf(changedDocument(everyKind, ...changes));
    expect(errors).toContainEqual(expect.objectContaining({ rule, message: expect.stringMatching(message) }));
  });
});

describe('the ways of a run: what passes beside it', () => {
  test.each<PassingCase>([
    {
      what: 'a loop that one bound on it ends',
      changes: [
        [
          `${place('still-quiet')}/next/0`,
          (branch) =>
            Object.assign(branch, {
              to: 'raise',
              atMost: 5,
              thenceforth: { to: 'settle', because: 'enough', verdict: 'notCompleted' },
            }),
        ],
      ],
    },
    {
      what: 'three repeats',
      changes: [[`${place('manifold')}/next/1`, (branch) => (branch['atMost'] = 3)]],
    },
    {
      what: 'a branch that the finding decides',
      changes: [[place('restore'), (step) => (step['next'] = [{ when: 'seals', to: 'verdict', because: 'done' }])]],
    },
    {
      what: 'a step that only the cold half takes',
      changes: [
        ['steps', insert(action('extra', 'codes-before'))],
        ['steps/0', (step) => (step['next'] = [{ when: 'cold', to: 'extra', because: 'cold' }])],
      ],
    },
  ])('$what', ({ changes }) => {
    expect(errorsOf(changedDocument(everyKind, ...changes))).toEqual([]);
  });
});
