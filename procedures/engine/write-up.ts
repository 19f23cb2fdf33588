import type { CompiledProcedure, FindingStep, Sentence } from '../document';
import { endedBefore } from './ended-before';
import { environmentOf, own } from './environment';
import { truthOf } from './judge-quantity';
import { readQuantity, wayOf } from './quantities';
import type { ChosenInstrument, RunState } from './run-state';
import { endStop } from './sentence-end';
import { renderCited, shownUnit, type Citation, type RenderedTemplate } from './template';

/** One part of a write-up, sentence by sentence with what each one rests on. */
export interface WriteUpPart {
  readonly text: string;
  readonly sentences: readonly { readonly text: string; readonly cites: readonly Citation[] }[];
}

export interface WriteUp {
  readonly concern: WriteUpPart;
  readonly cause: WriteUpPart;
  readonly correction: WriteUpPart;
  readonly customer: WriteUpPart;
  readonly deference: string;
}

export const writeUpParts = ['concern', 'cause', 'correction', 'customer'] as const;

/**
 * Composes concern, cause and correction from what was measured. Each number stands with the step that it comes from;
 * a sentence whose value was never measured, or whose condition does not hold, is left out.
 */
export function composeWriteUp(procedure: CompiledProcedure, state: RunState): WriteUp {
  const finding = state.finding === undefined ? undefined : procedure.step(state.finding);
  const authored: Pick<FindingStep, 'cause' | 'correction' | 'customer'> =
    finding?.kind === 'finding' ? finding : { cause: [], correction: [], customer: [] };
  const verdict: Sentence[] = finding?.kind === 'finding' ? [{ text: finding.verdict }] : [];
  return {
    concern: part(procedure, state, [...concernOf(state), ...codesOf(procedure)], true),
    cause: joined([
      ...rendered(procedure, state, verdict, true),
      ...endedBefore(procedure, state),
      ...rendered(procedure, state, [...authored.cause, ...limitsOf(procedure, state)], true),
    ]),
    correction: part(procedure, state, [...authored.correction, ...testedBy(procedure, state)], true),
    customer: part(procedure, state, authored.customer, false),
    deference: procedure.document.deference,
  };
}

function concernOf(state: RunState): readonly Sentence[] {
  const { visit } = state;
  const odometer = `${inThousands(visit.odometer.text)} ${visit.odometer.unit}`;
  return [{ text: `${visit.car}, RO ${visit.repairOrder}, ${odometer}: ${endStop(visit.concern)}` }];
}

/** The first codes step tells what stood before anything was touched. */
function codesOf(procedure: CompiledProcedure): readonly Sentence[] {
  const first = procedure.document.steps.find((step) => step.kind === 'codes');
  return first === undefined ? [] : [{ text: `Trouble codes before the test: {${first.name}}.` }];
}

function testedBy(procedure: CompiledProcedure, state: RunState): readonly Sentence[] {
  const instruments = procedure.document.gear.flatMap(({ role }) => {
    const instrument = own(state.gear, role);
    return instrument !== undefined && isUsed(procedure, state, role) ? [instrumentWords(instrument)] : [];
  });
  const gear = instruments.length === 0 ? '' : ` with ${instruments.join(', ')}`;
  return [{ text: `Tested by ${procedure.document.title}, version ${state.header.version}${gear}.` }];
}

function instrumentWords({ label, dueOn, overdueBecause }: ChosenInstrument): string {
  return overdueBecause === undefined
    ? label
    : `${label} (its check ran out on ${dueOn}; used because: ${overdueBecause})`;
}

/** Each limit that was exceeded: what went over it is kept in the record and was not used. */
function limitsOf(procedure: CompiledProcedure, state: RunState): readonly Sentence[] {
  return state.exceeded.map(({ step, figure }) => ({
    text: `At step ${procedure.step(step)?.number ?? step} the limit was exceeded, ${figure.text} ${shownUnit(figure.unit)}; that was not used.`,
  }));
}

/** Whether the run was done with the gear of a role: it needs it, or a value was read with it. */
function isUsed(procedure: CompiledProcedure, state: RunState, role: string): boolean {
  const need = procedure.document.gear.find((candidate) => candidate.role === role);
  if (need?.optional !== true) return true;
  return Object.values(state.values).some(({ step: id, name, way: wayId }) => {
    const step = procedure.step(id);
    const quantity = step === undefined ? undefined : readQuantity(step, name);
    if (quantity === undefined) return false;
    const way = wayOf(quantity, wayId);
    return way === undefined ? quantity.gear === role : way.entry?.gear === role;
  });
}

function part(
  procedure: CompiledProcedure,
  state: RunState,
  sentences: readonly Sentence[],
  cite: boolean,
): WriteUpPart {
  return joined(rendered(procedure, state, sentences, cite));
}

function rendered(
  procedure: CompiledProcedure,
  state: RunState,
  sentences: readonly Sentence[],
  cite: boolean,
): readonly RenderedTemplate[] {
  const environment = environmentOf(state);
  return sentences
    .filter(({ when }) => when === undefined || truthOf(procedure, when, environment) === true)
    .flatMap(({ text }) => renderCited(procedure, state, text, { cite }) ?? []);
}

function joined(sentences: readonly RenderedTemplate[]): WriteUpPart {
  return { text: sentences.map(({ text }) => text).join(' '), sentences };
}

/** A whole number with a comma between its thousands. */
function inThousands(text: string): string {
  return text.replace(/^\d{4,}/, (digits) => digits.replace(/\B(?=(\d{3})+$)/g, ','));
}
