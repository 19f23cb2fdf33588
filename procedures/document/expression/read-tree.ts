import type { AboutNode, CallNode, Expression, ExpressionProblem, NumberNode, Span } from './expression';
import { bounds, tooDeep, type Token } from './tokenise';
import { calculations, functionForms, isCalculation, isQuestion } from './vocabulary';

export type Parsed =
  { readonly ok: true; readonly expression: Expression } | { readonly ok: false; readonly problem: ExpressionProblem };

/** What is read of mathjs's nodes; its own type names no member of the single kinds. */
export type GrammarNode =
  | { readonly type: 'ParenthesisNode'; readonly content: GrammarNode }
  | { readonly type: 'SymbolNode'; readonly name: string }
  | { readonly type: 'OperatorNode'; readonly op: string; readonly args: readonly GrammarNode[] }
  | { readonly type: 'FunctionNode'; readonly fn: GrammarNode; readonly args: readonly GrammarNode[] }
  | { readonly type: 'RelationalNode' };

/** Takes the white-listed forms of a parsed skeleton over into our own tree; every other form is refused. */
export function readTree(tree: GrammarNode, tokens: readonly Token[]): Parsed {
  return new TreeReader(tokens).read(tree);
}

/** What stops the reading of a tree; never leaves this file. */
class Refused extends Error {
  constructor(readonly problem: ExpressionProblem) {
    super(problem.message);
  }
}

const comparisons = ['<', '<=', '>', '>=', '==', '!='] as const;
/** Functions whose names are values too, told apart by their brackets: the air of the place, and what limits hold. */
const alsoNames: readonly string[] = ['stationPressure', 'gauge'];
const arithmetic = ['+', '-', '*', '/'] as const;

class TreeReader {
  private nodes = 0;

  constructor(private readonly tokens: readonly Token[]) {}

  read(tree: GrammarNode): Parsed {
    try {
      return { ok: true, expression: this.node(tree, 1) };
    } catch (error) {
      if (!(error instanceof Refused)) throw error;
      return { ok: false, problem: error.problem };
    }
  }

  private node(tree: GrammarNode, depth: number): Expression {
    this.nodes += 1;
    if (depth > bounds.depth) throw this.refused(this.whole(), tooDeep);
    if (this.nodes > bounds.nodes) {
      const message = `The expression has more than ${bounds.nodes} parts. Give a part of it a name of its own.`;
      throw this.refused(this.whole(), message);
    }
    switch (tree.type) {
      case 'ParenthesisNode':
        return this.node(tree.content, depth + 1);
      case 'SymbolNode':
        return this.leaf(tree.name);
      case 'OperatorNode':
        return tree.args.length === 1
          ? this.prefix(tree.op, tree.args[0], depth)
          : this.infix(tree.op, tree.args[0], tree.args[1], depth);
      case 'FunctionNode':
        return this.call(tree.fn, tree.args, depth);
      case 'RelationalNode':
        throw this.refused(this.whole(), 'Two comparisons in a row. Compare two at a time: a < b and b < c.');
      default:
        throw this.refused(this.whole(), 'This form is not part of the language.');
    }
  }

  private leaf(placeholder: string): Expression {
    const token = this.token(placeholder);
    const { start, end } = token;
    if (token.token === 'number') return { node: 'number', value: token.value, unit: token.unit, start, end };
    if (isCalculation(token.name) && !alsoNames.includes(token.name)) {
      const { form } = calculations[token.name];
      throw this.refused(token, `\`${token.name}\` is a function: write ${form}.`);
    }
    if (isQuestion(token.name)) {
      throw this.refused(token, `\`${token.name}\` is a function: write ${token.name}(name).`);
    }
    return { node: 'name', name: token.name, start, end };
  }

  private prefix(operator: string, operand: GrammarNode | undefined, depth: number): Expression {
    if (operand === undefined) throw this.refused(this.whole(), 'A value is missing.');
    const of = this.node(operand, depth + 1);
    // -40 degC is one number on its scale, not the negative of 313.15 K.
    if (operator === '-' && of.node === 'number' && operand.type === 'SymbolNode') return this.negative(of);
    const span = { start: this.signBefore(of.start, operator), end: of.end };
    if (operator === '-') return { node: 'negate', of, ...span };
    if (operator === 'not') return { node: 'not', of, ...span };
    throw this.refused(span, `\`${operator}\` before a value is not part of the language: leave it out.`);
  }

  private negative(of: NumberNode): Expression {
    return { ...of, value: -of.value, start: this.signBefore(of.start, '-') };
  }

  private infix(
    operator: string,
    first: GrammarNode | undefined,
    second: GrammarNode | undefined,
    depth: number,
  ): Expression {
    if (first === undefined || second === undefined) throw this.refused(this.whole(), 'A value is missing.');
    const left = this.node(first, depth + 1);
    const right = this.node(second, depth + 1);
    const span = { start: left.start, end: right.end };
    if (operator === 'and' || operator === 'or') return { node: 'logic', operator, left, right, ...span };
    const comparison = comparisons.find((sign) => sign === operator);
    if (comparison !== undefined) return { node: 'comparison', operator: comparison, left, right, ...span };
    const sum = arithmetic.find((sign) => sign === operator);
    if (sum !== undefined) return { node: 'arithmetic', operator: sum, left, right, ...span };
    throw this.refused(span, `\`${operator}\` is not part of the language. It has + - * /, comparisons, and, or, not.`);
  }

  private call(called: GrammarNode, values: readonly GrammarNode[], depth: number): Expression {
    const token = called.type === 'SymbolNode' ? this.token(called.name) : undefined;
    if (token?.token !== 'name') throw this.refused(this.whole(), 'Only a function can be called by name.');
    if (isQuestion(token.name)) return this.question(token, token.name, values, depth);
    if (!isCalculation(token.name)) {
      throw this.refused(token, `\`${token.name}\` is not a function of the language. There are: ${functionForms}.`);
    }
    const arity = calculations[token.name];
    const given = values.map((value) => this.node(value, depth + 1));
    const span = { start: token.start, end: given.at(-1)?.end ?? token.end };
    if (given.length < arity.least || given.length > arity.most) {
      throw this.refused(span, `\`${token.name}\` is given ${given.length}: write ${arity.form}.`);
    }
    return { node: 'call', calls: token.name, arguments: given, ...span } satisfies CallNode;
  }

  private question(token: Span, asks: AboutNode['asks'], values: readonly GrammarNode[], depth: number): Expression {
    const given = values.map((value) => this.node(value, depth + 1));
    const about = given[0];
    const span = { start: token.start, end: given.at(-1)?.end ?? token.end };
    if (given.length !== 1 || about?.node !== 'name') {
      throw this.refused(span, `\`${asks}\` asks about one name: write ${asks}(name).`);
    }
    return { node: 'about', asks, name: about.name, ...span };
  }

  /** Placeholders are numbered by token. */
  private token(placeholder: string): Exclude<Token, { token: 'sign' }> {
    const token = this.tokens[Number(placeholder.slice(1))];
    if (token === undefined || token.token === 'sign') throw new RangeError(`${placeholder} stands for no token`);
    return token;
  }

  private signBefore(start: number, sign: string): number {
    const found = this.tokens.findLast((token) => token.token === 'sign' && token.sign === sign && token.start < start);
    return found?.start ?? start;
  }

  private whole(): Span {
    return { start: this.tokens[0]?.start ?? 0, end: this.tokens.at(-1)?.end ?? 0 };
  }

  private refused({ start, end }: Span, message: string): Refused {
    return new Refused({ start, end, message });
  }
}
