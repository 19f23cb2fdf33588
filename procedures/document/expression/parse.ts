import { create, parseDependencies } from 'mathjs/number';
import type { ExpressionProblem } from './expression';
import { readTree, type GrammarNode, type Parsed } from './read-tree';
import { tokenise, type Token } from './tokenise';

/**
 * Reads an expression's text into a checked tree. mathjs gives the grammar (what binds how tightly); it is handed a
 * skeleton in which every number and name is a numbered placeholder, so that no text of the document reaches it, and
 * of what it gives back only the white-listed forms are taken over.
 *
 * Never throws: what is wrong comes back as a value with its place. This file alone imports mathjs.
 */
export function parseExpression(source: string): Parsed {
  const scanned = tokenise(source);
  if (!scanned.ok) return scanned;
  const { tokens } = scanned;
  const misplaced = missingOperator(tokens) ?? missingValue(tokens);
  if (misplaced !== undefined) return { ok: false, problem: misplaced };
  const skeleton = skeletonOf(tokens);
  let tree: GrammarNode;
  try {
    tree = grammar()(skeleton.text);
  } catch (error) {
    // mathjs throws a SyntaxError with the place of what it did not expect; there is no asking beforehand.
    return { ok: false, problem: syntaxProblem(error, skeleton.starts, tokens) };
  }
  return readTree(tree, tokens);
}

let parser: ((text: string) => GrammarNode) | undefined;

function grammar(): (text: string) => GrammarNode {
  if (parser === undefined) {
    if (parseDependencies === undefined) throw new RangeError('mathjs comes without its parser');
    parser = create(parseDependencies).parse as unknown as (text: string) => GrammarNode;
  }
  return parser;
}

interface Skeleton {
  readonly text: string;
  /** Where each token starts in the skeleton. */
  readonly starts: readonly number[];
}

function skeletonOf(tokens: readonly Token[]): Skeleton {
  const starts: number[] = [];
  let text = '';
  tokens.forEach((token, index) => {
    starts.push(text.length);
    text += token.token === 'sign' ? `${token.sign} ` : `n${index} `;
  });
  return { text, starts };
}

/** Two values side by side, which mathjs would multiply. */
function missingOperator(tokens: readonly Token[]): ExpressionProblem | undefined {
  for (const [index, token] of tokens.entries()) {
    const before = tokens[index - 1];
    if (before === undefined) continue;
    const ends = before.token !== 'sign' || before.sign === ')';
    const begins = token.token !== 'sign' || token.sign === 'not';
    const isOpening = token.token === 'sign' && token.sign === '(' && before.token !== 'name';
    if (!ends || !(begins || isOpening)) continue;
    const message = 'Between these two stands no operator. Write + - * /, a comparison, and, or.';
    return { start: before.start, end: token.end, message };
  }
  return undefined;
}

/** A word operator where a value should stand, which mathjs would take for a name. */
function missingValue(tokens: readonly Token[]): ExpressionProblem | undefined {
  for (const [index, token] of tokens.entries()) {
    if (token.token !== 'sign' || !['and', 'or', 'not'].includes(token.sign)) continue;
    const before = tokens[index - 1];
    const hasLeft = before !== undefined && (before.token !== 'sign' || before.sign === ')');
    const after = tokens[index + 1];
    const hasRight = after !== undefined && (after.token !== 'sign' || ['(', '-', '+', 'not'].includes(after.sign));
    const { start, end } = token;
    if (token.sign !== 'not' && !hasLeft)
      return { start, end, message: `Before \`${token.sign}\` a value is missing.` };
    if (!hasRight) return { start, end, message: `After \`${token.sign}\` a value is missing.` };
  }
  return undefined;
}

function syntaxProblem(error: unknown, starts: readonly number[], tokens: readonly Token[]): ExpressionProblem {
  if (!(error instanceof SyntaxError)) throw error;
  const char = (error as { readonly char?: unknown }).char;
  const at = typeof char === 'number' ? char - 1 : 0;
  const index = starts.findLastIndex((start) => start <= at);
  const token = tokens[index];
  const last = tokens.at(-1);
  const end = last?.end ?? 0;
  if (token === undefined || (token === last && error.message.includes('end of expression'))) {
    return { start: end, end, message: 'The expression breaks off here: a value is missing.' };
  }
  const { start } = token;
  return { start, end: token.end, message: `\`${written(token)}\` does not fit here. Check what stands before it.` };
}

function written(token: Token): string {
  switch (token.token) {
    case 'sign':
      return token.sign;
    case 'name':
      return token.name;
    case 'number':
      return token.unit === '1' ? String(token.value) : `${token.value} ${token.unit}`;
  }
}
