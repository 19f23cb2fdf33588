import { numberOf, type CheckValue } from '../check-values';

/** What comes out of a row's inputs, under the keys of its expectations. */
export type Results = Readonly<Record<string, unknown>>;

/** A way to reproduce the rows of one kind: those of a topic with just these inputs. */
export interface Reproduction {
  readonly topic: string;
  /** The names of the inputs; one that ends in `?` may be absent. */
  readonly inputs: readonly string[];
  /** Narrows the kind down where the names of the inputs do not tell. */
  readonly only?: (value: CheckValue) => boolean;
  readonly give: (given: Given, value: CheckValue) => Results;
}

/** A row's numeric input by its name; an error when it has none. */
export type Given = (name: string) => number;

/** Whether a row is of this reproduction's kind. */
export function reproduces({ topic, inputs, only }: Reproduction, value: CheckValue): boolean {
  const names = new Set(inputs.map((name) => name.replace('?', '')));
  const needed = inputs.filter((name) => !name.endsWith('?'));
  return (
    value.topic === topic &&
    needed.every((name) => name in value.inputs) &&
    Object.keys(value.inputs).every((name) => names.has(name)) &&
    (only?.(value) ?? true)
  );
}

/** The results of a row. */
export function resultsOf(reproduction: Reproduction, value: CheckValue): Results {
  return reproduction.give((name) => numberOf(value.inputs, name), value);
}

/** A row's list of numbers. */
export function listOf({ inputs }: CheckValue, name: string): number[] {
  const found = inputs[name];
  if (!Array.isArray(found) || found.some((entry) => typeof entry !== 'number')) throw new Error(`${name} is no list`);
  return found as number[];
}
