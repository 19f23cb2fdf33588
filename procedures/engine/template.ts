import type { CompiledProcedure } from '../document';
import { own } from './environment';
import type { RunState } from './run-state';
import { lowerFirst } from './within-a-sentence';

/** A number or a choice of the run that a sentence cites. */
export interface Citation {
  readonly name: string;
  readonly step: string;
  readonly stepNumber: string;
  readonly seq: number;
}

export interface RenderedTemplate {
  readonly text: string;
  readonly cites: readonly Citation[];
}

const placeholder = /\{([a-zA-Z][a-zA-Z0-9]*)\}/g;

/**
 * Puts the run's own values into a template: `{name}` becomes value, uncertainty and unit (or the labels of a choice,
 * or the list of codes). With `cite` each is followed by its step. Undefined when one of them was never measured.
 */
export function renderCited(
  procedure: CompiledProcedure,
  state: RunState,
  template: string,
  options: { readonly cite: boolean },
): RenderedTemplate | undefined {
  const cites: Citation[] = [];
  let isWhole = true;
  const text = template.replace(placeholder, (_whole, name: string) => {
    const word = wordsFor(procedure, state, name);
    if (word === undefined) {
      isWhole = false;
      return '';
    }
    if (word.step === undefined) return word.text;
    const stepNumber = procedure.step(word.step)?.number ?? word.step;
    cites.push({ name, step: word.step, stepNumber, seq: word.seq });
    return options.cite ? `${word.text} (step ${stepNumber})` : word.text;
  });
  return isWhole ? { text, cites } : undefined;
}

/** The same without the citations. */
export function renderTemplate(
  procedure: CompiledProcedure,
  state: RunState,
  template: string,
  options: { readonly cite: boolean } = { cite: false },
): string | undefined {
  return renderCited(procedure, state, template, options)?.text;
}

interface Words {
  readonly text: string;
  readonly step?: string;
  readonly seq: number;
}

function wordsFor(procedure: CompiledProcedure, state: RunState, name: string): Words | undefined {
  const value = own(state.values, name);
  if (value !== undefined) {
    const spread = value.uncertaintyText === '0' ? '' : ` \u00b1 ${value.uncertaintyText}`;
    return { text: `${value.text}${spread} ${shownUnit(value.unit)}`.trim(), step: value.step, seq: value.seq };
  }
  const choice = own(state.choices, name);
  if (choice !== undefined) {
    const labels = choice.labels.map(lowerFirst).join(', ');
    const text = choice.text === undefined ? labels : `${labels}: ${choice.text}`;
    return { text: text === '' ? 'none' : text, step: choice.step, seq: choice.seq };
  }
  const codes = own(state.codes, name);
  if (codes !== undefined) {
    const text = codes.codes.map(({ code, status }) => `${code} ${status}`).join(', ');
    return { text: text === '' ? 'no code' : text, step: codes.step, seq: codes.seq };
  }
  const input = own(state.inputs, name);
  if (input !== undefined) return { text: `${input.text} ${shownUnit(input.unit)}`.trim(), seq: 1 };
  const series = own(state.series, name);
  if (series?.record !== undefined)
    return { text: `${series.record.samples} samples`, step: series.step, seq: series.seq };
  const held = heldFor(procedure, state, name);
  if (held !== undefined) return held;
  if (name === 'concern') return { text: state.visit.concern, seq: 1 };
  if (name === 'repairOrder') return { text: state.visit.repairOrder, seq: 1 };
  if (name === 'car') return { text: state.visit.car, seq: 1 };
  return procedure.step(name)?.title === undefined ? undefined : { text: procedure.step(name)?.title ?? '', seq: 1 };
}

/** For how long the newest hold of that name was held; undefined where its clock did not run to the end. */
function heldFor(procedure: CompiledProcedure, state: RunState, name: string): Words | undefined {
  const claim = state.walked.findLast(({ step: id, isLeft, heldSeconds }) => {
    const step = procedure.step(id);
    return step?.kind === 'hold' && step.heldAs === name && isLeft !== true && heldSeconds !== undefined;
  });
  return claim === undefined
    ? undefined
    : { text: `${claim.heldSeconds} s`, step: claim.step, seq: claim.doneSeq ?? claim.claimedSeq };
}

/** A unit as people read it. */
export function shownUnit(unit: string): string {
  return { degC: '\u00b0C', degF: '\u00b0F', '1': '', ohm: '\u03a9', kohm: 'k\u03a9' }[unit] ?? unit;
}
