import { toBase } from '../calculations/for-a-run';
import type { Environment, JudgedResult } from '../document';
import type { NamedValue, RunState } from './run-state';

type SeenValue = Pick<NamedValue, 'name' | 'value' | 'uncertainty' | 'judgement' | 'stale'>;

/** What expressions see of a run: its values, truths and inputs, with one value that is being made laid over them. */
export function environmentOf(
  state: Pick<RunState, 'values' | 'truths' | 'inputs' | 'verdict' | 'header'>,
  made?: SeenValue,
): Environment {
  const value = (name: string): SeenValue | undefined => {
    const known = made?.name === name ? made : own(state.values, name);
    if (known !== undefined) return known.stale === undefined ? known : undefined;
    const input = own(state.inputs, name);
    return input === undefined ? undefined : { name, value: toBase(Number(input.text), input.unit), uncertainty: 0 };
  };
  return {
    number: (name) => value(name)?.value,
    uncertainty: (name) => value(name)?.uncertainty,
    result: (name): JudgedResult | undefined => value(name)?.judgement?.result,
    isMeasured: (name) => value(name) !== undefined,
    truth: (name) => own(state.truths, name)?.holds ?? (state.verdict === name || state.header.half === name),
  };
}

/** The record's own member: names come from documents, so `constructor` must not find the prototype's. */
export function own<T>(record: Readonly<Record<string, T>>, name: string): T | undefined {
  return Object.hasOwn(record, name) ? record[name] : undefined;
}
