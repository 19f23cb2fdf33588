import { combineDimensions, dimensionOf, isSameDimension, unitKindOf } from './dimension';
import {
  stationPressureName,
  type AboutNode,
  type ArithmeticNode,
  type CallNode,
  type ComparisonNode,
  type Expression,
  type ExpressionProblem,
  type Span,
} from './expression';
import {
  commonSense,
  isPlainNumber,
  isTemperature,
  kindInWords,
  mismatch,
  plainNumber,
  pressure,
  truth,
  writtenKind,
  type Kind,
  type QuantityKind,
  type Sense,
} from './kinds';
import { signatures } from './signatures';

/** The kinds of the names that an expression may use. */
export type KindOfName = (name: string) => Kind | undefined;

export type Inferred =
  { readonly ok: true; readonly kind: Kind } | { readonly ok: false; readonly problem: ExpressionProblem };

/**
 * Infers what an expression gives, from the kinds of its names. Refuses unknown names, dimensions that do not fit, and
 * gauge and absolute pressures side by side: one is turned into the other by `absolute(...)` or `gauge(...)`.
 */
export function inferKind(expression: Expression, kindOfName: KindOfName): Inferred {
  try {
    return { ok: true, kind: new KindReader(kindOfName).kind(expression) };
  } catch (error) {
    if (!(error instanceof Unfit)) throw error;
    return { ok: false, problem: error.problem };
  }
}

/** What stops the inference; never leaves this file. */
class Unfit extends Error {
  readonly problem: ExpressionProblem;

  constructor({ start, end }: Span, message: string) {
    super(message);
    this.problem = { start, end, message: message.charAt(0).toUpperCase() + message.slice(1) };
  }
}

class KindReader {
  constructor(private readonly kindOfName: KindOfName) {}

  kind(node: Expression): Kind {
    switch (node.node) {
      case 'number':
        return writtenKind(node.unit);
      case 'name':
        return this.named(node, node.name);
      case 'negate':
        return this.negated(node, this.quantity(node.of, 'negated'));
      case 'arithmetic':
        return this.arithmetic(node);
      case 'comparison':
        return this.comparison(node);
      case 'logic':
        this.truth(node.left, node.operator);
        this.truth(node.right, node.operator);
        return truth;
      case 'not':
        this.truth(node.of, 'not');
        return truth;
      case 'call':
        return this.call(node);
      case 'about':
        return this.about(node);
    }
  }

  private named(span: Span, name: string): Kind {
    const kind = this.kindOfName(name);
    if (kind !== undefined) return kind;
    const message = `\`${name}\` is not declared: no input, quantity, result, option or finding of the procedure has this name.`;
    throw new Unfit(span, message);
  }

  private truth(node: Expression, operator: string): void {
    const kind = this.kind(node);
    if (kind.kind === 'truth') return;
    const message = `\`${operator}\` needs what holds or does not, not ${kindInWords(kind)}: compare it first, and put brackets around a comparison after not.`;
    throw new Unfit(node, message);
  }

  private quantity(node: Expression, act: string): QuantityKind {
    const kind = this.kind(node);
    if (kind.kind === 'quantity') return kind;
    throw new Unfit(node, `what holds or does not cannot be ${act}: use and, or, not.`);
  }

  private negated(span: Span, kind: QuantityKind): QuantityKind {
    if (kind.sense !== 'absolute') return kind;
    throw new Unfit(span, `${kindInWords(kind)} has no negative: write the difference b - a instead of -a + b.`);
  }

  private arithmetic(node: ArithmeticNode): Kind {
    const left = this.quantity(node.left, 'calculated with');
    const right = this.quantity(node.right, 'calculated with');
    switch (node.operator) {
      case '+':
        return sumKind(node, left, right);
      case '-':
        return differenceKind(node, left, right);
      case '*':
        return productKind(node, left, right, 1);
      case '/':
        return productKind(node, left, right, -1);
    }
  }

  private comparison(node: ComparisonNode): Kind {
    const left = this.kind(node.left);
    const right = this.kind(node.right);
    if (left.kind === 'truth' || right.kind === 'truth') {
      throw new Unfit(node, 'what holds or does not is not compared: use and, or, not.');
    }
    alike(node, 'compared', left, right);
    return truth;
  }

  private call(node: CallNode): Kind {
    const kinds = node.arguments.map((argument) => this.quantity(argument, `given to ${node.calls}`));
    const first = kinds[0] ?? plainNumber;
    switch (node.calls) {
      case 'abs':
        if (first.sense === 'absolute') throw new Unfit(node, `\`abs\` takes a difference, not ${kindInWords(first)}.`);
        return first;
      case 'min':
      case 'max':
      case 'mean':
        return kinds.reduce((all, kind) => alike(node, `put into one ${node.calls}`, all, kind));
      case 'absolute':
        this.station(node);
        this.argument(node, 0, first, pressure('gauge'));
        return pressure('absolute');
      case 'gauge':
        this.station(node);
        this.argument(node, 0, first, pressure('absolute'));
        return pressure('gauge');
      default: {
        const { takes, gives } = signatures[node.calls];
        takes.forEach((wanted, index) => this.argument(node, index, kinds[index] ?? plainNumber, wanted));
        return gives;
      }
    }
  }

  private argument(node: CallNode, index: number, given: QuantityKind, wanted: QuantityKind): void {
    const fits = isSameDimension(given.dimension, wanted.dimension) && [wanted.sense, 'either'].includes(given.sense);
    if (fits) return;
    const place = node.arguments[index] ?? node;
    throw new Unfit(place, `\`${node.calls}\` takes ${kindInWords(wanted)} here, not ${kindInWords(given)}.`);
  }

  /** Both conversions read the air of the place, so it has to be there. */
  private station(node: CallNode): void {
    const kind = this.kindOfName(stationPressureName);
    const isThere =
      kind?.kind === 'quantity' &&
      isSameDimension(kind.dimension, dimensionOf('pressure')) &&
      kind.sense === 'absolute';
    if (isThere) return;
    const message = `\`${node.calls}\` needs the air of the place: declare an absolute pressure named ${stationPressureName}.`;
    throw new Unfit(node, message);
  }

  private about(node: AboutNode): Kind {
    const kind = this.named(node, node.name);
    if (kind.kind === 'truth') {
      throw new Unfit(node, `\`${node.asks}\` asks about a value; \`${node.name}\` holds or does not: write it alone.`);
    }
    return node.asks === 'uncertainty' ? { ...kind, sense: 'difference' } : truth;
  }
}

function alike(span: Span, act: string, left: QuantityKind, right: QuantityKind): QuantityKind {
  const sense = isSameDimension(left.dimension, right.dimension) ? commonSense(left.sense, right.sense) : undefined;
  if (sense !== undefined) return { ...left, sense };
  const { message } = mismatch(span, act, left, right);
  throw new Unfit(span, message);
}

/** An absolute value takes a difference; two absolute ones have no sum. */
function sumKind(node: ArithmeticNode, left: QuantityKind, right: QuantityKind): QuantityKind {
  if (!isSameDimension(left.dimension, right.dimension)) return alike(node, 'added', left, right);
  const senses: readonly Sense[] = [left.sense, right.sense];
  if (!senses.includes('absolute')) return alike(node, 'added', left, right);
  if (left.sense === 'absolute' && right.sense === 'absolute') {
    const more = isTemperature(left) ? 'Write a difference in K.' : 'For their middle write mean(a, b).';
    throw new Unfit(node, `the sum of ${kindInWords(left)} and another means nothing. ${more}`);
  }
  if (senses.includes('gauge')) return alike(node, 'added', left, right);
  return { ...left, sense: 'absolute' };
}

function differenceKind(node: ArithmeticNode, left: QuantityKind, right: QuantityKind): QuantityKind {
  if (!isSameDimension(left.dimension, right.dimension)) return alike(node, 'subtracted', left, right);
  if (left.sense === 'absolute' && right.sense !== 'gauge') {
    return { ...left, sense: right.sense === 'absolute' ? 'difference' : 'absolute' };
  }
  const { sense } = alike(node, 'subtracted', left, right);
  if (left.sense === 'either' && right.sense === 'either') return left;
  if (right.sense === 'absolute' || right.sense === 'gauge') return { ...left, sense: 'difference' };
  return { ...left, sense };
}

function productKind(node: ArithmeticNode, left: QuantityKind, right: QuantityKind, sign: 1 | -1): QuantityKind {
  const dimension = combineDimensions(left.dimension, right.dimension, sign);
  if (isPlainNumber(right)) return scaled(node, left);
  if (sign === 1 && isPlainNumber(left)) return scaled(node, right);
  if (sign === -1 && isSameDimension(left.dimension, right.dimension)) {
    const isMixed =
      left.sense !== right.sense &&
      [left.sense, right.sense].every((sense) => sense === 'gauge' || sense === 'absolute');
    if (isMixed) throw new Unfit(node, mismatch(node, 'divided', left, right).message);
  }
  return { kind: 'quantity', dimension, sense: 'difference' };
}

function scaled(node: ArithmeticNode, kind: QuantityKind): QuantityKind {
  if (kind.sense !== 'absolute' || unitKindOf(kind.dimension) !== 'temperature') return kind;
  throw new Unfit(node, 'a temperature on a scale is not multiplied: 2 * 20 degC is nothing. Take a difference in K.');
}
