import type { Step } from '../../../procedures/document';
import { routeAhead, wayOn, type WayAhead } from '../../../procedures/engine/showing';
import type { RunView } from './run-view';

/**
 * The possible ways ahead for the Route, the likeliest first: what is typed now decides, then what is known already
 * where the step itself asks for nothing, else the author's order.
 */
export function waysAhead(run: RunView, predicted: string | undefined): readonly WayAhead[] {
  const { procedure, state } = run;
  const step = state.current === undefined ? undefined : procedure.step(state.current.id);
  const ways = routeAhead(procedure, state);
  const likeliest = predicted ?? (step === undefined ? undefined : knownWay(run, step));
  const first = ways.find(({ to }) => to === likeliest);
  if (first === undefined) return ways;
  return [first, ...ways.filter((way) => way !== first)].map((way) => ({ ...way, isMain: way === first }));
}

/** Where a step leads that asks for nothing which could change it. */
function knownWay({ procedure, state }: RunView, step: Step): string | undefined {
  if (step.kind !== 'start' && step.kind !== 'action' && step.kind !== 'restore') return undefined;
  const exit = wayOn(procedure, state, step);
  return exit?.to === 'verdict' ? (exit.verdict ?? state.verdict) : exit?.to;
}
