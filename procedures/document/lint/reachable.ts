import { stepWords, wayWords, type LintFinding, type LintSubject } from './lint-finding';
import type { RunGraph, RunPlace } from './run-graph';
import { wayName } from './ways';

/** Steps that no run can come to. */
export function unreachableSteps({ document, graphs }: LintSubject): readonly LintFinding[] {
  const reached = new Set(graphs.flatMap(({ places }) => places.map(({ place }) => place)));
  return document.steps.flatMap((step, place): LintFinding[] => {
    if (reached.has(place)) return [];
    const mending =
      step.kind === 'finding'
        ? 'no way that a run can take names it as its verdict'
        : 'no way that a run can take leads to it';
    const message = `${stepWords(step)} is never reached: ${mending}. Lead a way to it or take it out.`;
    return [{ rule: 'reachable', step: step.id, pointer: `/steps/${place}`, message }];
  });
}

/** Ways to `verdict` on which no finding was named. */
export function unnamedVerdicts({ graphs }: LintSubject): readonly LintFinding[] {
  const findings = new Map<string, LintFinding>();
  for (const graph of graphs) {
    for (const { from, way } of graph.looseEnds) {
      const key = `${from.step.id}/${wayName(way)}`;
      if (findings.has(key)) continue;
      const way1 = wayWords(graph.wayTo(from));
      const message = `${stepWords(from.step)}, ${wayName(way)}: goes to the verdict, but on the way ${way1} no finding was named. Name one here (\`verdict\`), or on a way before.`;
      findings.set(key, { rule: 'verdict-named', step: from.step.id, pointer: way.pointer, message });
    }
  }
  return [...findings.values()];
}

/** Steps from which no finding can be reached, other than by stopping. */
export function endlessSteps({ graphs }: LintSubject): readonly LintFinding[] {
  const findings = new Map<string, LintFinding>();
  for (const graph of graphs) {
    const ending = placesThatEnd(graph);
    for (const place of graph.places) {
      if (ending.has(place) || findings.has(place.step.id)) continue;
      const way = wayWords(graph.wayTo(place));
      const message = `${stepWords(place.step)}: from here no way ends in a finding (reached by ${way}). Lead a way on to one.`;
      findings.set(place.step.id, {
        rule: 'ends-in-a-finding',
        step: place.step.id,
        pointer: `/steps/${place.place}`,
        message,
      });
    }
  }
  return [...findings.values()];
}

function placesThatEnd(graph: RunGraph): ReadonlySet<RunPlace> {
  const before = new Map<RunPlace, RunPlace[]>();
  for (const place of graph.places) {
    for (const { to, way } of place.out) {
      if (way.kind === 'stop') continue;
      const known = before.get(to);
      if (known === undefined) before.set(to, [place]);
      else known.push(place);
    }
  }
  const ending = new Set(graph.places.filter(({ step }) => step.kind === 'finding'));
  for (const place of ending) for (const earlier of before.get(place) ?? []) ending.add(earlier);
  return ending;
}

/** For each finding that can be reached, one shortest way: the ids of its steps. A stop is on it only if it must be. */
export function waysToFindings({ graphs }: LintSubject): Readonly<Record<string, readonly string[]>> {
  const nearest = new Map<string, { readonly graph: RunGraph; readonly place: RunPlace }>();
  for (const graph of graphs) {
    for (const place of graph.places) {
      if (place.step.kind !== 'finding') continue;
      const known = nearest.get(place.step.id)?.place;
      const isNearer =
        known === undefined || place.stops < known.stops || (place.stops === known.stops && place.depth < known.depth);
      if (isNearer) nearest.set(place.step.id, { graph, place });
    }
  }
  const ways = [...nearest].map(([id, { graph, place }]) => [id, graph.wayTo(place).map((step) => step.id)] as const);
  return Object.fromEntries(ways);
}
