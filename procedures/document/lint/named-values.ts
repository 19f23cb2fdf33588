import type { ProcedureDocument, Step } from '../procedure-document';
import { findsOf, isFoundQuantity, isFoundTruth, readsOf, resultsOf, takenOf } from '../step-parts';

/**
 * The names that a step asks for: once it was passed, they can have a value. Whether they do is the run's: what cannot
 * be measured stays without.
 */
export function askedFor(step: Step): readonly string[] {
  return [
    ...readsOf(step).flatMap(({ name, ways }) => [name, ...(ways ?? []).flatMap(({ entry }) => entry?.name ?? [])]),
    ...findsOf(step)
      .filter(isFoundQuantity)
      .map(({ name }) => name),
    ...takenOf(step).map(({ name }) => name),
    ...namedAsWhole(step),
  ];
}

/** What a step keeps as a whole under its own name. */
function namedAsWhole(step: Step): readonly string[] {
  if (step.kind === 'hold') return step.heldAs === undefined ? [] : [step.heldAs];
  return 'name' in step ? [step.name] : [];
}

/** The truths that a step can set; they are false until then. */
export function truthsSetBy(step: Step): readonly string[] {
  switch (step.kind) {
    case 'choice':
      return step.options.map(({ name }) => name);
    case 'drive':
      return step.windows.map(({ name }) => name);
    case 'codes':
      return step.newCodes === undefined ? [] : [step.newCodes];
    case 'listen':
      return step.finds.filter(isFoundTruth).map(({ name }) => name);
    case 'call':
      return step.finds.map(({ name }) => name);
    default:
      return [];
  }
}

/** The names that a run starts with: an input without a default has a value only where the site or the visit has one. */
export function startingNames(document: ProcedureDocument): readonly string[] {
  return document.inputs
    .filter(({ from, default: fallback }) => from === 'site.elevation' || fallback !== undefined)
    .map(({ name }) => name);
}

/** All names that a step can give a value to, its results included. */
export function valueNamesOf(step: Step): readonly string[] {
  return [...askedFor(step), ...resultsOf(step).map(({ name }) => name)];
}

const placeholder = /\{([^{}]*)\}/g;

/** The names in a template: `{name}` stands for a value of the run. */
export function namesInTemplate(template: string): readonly string[] {
  return [...template.matchAll(placeholder)].map((match) => match[1] ?? '');
}

/** What a template can name of the visit, whatever the procedure. */
export const visitNames: readonly string[] = ['concern', 'repairOrder', 'car'];
