import type { Step } from '../procedure-document';
import { stepWords, wayWords, type LintFinding, type LintSubject } from './lint-finding';
import type { RunEdge, RunPlace } from './run-graph';
import { wayName } from './ways';

/** Loops on which no branch has a bound: a run could go round for ever. Stopping is a person's act and not counted. */
export function unboundedLoops({ graphs }: LintSubject): readonly LintFinding[] {
  const findings = new Map<string, LintFinding>();
  for (const { places } of graphs) {
    for (const loop of loopsAmong(places)) {
      const steps = loop.map(({ from }) => from.step);
      const key = steps.map(({ id }) => id).join(' ');
      // The way back is the one that goes against the reading order.
      const back = loop.find(({ from, to }) => to.place <= from.place) ?? loop[0];
      if (back === undefined || findings.has(key)) continue;
      findings.set(key, finding(back, steps));
    }
  }
  return [...findings.values()];
}

function finding(back: RunEdge, steps: readonly Step[]): LintFinding {
  const { from, to, way } = back;
  const message = `${stepWords(from.step)}, ${wayName(way)}: leads back to step ${to.step.number}, and nothing bounds the loop ${wayWords([...steps, ...steps.slice(0, 1)])}. Make the way back a branch with \`atMost\` and \`thenceforth\`.`;
  return { rule: 'bounded-loops', step: from.step.id, pointer: way.pointer, message };
}

const unbounded = ({ out }: RunPlace): readonly RunEdge[] =>
  out.filter(({ way }) => !way.isBounded && way.kind !== 'stop');

/** One shortest loop out of each group of places that lead to each other. */
function loopsAmong(places: readonly RunPlace[]): readonly (readonly RunEdge[])[] {
  return groupsOf(places).flatMap((group) => {
    const members = new Set(group);
    const first = group.reduce((a, b) => (b.place < a.place ? b : a));
    const loop = shortestLoop(first, members);
    return loop === undefined ? [] : [loop];
  });
}

function shortestLoop(first: RunPlace, members: ReadonlySet<RunPlace>): readonly RunEdge[] | undefined {
  const cameBy = new Map<RunPlace, RunEdge>();
  const queue = [first];
  for (const place of queue) {
    for (const edge of unbounded(place)) {
      if (!members.has(edge.to) || cameBy.has(edge.to)) continue;
      cameBy.set(edge.to, edge);
      queue.push(edge.to);
    }
  }
  const last = cameBy.get(first);
  if (last === undefined) return undefined;
  const loop = [last];
  for (let edge = last; edge.from !== first;) {
    const before = cameBy.get(edge.from);
    if (before === undefined) return undefined;
    loop.unshift(before);
    edge = before;
  }
  return loop;
}

/**
 * Groups of places that lead to each other by unbounded ways: strongly connected components, of which single places
 * without a way to themselves fall out in `shortestLoop`. Tarjan 1972, with its own stack: a document may be long.
 */
function groupsOf(places: readonly RunPlace[]): readonly (readonly RunPlace[])[] {
  const groups: RunPlace[][] = [];
  const order = new Map<RunPlace, number>();
  const low = new Map<RunPlace, number>();
  const open: RunPlace[] = [];
  const isOpen = new Set<RunPlace>();
  const lower = (place: RunPlace, to: number): void => {
    low.set(place, Math.min(low.get(place) ?? to, to));
  };
  for (const root of places) {
    if (order.has(root)) continue;
    const visits: { readonly place: RunPlace; next: number; readonly edges: readonly RunEdge[] }[] = [];
    const enter = (place: RunPlace): void => {
      order.set(place, order.size);
      low.set(place, order.size - 1);
      open.push(place);
      isOpen.add(place);
      visits.push({ place, next: 0, edges: unbounded(place) });
    };
    enter(root);
    for (let visit = visits.at(-1); visit !== undefined; visit = visits.at(-1)) {
      const edge = visit.edges[visit.next];
      visit.next += 1;
      if (edge !== undefined) {
        if (!order.has(edge.to)) enter(edge.to);
        else if (isOpen.has(edge.to)) lower(visit.place, order.get(edge.to) ?? 0);
        continue;
      }
      visits.pop();
      const { place } = visit;
      const parent = visits.at(-1);
      if (parent !== undefined) lower(parent.place, low.get(place) ?? 0);
      if (low.get(place) !== order.get(place)) continue;
      const group = open.splice(open.lastIndexOf(place));
      group.forEach((member) => isOpen.delete(member));
      groups.push(group);
    }
  }
  return groups;
}
