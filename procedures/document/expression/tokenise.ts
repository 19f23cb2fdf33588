import { isUnit, units, type UnitName } from '../../calculations/for-a-run';
import type { ExpressionProblem, Span } from './expression';
import { refusedWords } from './vocabulary';

/** The bounds that hold before and after parsing, so that no text can cost more than a moment. */
export const bounds = { length: 2000, depth: 40, nodes: 400 } as const;

export type Token =
  | (Span & { readonly token: 'number'; readonly value: number; readonly unit: UnitName })
  | (Span & { readonly token: 'name'; readonly name: string })
  | (Span & { readonly token: 'sign'; readonly sign: string });

export type Tokens =
  | { readonly ok: true; readonly tokens: readonly Token[] }
  | { readonly ok: false; readonly problem: ExpressionProblem };

const numberPattern = /(?:\d+(?:\.\d*)?|\.\d+)(?:[eE][+-]?\d+)?/y;
const wordPattern = /[A-Za-z][A-Za-z0-9]*/y;
const signPattern = /<=|>=|==|!=|[-+*/(),<>]/y;
const spacePattern = /[ \t\r\n]+/y;
const unitStartPattern = /[A-Za-z%][A-Za-z0-9%]*/y;

/** Longest first: `m3/s` before `m`. */
const unitNames = Object.keys(units)
  .filter((name) => name !== '1')
  .sort((a, b) => b.length - a.length || (a < b ? -1 : 1));

/** What is often typed and never understood, with the words to mend it. */
const strangers: readonly (readonly [RegExp, string])[] = [
  [/^[\u2264]/, 'write <='],
  [/^[\u2265]/, 'write >='],
  [/^[\u2260]/, 'write !='],
  [/^[\u2212\u2013\u2014]/, 'write - (the hyphen)'],
  [/^[\u00d7]/, 'write *'],
  [/^[\u00f7]/, 'write /'],
  [/^\u00b0/, 'write degC or degF'],
  [/^\u00b1/, 'give the two ends by themselves'],
  [/^\^/, 'powers are not part of the language; multiply'],
  [/^&/, 'write and'],
  [/^\|/, 'write or'],
  [/^!/, 'write not'],
  [/^=/, 'to compare, write ==; nothing can be assigned'],
  [/^\./, 'a name has no parts'],
  [/^[[\]]/, 'nothing can be indexed'],
  [/^[{}]/, 'only round brackets are known'],
  [/^["'`]/, 'there is no text in an expression'],
  [/^;/, 'write one expression'],
  [/^#/, 'there are no remarks in an expression'],
  [/^_/, 'names have letters and digits only'],
];

/**
 * Cuts an expression's text into numbers (with their units), names and signs. Refuses what is too long, what is
 * nested too deeply and every character that the language does not have, in time linear in the allowed length.
 */
export function tokenise(source: string): Tokens {
  if (source.length > bounds.length) {
    const message = `The expression has ${source.length} characters; at most ${bounds.length} are allowed. Give a part of it a name of its own.`;
    return refuse({ start: bounds.length, end: source.length }, message);
  }
  const tokens: Token[] = [];
  const nesting = new Nesting();
  let at = 0;
  while (at < source.length) {
    const space = match(spacePattern, source, at);
    if (space !== undefined) {
      at += space.length;
      continue;
    }
    const next = nextToken(source, at);
    if (!next.ok) return next;
    const problem = nesting.problemAt(next.token);
    if (problem !== undefined) return { ok: false, problem };
    tokens.push(next.token);
    at = next.token.end;
  }
  if (tokens.length === 0) return refuse({ start: 0, end: source.length }, 'The expression is empty.');
  const problem = nesting.problemAtEnd(source.length);
  return problem === undefined ? { ok: true, tokens } : { ok: false, problem };
}

type NextToken =
  { readonly ok: true; readonly token: Token } | { readonly ok: false; readonly problem: ExpressionProblem };

function nextToken(source: string, start: number): NextToken {
  const digits = match(numberPattern, source, start);
  if (digits !== undefined) return numberToken(source, start, digits);
  const word = match(wordPattern, source, start);
  if (word !== undefined) {
    const span = { start, end: start + word.length };
    const instead = Object.hasOwn(refusedWords, word) ? refusedWords[word] : undefined;
    if (instead !== undefined) return refuse(span, `\`${word}\` is not part of the language: ${instead}.`);
    if (word === 'and' || word === 'or' || word === 'not')
      return { ok: true, token: { token: 'sign', sign: word, ...span } };
    return { ok: true, token: { token: 'name', name: word, ...span } };
  }
  const sign = match(signPattern, source, start);
  if (sign !== undefined) return { ok: true, token: { token: 'sign', sign, start, end: start + sign.length } };
  const character = String.fromCodePoint(source.codePointAt(start) ?? 0);
  const instead = strangers.find(([pattern]) => pattern.test(character))?.[1];
  const message = `\`${character}\` is not part of the language${instead === undefined ? '' : `: ${instead}`}.`;
  return refuse({ start, end: start + character.length }, message);
}

function numberToken(source: string, start: number, digits: string): NextToken {
  const value = Number(digits);
  const end = start + digits.length;
  if (!Number.isFinite(value)) return refuse({ start, end }, `${digits} is too large to be a number.`);
  const afterSpace = end + (match(spacePattern, source, end)?.length ?? 0);
  const unit = unitAt(source, afterSpace);
  if (unit !== undefined)
    return { ok: true, token: { token: 'number', value, unit, start, end: afterSpace + unit.length } };
  const word = match(unitStartPattern, source, afterSpace);
  if (word === undefined || ['and', 'or', 'not'].includes(word)) {
    return { ok: true, token: { token: 'number', value, unit: '1', start, end } };
  }
  const message = `\`${word}\` after ${digits} is not a unit. Units are: ${unitNames.join(', ')}. To multiply, write *.`;
  return refuse({ start: afterSpace, end: afterSpace + word.length }, message);
}

/** The longest unit that stands there and ends there: the `m` of `3 max(...)` is none, nor `min(` of a call. */
function unitAt(source: string, at: number): UnitName | undefined {
  const found = unitNames.find(
    (name) => source.startsWith(name, at) && !/[A-Za-z0-9(_]/.test(source.charAt(at + name.length)),
  );
  return found !== undefined && isUnit(found) ? found : undefined;
}

/** Counts brackets and runs of prefixes: what a parser would answer with recursion. */
class Nesting {
  private readonly open: Token[] = [];
  private prefixes = 0;

  problemAt(token: Token): ExpressionProblem | undefined {
    const sign = token.token === 'sign' ? token.sign : '';
    this.prefixes = sign === '-' || sign === '+' || sign === 'not' ? this.prefixes + 1 : 0;
    if (sign === '(') this.open.push(token);
    if (sign === ')' && this.open.pop() === undefined) {
      return {
        start: token.start,
        end: token.end,
        message: 'This bracket closes none. Take it out or open one before.',
      };
    }
    if (this.open.length <= bounds.depth && this.prefixes <= bounds.depth) return undefined;
    return { start: token.start, end: token.end, message: tooDeep };
  }

  problemAtEnd(end: number): ExpressionProblem | undefined {
    const last = this.open.at(-1);
    return last === undefined
      ? undefined
      : { start: last.start, end, message: 'This bracket is not closed. Write ) where it ends.' };
  }
}

export const tooDeep = `The expression is nested more than ${bounds.depth} deep. Give a part of it a name of its own.`;

function match(pattern: RegExp, source: string, at: number): string | undefined {
  pattern.lastIndex = at;
  return pattern.exec(source)?.[0];
}

function refuse(span: Span, message: string): { readonly ok: false; readonly problem: ExpressionProblem } {
  return { ok: false, problem: { ...span, message } };
}
