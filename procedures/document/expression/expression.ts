import type { UnitName } from '../../calculations/for-a-run';

/** Where a node stands in its source: from `start` up to, not including, `end`, in UTF-16 code units. */
export interface Span {
  readonly start: number;
  readonly end: number;
}

/** A checked expression: plain JSON that holds nothing but the white-listed forms. */
export type Expression =
  NumberNode | NameNode | NegateNode | ArithmeticNode | ComparisonNode | LogicNode | NotNode | CallNode | AboutNode;

/** `1.5 kPa`; a plain number has the unit `1`. */
export interface NumberNode extends Span {
  readonly node: 'number';
  readonly value: number;
  readonly unit: UnitName;
}

/** A value or a truth of the run. */
export interface NameNode extends Span {
  readonly node: 'name';
  readonly name: string;
}

export interface NegateNode extends Span {
  readonly node: 'negate';
  readonly of: Expression;
}

export interface ArithmeticNode extends Span {
  readonly node: 'arithmetic';
  readonly operator: '+' | '-' | '*' | '/';
  readonly left: Expression;
  readonly right: Expression;
}

export interface ComparisonNode extends Span {
  readonly node: 'comparison';
  readonly operator: '<' | '<=' | '>' | '>=' | '==' | '!=';
  readonly left: Expression;
  readonly right: Expression;
}

export interface LogicNode extends Span {
  readonly node: 'logic';
  readonly operator: 'and' | 'or';
  readonly left: Expression;
  readonly right: Expression;
}

export interface NotNode extends Span {
  readonly node: 'not';
  readonly of: Expression;
}

/** A calculation by name. */
export interface CallNode extends Span {
  readonly node: 'call';
  readonly calls: CalculationName;
  readonly arguments: readonly Expression[];
}

/** A question about one named value. */
export interface AboutNode extends Span {
  readonly node: 'about';
  readonly asks: QuestionName;
  readonly name: string;
}

export type CalculationName = 'abs' | 'min' | 'max' | 'mean' | 'absolute' | 'gauge' | PhysicalCalculation;

/** The calculations whose arguments have fixed kinds; `signatures.ts` has those. */
export type PhysicalCalculation =
  | 'standardPressure'
  | 'stationPressure'
  | 'elevationOf'
  | 'speedDensityAirflow'
  | 'volumetricEfficiency'
  | 'orificeMassFlow'
  | 'orificeDiameter'
  | 'decayLeakRate';

/** `uncertainty` gives a difference; the others hold or do not. */
export type QuestionName = 'inBand' | 'outOfBand' | 'tooClose' | 'measured' | 'uncertainty';

/** What is wrong, where in the source, and in the message how to mend it. */
export interface ExpressionProblem extends Span {
  readonly message: string;
}

/** The name of the air pressure of the place, which `absolute(...)` and `gauge(...)` read. */
export const stationPressureName = 'stationPressure';
