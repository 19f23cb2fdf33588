import { toBase, type UnitName } from '../calculations/for-a-run';
import type { CompiledProcedure, Environment, Limit, PressureSense } from '../document';
import { limitHoldsAt } from './called';
import { own } from './environment';
import { truthOf } from './judge-quantity';
import type { RunState } from './run-state';

/** A pressure that came in, under the name of its quantity or channel. */
export interface EnteredPressure {
  readonly name: string;
  readonly value: number;
  readonly unit: UnitName;
  readonly sense?: PressureSense;
}

/**
 * The first limit that a value breaks. An absolute pressure is held against a gauge limit less the station pressure;
 * where that is not known yet it cannot be checked.
 */
export function brokenLimit(
  procedure: CompiledProcedure,
  state: RunState,
  entered: EnteredPressure,
): Limit | undefined {
  return procedure.document.limits.find((limit) => {
    if (!limit.of.includes(entered.name)) return false;
    if (!limitHoldsAt(procedure, limit.id, state.current?.id)) return false;
    const gauge = asGauge(state, entered);
    return gauge !== undefined && truthOf(procedure, limit.holds, gaugeOnly(gauge)) === false;
  });
}

function asGauge(state: RunState, { value, unit, sense }: EnteredPressure): number | undefined {
  const base = toBase(value, unit);
  if (sense !== 'absolute') return base;
  const station = own(state.values, 'stationPressure');
  return station === undefined ? undefined : base - station.value;
}

function gaugeOnly(gauge: number): Environment {
  const isGauge = (name: string): boolean => name === 'gauge';
  return {
    number: (name) => (isGauge(name) ? gauge : undefined),
    uncertainty: () => 0,
    result: () => undefined,
    isMeasured: isGauge,
    truth: () => false,
  };
}
