import fc from 'fast-check';
import { WorkCounter } from '../../support/work-counter';
import { parseExpression } from '../../../procedures/document/expression/parse';

/*
 * What a hostile text can cost, in blocks of code entered; the longest text that is read at all has 2,000 characters.
 * The sum of 18 names costs some 2,600.
 */
const mostBlocks = 200_000;

/** Texts of the allowed length, made of what a grammar finds hard: nesting, long chains, near misses. */
const longTexts = fc
  .tuple(
    fc.constantFrom(
      '(',
      'abs(',
      'max(a,',
      '-',
      'not ',
      'a+',
      'a and ',
      'a<',
      'a==b or ',
      '((a)',
      '1 kPa+',
      '2^',
      'a!',
      'a[1]',
      '1:',
      'f(x)=',
      '"',
      '#',
      ' ',
      'a ',
      '9',
      'm3/',
      'lbf.',
      'a,',
      ')',
      'max(max(max(',
      '\u0430bs(',
      '1e',
      '.',
      'in',
      'a?b:',
    ),
    fc.integer({ min: 1, max: 2_000 }),
    fc.constantFrom('', 'a', ')', '1', 'a))))', ' kPa'),
  )
  .map(([part, times, end]) => `${part.repeat(Math.min(times, Math.floor(1_990 / part.length)))}${end}`);

describe('the cost of reading a hostile text', () => {
  let counter: WorkCounter;
  beforeAll(() => {
    counter = new WorkCounter(/procedures\/|mathjs/);
    // The grammar is made once, with the first text.
    parseExpression('a + b');
  });
  afterAll(() => counter.close());

  it('is bounded, whatever is repeated', () => {
    let most = 0;
    fc.assert(
      fc.property(longTexts, (text) => {
        const blocks = counter.blocksEntered(() => parseExpression(text));
        most = Math.max(most, blocks);
        expect([text.slice(0, 20), text.length, blocks < mostBlocks]).toEqual([text.slice(0, 20), text.length, true]);
      }),
      { seed: 31, numRuns: 100 },
    );
    // The counter counts: the longest ones are not refused by their length alone.
    expect(most).toBeGreaterThan(5_000);
  });

  it('does not grow with what is longer than allowed', () => {
    const [some, many] = [3_000, 1_000_000].map((length) =>
      counter.blocksEntered(() => parseExpression('max(a, '.repeat(length / 7))),
    );
    expect(some).toBeLessThan(100);
    expect(many).toBe(some);
  });

  it('grows no faster than the text does', () => {
    const chain = (parts: number): string => Array.from({ length: parts }, () => 'a').join(' + ');
    const [short, long] = [18, 36].map((parts) => counter.blocksEntered(() => parseExpression(chain(parts))));
    expect((long ?? Number.NaN) / (short ?? Number.NaN)).toBeLessThan(2.3);
  });
});
