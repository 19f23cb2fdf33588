import type * as fc from 'fast-check';
import * as calculations from '../../../procedures/calculations';

/** What can be handed to a function, by the names of its arguments, those inside of an object included. */
export type NamedArguments = Readonly<Record<string, unknown>>;

/** An exported function, how to call it by named arguments, and what it takes. */
export interface ExportedFunction {
  readonly valid: fc.Arbitrary<NamedArguments>;
  readonly call: (given: NamedArguments) => unknown;
  /** The numbers among the arguments and a few values of each that are impossible. */
  readonly numbers: Readonly<Record<string, readonly number[]>>;
  /** Those of them that may be left out. */
  readonly optional?: readonly string[];
  /** The lists of numbers among the arguments. */
  readonly lists?: readonly string[];
  /** The lists of samples among the arguments, with the fields that hold numbers. */
  readonly samples?: Readonly<Record<string, readonly string[]>>;
  /** Texts of which only some are known. */
  readonly words?: readonly string[];
}

type Call = (...given: unknown[]) => unknown;
const callOf = (name: keyof typeof calculations) => calculations[name] as unknown as Call;
/** Calls with one object that holds every argument. */
export const asObject =
  (name: keyof typeof calculations) =>
  (given: NamedArguments): unknown =>
    callOf(name)(given);
/** Calls with the named arguments in this order. */
export const inOrder =
  (name: keyof typeof calculations, ...order: string[]) =>
  (given: NamedArguments): unknown =>
    callOf(name)(...order.map((argument) => given[argument]));
/** Calls with one argument, and the rest as an object. */
export const withRest =
  (name: keyof typeof calculations, first: string) =>
  (given: NamedArguments): unknown => {
    const { [first]: leading, ...rest } = given;
    return callOf(name)(leading, rest);
  };
