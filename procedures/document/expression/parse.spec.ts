import type { Expression } from './expression';
import { parseExpression } from './parse';

function tree(source: string): Expression {
  const parsed = parseExpression(source);
  if (!parsed.ok) throw new Error(`${source}: ${parsed.problem.message}`);
  return parsed.expression;
}

function problem(source: string): { readonly message: string; readonly text: string } {
  const parsed = parseExpression(source);
  if (parsed.ok) throw new Error(`${source} was accepted`);
  return { message: parsed.problem.message, text: source.slice(parsed.problem.start, parsed.problem.end) };
}

/** The tree as fully bracketed text. */
function written(node: Expression): string {
  switch (node.node) {
    case 'number':
      return node.unit === '1' ? String(node.value) : `${node.value}[${node.unit}]`;
    case 'name':
      return node.name;
    case 'negate':
      return `(- ${written(node.of)})`;
    case 'not':
      return `(not ${written(node.of)})`;
    case 'arithmetic':
    case 'comparison':
    case 'logic':
      return `(${written(node.left)} ${node.operator} ${written(node.right)})`;
    case 'call':
      return `${node.calls}(${node.arguments.map(written).join(', ')})`;
    case 'about':
      return `${node.asks}(${node.name})`;
  }
}

describe('what binds how tightly', () => {
  test.each([
    ['a + b * c', '(a + (b * c))'],
    ['a - b - c', '((a - b) - c)'],
    ['a / b / c', '((a / b) / c)'],
    ['(a + b) * c', '((a + b) * c)'],
    ['-a * b', '((- a) * b)'],
    ['a - -b', '(a - (- b))'],
    ['a + b > c', '((a + b) > c)'],
    ['a > b and c < d', '((a > b) and (c < d))'],
    ['p or q and r', '(p or (q and r))'],
    ['not p and q', '((not p) and q)'],
    ['not (p and q)', '(not (p and q))'],
    ['abs(a - b) > 1.5 kPa', '(abs((a - b)) > 1.5[kPa])'],
    ['min(a, b, c) != mean(d, e)', '(min(a, b, c) != mean(d, e))'],
    ['stationPressure - stationPressure(q, elevation)', '(stationPressure - stationPressure(q, elevation))'],
    ['gauge <= 34.5 kPa', '(gauge <= 34.5[kPa])'],
    ['absolute(gauge)', 'absolute(gauge)'],
    ['tooClose(a) or not measured(b)', '(tooClose(a) or (not measured(b)))'],
  ])('%s', (source, expected) => {
    expect(written(tree(source))).toBe(expected);
  });
});

describe('numbers with units', () => {
  test.each([
    ['1.5 kPa', 1.5, 'kPa'],
    ['1.5kPa', 1.5, 'kPa'],
    ['.5 psi', 0.5, 'psi'],
    ['5. K', 5, 'K'],
    ['1.2e3 Pa', 1200, 'Pa'],
    ['-40 degC', -40, 'degC'],
    ['10 L/min', 10, 'L/min'],
    ['3 m3/s', 3, 'm3/s'],
    ['100 lbf.ft', 100, 'lbf.ft'],
    ['50 km/h', 50, 'km/h'],
    ['5 %', 5, '%'],
    ['85', 85, '1'],
  ])('%s is one number', (source, value, unit) => {
    expect(tree(source)).toEqual({ node: 'number', value, unit, start: 0, end: source.length });
  });

  it('takes the unit only where it ends and is not a function', () => {
    expect(written(tree('10 L/min(a, b)'))).toBe('(10[L] / min(a, b))');
    expect(written(tree('3 m / s'))).toBe('(3[m] / s)');
  });

  it('keeps the minus of a bracketed temperature apart from the scale', () => {
    expect(written(tree('-(40 degC)'))).toBe('(- 40[degC])');
  });
});

describe('places', () => {
  it('are those of the text', () => {
    const source = 'measured(x)  and not (abs(a - b) > 1.5 kPa)';
    const whole = tree(source);
    if (whole.node !== 'logic' || whole.right.node !== 'not' || whole.right.of.node !== 'comparison') throw new Error();
    const text = ({ start, end }: Expression): string => source.slice(start, end);
    expect(text(whole.left)).toBe('measured(x');
    expect(text(whole.right)).toBe('not (abs(a - b) > 1.5 kPa');
    expect(text(whole.right.of.left)).toBe('abs(a - b');
    expect(text(whole.right.of.right)).toBe('1.5 kPa');
  });
});

describe('what is refused names the place and the mending', () => {
  test.each([
    ['', '', /empty/],
    ['a +', '', /breaks off/],
    ['and', 'and', /Before `and` a value is missing/],
    ['a and', 'and', /After `and` a value is missing/],
    ['a + or', 'or', /Before `or` a value is missing/],
    ['(not)', 'not', /After `not` a value is missing/],
    ['a * / b', '/', /does not fit here/],
    ['()', ')', /does not fit here/],
    ['a, b', ',', /does not fit here/],
    ['(a', '(a', /not closed/],
    ['a)', ')', /closes none/],
    ['a b', 'a b', /no operator/],
    ['2 (a)', '2 (', /no operator/],
    ['(a)(b)', ')(', /no operator/],
    ['a not b', 'a not', /no operator/],
    ['2 kpa', 'kpa', /`kpa` after 2 is not a unit\. Units are: .*kPa/],
    ['2 bananas', 'bananas', /not a unit/],
    ['a < b < c', 'a < b < c', /a < b and b < c/],
    ['+a', '+a', /leave it out/],
    ['a = 3', '=', /nothing can be assigned/],
    ['a == true', 'true', /not part of the language/],
    ['a mod b', 'mod', /only \+ - \* \//],
    ['a AND b', 'AND', /write and/],
    ['a && b', '&', /write and/],
    ['a || b', '|', /write or/],
    ['!a', '!', /write not/],
    ['a ^ 2', '^', /multiply/],
    ['a \u2265 b', '\u2265', /write >=/],
    ['85 \u00b0C', '\u00b0', /degC/],
    ['2 kPa \u00b1 1 kPa', '\u00b1', /two ends/],
    ['max(a)', 'max(a', /max\(a, b\)/],
    ['abs(a, b)', 'abs(a, b', /abs\(x\)/],
    ['abs', 'abs', /write abs\(x\)/],
    ['inBand + 1', 'inBand', /write inBand\(name\)/],
    ['inBand(a + b)', 'inBand(a + b', /asks about one name/],
    ['measured(2)', 'measured(2', /asks about one name/],
    ['sqrt(a)', 'sqrt', /`sqrt` is not a function.*abs\(x\)/],
    ['1e999 kPa', '1e999', /too large/],
  ])('%s', (source, text, message) => {
    expect(problem(source)).toEqual({ text, message: expect.stringMatching(message) });
  });
});
