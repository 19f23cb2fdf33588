import type { Step } from '../procedure-document';
import { wayWords, type LintFinding, type LintSubject } from './lint-finding';
import { NameBits } from './name-bits';
import type { RunEdge, RunGraph, RunPlace } from './run-graph';

/** What is taken apart on some way, stopping included, and not put back before the finding. */
export function neverRestored({ document, graphs }: LintSubject): readonly LintFinding[] {
  const labels = new Map<string, string>();
  for (const { disturbs } of document.steps) {
    for (const { item, label } of disturbs ?? []) if (!labels.has(item)) labels.set(item, label);
  }
  const bits = new NameBits(labels.keys());
  const findings = new Map<string, LintFinding>();
  for (const graph of graphs) {
    const left = leftAtFindings(graph, bits);
    for (const [item, label] of labels) {
      if (findings.has(item) || !bits.has(left, item)) continue;
      const way = wayWithoutRestoring(graph, item);
      if (way !== undefined) findings.set(item, finding(item, label, way));
    }
  }
  return [...findings.values()];
}

/** The items that can be open when a finding is reached: for all at once, so that a way is sought only where one is. */
function leftAtFindings({ places }: RunGraph, bits: NameBits): bigint {
  const open = new Map<RunPlace, bigint>();
  let left = 0n;
  const waiting = new Set(places);
  for (const place of waiting) {
    waiting.delete(place);
    const before = open.get(place) ?? 0n;
    if (place.step.kind === 'finding') left |= before;
    const after =
      place.step.kind === 'restore' ? 0n : before | bits.of((place.step.disturbs ?? []).map(({ item }) => item));
    for (const { to } of place.out) {
      const known = open.get(to) ?? 0n;
      if ((known | after) === known) continue;
      open.set(to, known | after);
      waiting.add(to);
    }
  }
  return left;
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
