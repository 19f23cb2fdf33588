import type { Step } from '../procedure-document';
import { valueNamesOf } from './named-values';
import type { RunEdge, RunGraph, RunPlace } from './run-graph';

/** The shortest way to a place on which nothing gives a value to the name; the plain one where there is none. */
export function wayWithout(
  graph: RunGraph,
  place: RunPlace,
  name: string,
  isLeftOpen: (edge: RunEdge) => boolean,
): readonly Step[] {
  const first = graph.places[0];
  if (first === undefined) return [];
  const cameFrom = new Map<RunPlace, RunPlace | undefined>([[first, undefined]]);
  const queue = [first];
  for (const from of queue) {
    const isAsked = valueNamesOf(from.step).includes(name);
    for (const edge of from.out) {
      if (cameFrom.has(edge.to) || (isAsked && !isLeftOpen(edge))) continue;
      cameFrom.set(edge.to, from);
      queue.push(edge.to);
    }
  }
  if (!cameFrom.has(place)) return graph.wayTo(place);
  const steps: Step[] = [];
  for (let at: RunPlace | undefined = place; at !== undefined; at = cameFrom.get(at)) steps.unshift(at.step);
  return steps;
}

/** A step that is stopped gives nothing. */
export function isStop({ way }: RunEdge): boolean {
  return way.kind === 'stop';
}

/** Nor does one where nothing could be measured. */
export function isWithoutReading({ way }: RunEdge): boolean {
  return way.kind === 'stop' || way.kind === 'cannot-measure';
}
