import fc from 'fast-check';
import { inferKind } from '../../../procedures/document/expression/infer-kind';
import { parseExpression } from '../../../procedures/document/expression/parse';

/** Of the processor, generous for a slow machine; the texts are up to 1 MB. `hostile-work.spec.ts` counts the work. */
const boundMs = 500;

function processorMs(): number {
  const { user, system } = process.cpuUsage();
  return (user + system) / 1_000;
}

function refusal(source: string): string {
  const begin = processorMs();
  const parsed = parseExpression(source);
  expect(processorMs() - begin).toBeLessThan(boundMs);
  if (parsed.ok) throw new Error(`accepted: ${source.slice(0, 80)}`);
  return parsed.problem.message;
}

describe('hostile text is refused in bounded time', () => {
  test.each([
    'a.constructor',
    'constructor("return 1")()',
    'cos.constructor("return this")()',
    'a["constructor"]',
    'a[1]',
    '[1, 2, 3]',
    '{a: 1}',
    '{}.toString()',
    'f(x) = x',
    'a = 1',
    'a; b',
    '"text"',
    "'text'",
    '`${a}`',
    '1:10',
    'a ? b : c',
    'a to kPa',
    'import({}, {})',
    'evaluate("1")',
    'parse("1")',
    'createUnit("x")',
    'simplify(a)',
    'typed(a)',
    '__proto__',
    'toString()',
    'hasOwnProperty(a)',
    'valueOf(a)',
    '__defineGetter__(a)',
    'a?.b',
    'a!',
    "a'",
    'a % b',
    '9^9^9^9',
    '9!!!!!!',
    '1:1e9',
    'map([1], f)',
    'factorial(170)',
    'ones(1e5, 1e5)',
    'a /* b */',
    'a // b',
    '\u0430bs(b)',
    'a\u200b + b',
    '0x1F',
    '0b11',
    '1_000',
    '3i',
    '2 null',
    'a # b',
    '1e999',
    '-1e999 kPa',
    'a\u0000b',
    '\u202ea',
    'ＡＢＣ',
    '\ud83d',
  ])('%s', (source) => {
    expect(refusal(source)).not.toBe('');
  });

  test.each([
    ['1 MB of a name', 'a'.repeat(1_000_000), /1000000 characters; at most 2000/],
    ['1 MB of brackets', '('.repeat(1_000_000), /characters/],
    ['10,000 nested brackets', `${'('.repeat(10_000)}1${')'.repeat(10_000)}`, /characters/],
    ['900 nested brackets', `${'('.repeat(900)}1${')'.repeat(900)}`, /nested more than 40 deep/],
    ['41 nested brackets', `${'('.repeat(41)}1${')'.repeat(41)}`, /nested more than 40 deep/],
    ['390 nested calls', `${'abs('.repeat(390)}a${')'.repeat(390)}`, /nested more than 40 deep/],
    ['1,900 minus signs', `${'-'.repeat(1_900)}1`, /nested more than 40 deep/],
    ['490 nots', `${'not '.repeat(490)}p`, /nested more than 40 deep/],
    ['a sum of 900', Array.from({ length: 900 }, () => 'a').join('+'), /nested more than 40 deep/],
    [
      'a bush of 500',
      `max(${Array.from({ length: 20 }, () => 'min(a,b,a,b,a,b,a,b,a,b,a,b,a,b,a,b,a,b)').join(',')})+max(a,${Array.from({ length: 19 }, () => 'min(a,b,a,b,a,b,a,b,a,b,a,b)').join(',')})`,
      /more than 400 parts/,
    ],
  ])('%s', (_what, source, message) => {
    expect(refusal(source)).toMatch(message);
  });

  it('takes what lies just within the bounds', () => {
    expect(parseExpression(`${'('.repeat(38)}1${')'.repeat(38)}`).ok).toBe(true);
    expect(parseExpression(Array.from({ length: 40 }, () => 'a').join('+')).ok).toBe(true);
  });

  it('never throws and never takes long, whatever is typed', () => {
    const words = fc.constantFrom(
      'a',
      'x1',
      '(',
      ')',
      '+',
      '-',
      '*',
      '/',
      '<',
      '<=',
      '==',
      'and',
      'or',
      'not',
      ',',
      '2',
      '1.5 kPa',
      '85 degC',
      'abs(',
      'max(',
      'inBand(',
      'gauge',
      '.',
      '%',
      '"',
      '[',
      '=',
      ' ',
    );
    const text = fc.oneof(
      fc.string({ unit: 'binary', maxLength: 300 }),
      fc.array(words, { maxLength: 60 }).map((parts) => parts.join(' ')),
    );
    let accepted = 0;
    fc.assert(
      fc.property(text, (source) => {
        const begin = processorMs();
        const parsed = parseExpression(source);
        expect(processorMs() - begin).toBeLessThan(boundMs);
        if (!parsed.ok) {
          const { start, end } = parsed.problem;
          expect(start >= 0 && start <= end && end <= source.length).toBe(true);
        } else {
          accepted += 1;
          inferKind(parsed.expression, () => undefined);
        }
      }),
      { seed: 20_261, numRuns: 5_000 },
    );
    expect(accepted).toBeGreaterThan(20);
  });
});

describe('names of the prototype', () => {
  test.each(['constructor', 'toString', 'hasOwnProperty', 'valueOf'])('%s is a name that nobody declared', (name) => {
    const parsed = parseExpression(name);
    if (!parsed.ok) throw new Error(parsed.problem.message);
    const declared: Readonly<Record<string, undefined>> = {};
    const inferred = inferKind(parsed.expression, (asked) =>
      Object.hasOwn(declared, asked) ? declared[asked] : undefined,
    );
    expect(inferred).toMatchObject({ ok: false, problem: { message: expect.stringContaining('not declared') } });
  });
});
