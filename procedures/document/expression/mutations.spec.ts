import fc from 'fast-check';
import type { Environment } from './environment';
import { compileEvaluation } from './evaluate';
import { expandedUncertaintyOf } from './expanded-uncertainty';
import type { Expression } from './expression';
import { inferKind } from './infer-kind';
import { namesIn, partsOf } from './names-in';
import { parseExpression } from './parse';
import { Dice, ExpressionAuthor, kinds, unitsOf, valueRange, type Want } from './testing/random-expression';

/*
 * Sound expressions, made at random and then spoiled: a slip of the finger, or something put in on purpose. Whatever
 * comes of it, reading, checking and evaluating it give a value or a problem with its place, and never throw.
 */
const putIn = [
  '.constructor',
  '["constructor"]',
  '[0]',
  '.__proto__',
  '=',
  ':=',
  ';',
  '#',
  '//',
  '/*',
  '"',
  '`',
  '${a}',
  '=>',
  '()',
  '(x) = x',
  '?',
  ':',
  '1:9',
  '^',
  '!',
  "'",
  '&&',
  '||',
  '%',
  '@',
  '$',
  '\\',
  '\n',
  '\t',
  '\u0000',
  '\u200b',
  '\u202e',
  '\u0430',
  '\uff41',
  '\u2212',
  '\u00d7',
  '\u2264',
  '\u00b1',
  '\u00b0',
  '\ud83d',
  '\u{1f600}',
  'e',
  '1e',
  '1e999',
  '..',
  'and',
  'or',
  'not',
  'mod',
  'to',
  'in',
  'true',
  'null',
  'undefined',
  'NaN',
  'Infinity',
  'i',
  'pi',
  'kPa',
  'degC',
  'm3/s',
  ',',
  '(',
  ')',
  '+',
  '-',
  '*',
  '/',
  '<',
  '<=',
  '==',
  '!=',
  ' ',
  'abs(',
  'max(',
  'eval(',
  'import(',
  'constructor(',
  'map(',
  'factorial(',
  'range(',
  'sqrt(',
];

const sound = fc.integer({ min: 1, max: 1_000_000 }).map((seed): string => {
  const dice = new Dice(seed);
  const author = new ExpressionAuthor(dice);
  const text = dice.next() < 0.5 ? author.truth(3) : author.quantity(dice.pick(Object.keys(unitsOf) as Want[]), 3);
  return text.ours;
});

type Slip = (text: string) => string;
const at = (place: number, text: string): number => Math.floor(place * (text.length + 1));
const slip: fc.Arbitrary<Slip> = fc
  .tuple(fc.double({ min: 0, max: 1, noNaN: true }), fc.constantFrom(...putIn), fc.nat(5), fc.nat(4))
  .map(([place, piece, length, kind]): Slip => {
    switch (kind) {
      case 0:
        return (text) => text.slice(0, at(place, text)) + text.slice(at(place, text) + length + 1);
      case 1:
        return (text) => text.slice(0, at(place, text)) + text.slice(at(place, text) - length);
      case 2:
        return (text) => text.slice(0, at(place, text)) + piece + text.slice(at(place, text) + length);
      case 3:
        return (text) => text.slice(0, at(place, text)) + piece + text.slice(at(place, text));
      default:
        return (text) => text.slice(at(place, text)) + text.slice(0, at(place, text));
    }
  });

const values: Readonly<Record<string, number>> = Object.fromEntries(
  Object.keys(kinds).map((name) => {
    const [low, high] = valueRange[name === 'stationPressure' ? 'absolute' : (/^[a-z]+/.exec(name)?.[0] ?? '')] ?? [
      0, 1,
    ];
    return [name, (low + high) / 2];
  }),
);
const environment: Environment = {
  number: (name) => (Object.hasOwn(values, name) ? values[name] : undefined),
  truth: (name) => name === 'truthA',
  result: () => 'in',
  uncertainty: () => 0.1,
  isMeasured: (name) => name !== 'absoluteB',
};

const nodes = ['number', 'name', 'negate', 'arithmetic', 'comparison', 'logic', 'not', 'call', 'about'];

function nodesIn(node: Expression): readonly string[] {
  return [node.node, ...partsOf(node).flatMap(nodesIn)];
}

it('reads, checks and evaluates spoiled expressions without ever throwing', () => {
  const tally = { refused: 0, unfit: 0, evaluated: 0, without: 0 };
  fc.assert(
    fc.property(sound, fc.array(slip, { minLength: 1, maxLength: 3 }), (text, slips) => {
      const source = slips.reduce((spoiled, change) => change(spoiled), text);
      const parsed = parseExpression(source);
      if (!parsed.ok) {
        tally.refused += 1;
        const { start, end, message } = parsed.problem;
        expect([source, start >= 0 && start <= end && end <= source.length]).toEqual([source, true]);
        expect(message).toMatch(/^(?=.*\s).*[.]$/su);
        return;
      }
      // What is read has the language's own signs alone, and its own forms.
      expect(source).toMatch(/^[A-Za-z0-9 \t\r\n.+\-*/(),<>=!%]*$/);
      expect(nodesIn(parsed.expression).filter((node) => !nodes.includes(node))).toEqual([]);
      const inferred = inferKind(parsed.expression, (name) => (Object.hasOwn(kinds, name) ? kinds[name] : undefined));
      if (!inferred.ok) {
        tally.unfit += 1;
        expect(inferred.problem.message).toMatch(/\s.*\.$/);
        return;
      }
      expect(namesIn(parsed.expression).filter((name) => !Object.hasOwn(kinds, name))).toEqual([]);
      const outcome = compileEvaluation(parsed.expression, inferred.kind.kind)(environment);
      if (!outcome.ok) {
        tally.without += 1;
        return;
      }
      tally.evaluated += 1;
      if (inferred.kind.kind === 'truth') expect(typeof outcome.value).toBe('boolean');
      else {
        expect([source, Number.isFinite(outcome.value)]).toEqual([source, true]);
        const uncertainty = expandedUncertaintyOf(parsed.expression)(environment);
        expect([source, uncertainty >= 0]).toEqual([source, true]);
      }
    }),
    { seed: 90_210, numRuns: 6_000 },
  );
  expect(tally.refused).toBeGreaterThan(1_000);
  expect(tally.unfit).toBeGreaterThan(100);
  expect(tally.evaluated).toBeGreaterThan(500);
  expect(tally.without).toBeGreaterThan(0);
});
