import { toBase, unitKind } from '../../calculations/for-a-run';
import { declarationsOf, type Declaration } from '../declarations';
import type { Environment } from '../expression/environment';
import type { Expression } from '../expression/expression';
import { numberPart } from '../expression/number-part';
import type { ProcedureDocument } from '../procedure-document';

/** Figures of an invented car, in base units: only what does not depend on them is told from them. */
const nominal = { absolute: 95_000, gauge: 4_000, difference: 1_000, temperature: 300, other: 1 } as const;

/**
 * Evaluates expressions before any run, with the inputs' defaults and invented figures for all that is measured.
 * `constantValue` gives a number only where the invented figures cancel out.
 */
export class NominalFigures {
  private readonly declarations: ReadonlyMap<string, Declaration>;
  private readonly inputs: ReadonlyMap<string, number>;

  constructor(document: ProcedureDocument) {
    this.declarations = declarationsOf(document).declarations;
    this.inputs = new Map(
      document.inputs.flatMap((input): [string, number][] =>
        input.default === undefined ? [] : [[input.name, toBase(Number(input.default), input.unit)]],
      ),
    );
  }

  /** A number made of expressions, in base units; undefined where it depends on what a run measures. */
  constantValue(
    trees: readonly Expression[],
    calculate: (values: readonly number[], stationPa: number) => number,
  ): number | undefined {
    const at = (scale: number): number | undefined => {
      const environment = this.environment(scale);
      const values = trees.map((tree) => numberPart(tree)(environment));
      const known = values.filter((value) => value !== undefined);
      return known.length === values.length ? calculate(known, nominal.absolute * scale) : undefined;
    };
    const [first, second] = [at(1), at(1.02)];
    if (first === undefined || second === undefined) return undefined;
    return Math.abs(first - second) <= 1e-9 * Math.max(Math.abs(first), 1) ? first : undefined;
  }

  private environment(scale: number): Environment {
    return {
      number: (name) => this.inputs.get(name) ?? this.invented(name, scale),
      uncertainty: () => undefined,
      truth: () => false,
      result: () => undefined,
      isMeasured: () => true,
    };
  }

  private invented(name: string, scale: number): number | undefined {
    const declared = this.declarations.get(name);
    if (declared?.kind !== 'quantity') return undefined;
    const kind = unitKind(declared.unit);
    if (kind === 'pressure') return nominal[declared.sense ?? 'difference'] * scale;
    return (kind === 'temperature' ? nominal.temperature : nominal.other) * scale;
  }
}

/** A figure for a message: three figures are enough to see the point. */
export function shortFigure(value: number): string {
  return String(Number(value.toPrecision(3)));
}
