import fc from 'fast-check';
import { compileEvaluation } from '../../expression/evaluate';
import type { Environment } from '../../expression/environment';
import type { Expression } from '../../expression/expression';
import { parseExpression } from '../../expression/parse';
import { DecisionCases } from './decision-cases';
import type { Beforehand } from './decision-facts';

/*
 * Decisions made at random, held against every case of a grid that has figures on, and two between, those that are
 * compared with. What the analysis calls never taken must not be taken there; of conditions that it can cut exactly,
 * what it says can be taken must be.
 */
const figuresKpa = [0.5, 0.7, 1, 1.3, 1.6, 2, 3, 4, 5, 6, 7];
const results = ['in', 'out', 'too-close', undefined] as const;

interface Case {
  readonly p: number | undefined;
  readonly q: number | undefined;
  readonly result: (typeof results)[number];
  readonly truths: ReadonlySet<string>;
}

const choices = ['first', 'second', 'third', undefined];
const grid: readonly Case[] = [undefined, ...figuresKpa].flatMap((p) =>
  figuresKpa.flatMap((q) =>
    results.flatMap((result) =>
      choices.flatMap((choice) =>
        [[], ['free']].map((free): Case => ({
          p,
          q,
          result,
          truths: new Set([...free, ...(choice === undefined ? [] : [choice])]),
        })),
      ),
    ),
  ),
);

function environmentOf({ p, q, result, truths }: Case): Environment {
  const number = (name: string): number | undefined => {
    const kpa = name === 'p' ? p : q;
    return kpa === undefined ? undefined : kpa * 1000;
  };
  return {
    number,
    truth: (name) => truths.has(name),
    result: (name) => (name === 'p' ? result : undefined),
    uncertainty: () => undefined,
    isMeasured: (name) => number(name) !== undefined,
  };
}

/** `p` may be missing, `q` was just read; one of three options is chosen or none was come to. */
const beforehand: Beforehand = {
  range: () => ({ low: 0, high: 7_500 }),
  groups: [{ names: ['first', 'second', 'third'], isOneSure: false }],
  isFresh: (name) => name === 'q',
  isNever: () => false,
};

function conditionOf(exact: boolean): fc.Arbitrary<string> {
  const sign = fc.constantFrom('<', '<=', '>', '>=', '==', '!=');
  const name = fc.constantFrom('p', 'q');
  const figure = fc.constantFrom('1 kPa', '2 kPa', '5 kPa');
  const plain = [
    fc.constantFrom('free', 'first', 'second', 'third', 'measured(p)', 'inBand(p)', 'outOfBand(p)', 'tooClose(p)'),
    fc.tuple(name, sign, figure).map((parts) => parts.join(' ')),
    fc.tuple(figure, sign, name).map((parts) => parts.join(' ')),
    fc.tuple(fc.constantFrom('p', 'q'), sign, fc.constantFrom('q', 'p')).map((parts) => parts.join(' ')),
  ];
  const sums = fc.tuple(fc.constantFrom('abs(p - q)', 'p + q', 'max(p, q)', 'p / q * 1 kPa'), sign, figure);
  const atom = fc.oneof(...plain, ...(exact ? [] : [sums.map((parts) => parts.join(' '))]));
  return fc.letrec<{ condition: string }>((tie) => ({
    condition: fc.oneof(
      { depthSize: 'small' },
      { weight: 3, arbitrary: atom },
      { weight: 1, arbitrary: tie('condition').map((of) => `not (${of})`) },
      { weight: 2, arbitrary: fc.tuple(tie('condition'), tie('condition')).map(([a, b]) => `(${a}) and (${b})`) },
      { weight: 2, arbitrary: fc.tuple(tie('condition'), tie('condition')).map(([a, b]) => `(${a}) or (${b})`) },
    ),
  })).condition;
}

function treeOf(source: string): Expression {
  const parsed = parseExpression(source);
  if (!parsed.ok) throw new Error(`${source}: ${parsed.problem.message}`);
  return parsed.expression;
}

/** Which of the conditions is the first that holds, in some case of the grid. */
function takenOnGrid(trees: readonly Expression[]): ReadonlySet<number> {
  const evaluations = trees.map((tree) => compileEvaluation(tree, 'truth'));
  return new Set(
    grid.map((one) => {
      const environment = environmentOf(one);
      return evaluations.findIndex((evaluate) => {
        const outcome = evaluate(environment);
        return outcome.ok && outcome.value === true;
      });
    }),
  );
}

it('never calls a branch untaken that some case takes', () => {
  let refused = 0;
  fc.assert(
    fc.property(fc.array(conditionOf(false), { minLength: 1, maxLength: 4 }), (sources) => {
      const trees = sources.map(treeOf);
      const cases = new DecisionCases(trees, beforehand);
      const taken = takenOnGrid(trees);
      trees.forEach((_, index) => {
        if (cases.taken(index) === 'can-be') return;
        refused += 1;
        expect([sources, index, taken.has(index)]).toEqual([sources, index, false]);
      });
    }),
    { seed: 4_810, numRuns: 200 },
  );
  expect(refused).toBeGreaterThan(30);
});

it('finds every branch that no case takes, where names are compared with figures and with each other', () => {
  let untaken = 0;
  fc.assert(
    fc.property(fc.array(conditionOf(true), { minLength: 1, maxLength: 4 }), (sources) => {
      const trees = sources.map(treeOf);
      const cases = new DecisionCases(trees, beforehand);
      const taken = takenOnGrid(trees);
      trees.forEach((_, index) => {
        if (!taken.has(index)) untaken += 1;
        expect([sources, index, cases.taken(index) === 'can-be']).toEqual([sources, index, taken.has(index)]);
      });
    }),
    { seed: 4_811, numRuns: 150 },
  );
  expect(untaken).toBeGreaterThan(30);
});
