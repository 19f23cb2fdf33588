import type { Expression } from '../../expression/expression';
import { namesIn } from '../../expression/names-in';
import type { Branch, ProcedureDocument, Step } from '../../procedure-document';
import { readsOf } from '../../step-parts';
import type { LintSubject } from '../lint-finding';
import { truthsSetBy } from '../named-values';
import { DecisionCases } from './decision-cases';
import type { Beforehand, Group } from './decision-facts';
import { quantityRanges } from './quantity-ranges';

/** A step that decides something, and the cases that it decides between. */
export interface Decision {
  readonly step: Step;
  /** JSON pointer to the step. */
  readonly pointer: string;
  readonly branches: readonly Branch[];
  readonly cases: DecisionCases;
}

/** The decisions of a document whose conditions can all be read. */
export function decisionsOf(subject: LintSubject): readonly Decision[] {
  const { document, trees } = subject;
  const range = quantityRanges(document, trees);
  const choices = exclusiveChoices(document);
  const verdicts = verdictsByPlace(subject);
  const findings = new Set(document.steps.flatMap(({ kind, id }) => (kind === 'finding' ? [id] : [])));
  return document.steps.flatMap((step, place): Decision[] => {
    const branches = step.kind === 'finding' ? [] : (step.next ?? []);
    const conditions = branches.flatMap(({ when }): Expression[] => {
      const tree = trees.get(when);
      return tree === undefined ? [] : [tree];
    });
    if (branches.length === 0 || conditions.length < branches.length) return [];
    const fresh = new Set(readsOf(step).map(({ name }) => name));
    const named = new Set(conditions.flatMap(namesIn));
    const headedFor = verdicts.get(place) ?? new Set([undefined]);
    const beforehand: Beforehand = {
      range,
      isFresh: (name) => fresh.has(name),
      isNever: (name) => findings.has(name) && !headedFor.has(name),
      groups: [
        ...choiceGroups(named, choices, step),
        ...(document.pair === true ? [{ names: ['cold', 'warm'], isOneSure: true }] : []),
        verdictGroup(named, headedFor),
      ],
    };
    return [{ step, pointer: `/steps/${place}`, branches, cases: new DecisionCases(conditions, beforehand) }];
  });
}

interface Choice {
  readonly step: Step;
  readonly names: readonly string[];
}

/** By option: the choices of which one option is chosen, where no other step sets the same ones. */
function exclusiveChoices({ steps }: ProcedureDocument): ReadonlyMap<string, Choice> {
  const setters = new Map<string, number>();
  for (const name of steps.flatMap(truthsSetBy)) setters.set(name, (setters.get(name) ?? 0) + 1);
  const choices = new Map<string, Choice>();
  for (const step of steps) {
    if (step.kind !== 'choice' || step.several === true) continue;
    const names = step.options.map(({ name }) => name);
    if (names.every((name) => setters.get(name) === 1)) for (const name of names) choices.set(name, { step, names });
  }
  return choices;
}

/** A choice is surely made at its own step; elsewhere it may not have been come to. */
function choiceGroups(named: ReadonlySet<string>, choices: ReadonlyMap<string, Choice>, at: Step): readonly Group[] {
  const asked = new Map([...named].flatMap((name) => choices.get(name) ?? []).map(({ step, names }) => [step, names]));
  return [...asked].map(([step, names]) => ({ names, isOneSure: step === at }));
}

/** By place in the document: the findings that a run can head for there; undefined stands for none. */
function verdictsByPlace({ graphs }: LintSubject): ReadonlyMap<number, ReadonlySet<string | undefined>> {
  const verdicts = new Map<number, Set<string | undefined>>();
  for (const { places } of graphs) {
    for (const { place, verdict } of places) {
      const known = verdicts.get(place);
      if (known === undefined) verdicts.set(place, new Set([verdict]));
      else known.add(verdict);
    }
  }
  return verdicts;
}

/** The findings that a condition asks for; one of them is sure where the run heads for no other. */
function verdictGroup(named: ReadonlySet<string>, headedFor: ReadonlySet<string | undefined>): Group {
  const names = [...named].filter((name) => headedFor.has(name));
  return { names, isOneSure: names.length === headedFor.size };
}
