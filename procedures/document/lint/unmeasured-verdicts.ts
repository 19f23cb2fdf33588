import { declarationsOf } from '../declarations';
import { namesIn } from '../expression/names-in';
import type { Branch, FindingResult, FindingStep, Step } from '../procedure-document';
import { KnownValues } from './known-values';
import { stepWords, wayWords, type LintFinding, type LintSubject } from './lint-finding';
import { askedFor } from './named-values';
import type { RunPlace } from './run-graph';
import { isWithoutReading, wayWithout } from './way-without';

/**
 * Decisions whose `otherwise` names a finding though, after an earlier "cannot measure", a condition before it could
 * not be told: what was never measured must not end in a verdict. A finding that leaves the matter open may be named.
 */
export function verdictsWithoutReading(subject: LintSubject): readonly LintFinding[] {
  const suspects = suspectsOf(subject);
  if (suspects.size === 0) return [];
  const findings = new Map<string, LintFinding>();
  for (const graph of subject.graphs) {
    const measured = new KnownValues(graph, subject, 'measured');
    let asked: KnownValues | undefined;
    for (const place of graph.places) {
      const suspect = suspects.get(place.step);
      if (suspect === undefined || !measured.isReached(place)) continue;
      for (const { name, branch } of untold(place, suspect, measured, subject)) {
        const key = `${place.step.id} ${name}`;
        asked ??= new KnownValues(graph, subject);
        // Where nothing asks for it at all, the value is used before it is there, which is another rule's.
        if (findings.has(key) || !asked.knows(name, place, 'at-ways')) continue;
        const way = wayWords(wayWithout(graph, place, name, isWithoutReading));
        findings.set(key, finding(place, name, branch, suspect, way));
      }
    }
  }
  return [...findings.values()];
}

/** A decision that ends in a verdict by default, and the values that it turns on and does not take itself. */
interface Suspect {
  readonly verdict: FindingStep;
  readonly branches: readonly Branch[];
  readonly names: readonly string[];
}

/** Whether a finding says how it is; one that is too close to call, or judges nothing, leaves the matter open. */
function isVerdict(result: FindingResult): boolean {
  return result !== 'too-close' && result !== 'not-judged';
}

function suspectsOf({ document, trees }: LintSubject): ReadonlyMap<Step, Suspect> {
  const verdicts = new Map(
    document.steps.flatMap((step) =>
      step.kind === 'finding' && isVerdict(step.result) ? [[step.id, step] as const] : [],
    ),
  );
  const { declarations } = declarationsOf(document);
  const suspects = new Map<Step, Suspect>();
  for (const step of document.steps) {
    if (step.kind === 'finding') continue;
    const verdict = verdicts.get(step.otherwise.verdict ?? step.otherwise.to);
    const branches = step.next ?? [];
    if (verdict === undefined || branches.length === 0) continue;
    const own = new Set(askedFor(step));
    const named = branches.flatMap(({ when }) => {
      const tree = trees.get(when);
      return tree === undefined ? [] : namesIn(tree);
    });
    const names = [...new Set(named)].filter((name) => {
      const declared = declarations.get(name);
      return declared?.kind === 'quantity' && declared.step !== undefined && !own.has(name);
    });
    if (names.length > 0) suspects.set(step, { verdict, branches, names });
  }
  return suspects;
}

/** The values that may be missing, each with the first branch that cannot be told without it. */
function untold(
  place: RunPlace,
  { branches, names }: Suspect,
  measured: KnownValues,
  { trees }: LintSubject,
): readonly { readonly name: string; readonly branch: number }[] {
  return names.flatMap((name) => {
    if (measured.knows(name, place, 'at-ways')) return [];
    const without = branches.map(({ when }) => {
      const tree = trees.get(when);
      return tree === undefined ? 'open' : measured.truthWithout(tree, name, place);
    });
    const branch = without.indexOf('missing');
    // A branch that holds just because nothing was measured is the honest exit.
    return branch < 0 || without.includes('holds') ? [] : [{ name, branch }];
  });
}

function finding(place: RunPlace, name: string, branch: number, { verdict }: Suspect, way: string): LintFinding {
  const { step } = place;
  const message = `${stepWords(step)}, otherwise: names the finding "${verdict.title}" also where ${name} could not be measured, on the way ${way}: branch ${branch + 1} cannot be told then. Put a branch \`not measured(${name})\` with a way of its own before it.`;
  return { rule: 'one-exit', step: step.id, pointer: `/steps/${place.place}/otherwise`, message };
}
