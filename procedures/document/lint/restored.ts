import type { Step } from '../procedure-document';
import { wayWords, type LintFinding, type LintSubject } from './lint-finding';
import type { RunEdge, RunGraph, RunPlace } from './run-graph';

/** What is taken apart on some way, stopping included, and not put back before the finding. */
export function neverRestored({ document, graphs }: LintSubject): readonly LintFinding[] {
  const items = new Map<string, string>();
  for (const { disturbs } of document.steps) {
    for (const { item, label } of disturbs ?? []) if (!items.has(item)) items.set(item, label);
  }
  return [...items].flatMap(([item, label]): LintFinding[] => {
    for (const graph of graphs) {
      const way = wayWithoutRestoring(graph, item);
      if (way !== undefined) return [finding(item, label, way)];
    }
    return [];
  });
}

/** Breadth first from every step that disturbs the item, not beyond a finished restore step, to a finding. */
function wayWithoutRestoring(graph: RunGraph, item: string): readonly Step[] | undefined {
  const disturbing = graph.places.filter(({ step }) => step.disturbs?.some((disturbed) => disturbed.item === item));
  const cameBy = new Map<RunPlace, RunEdge | undefined>(disturbing.map((place) => [place, undefined]));
  const queue = [...disturbing];
  for (const place of queue) {
    if (place.step.kind === 'finding') return wholeWay(graph, place, cameBy);
    // A restore step is left with nothing open; stopped in it, the run takes the way that every stop takes.
    if (place.step.kind === 'restore') continue;
    for (const edge of place.out) {
      if (cameBy.has(edge.to)) continue;
      cameBy.set(edge.to, edge);
      queue.push(edge.to);
    }
  }
  return undefined;
}

function wholeWay(graph: RunGraph, end: RunPlace, cameBy: ReadonlyMap<RunPlace, RunEdge | undefined>): readonly Step[] {
  const steps: Step[] = [end.step];
  let edge = cameBy.get(end);
  while (edge !== undefined) {
    steps.unshift(...(cameBy.get(edge.from) === undefined ? graph.wayTo(edge.from) : [edge.from.step]));
    edge = cameBy.get(edge.from);
  }
  return steps;
}

function finding(item: string, label: string, way: readonly Step[]): LintFinding {
  const step = way.find(({ disturbs }) => disturbs?.some((disturbed) => disturbed.item === item));
  const message = `Step ${step?.number ?? '?'}: the ${label} is disturbed and on the way ${wayWords(way)} never put back. Lead that way through a restore step.`;
  return { rule: 'restored', ...(step === undefined ? {} : { step: step.id }), message };
}
