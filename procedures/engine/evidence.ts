import type { CompiledProcedure, Step } from '../document';
import { namesRead } from './deciding';
import { own } from './environment';
import type { RunEvent } from './run-event';
import type { BranchTaken, NamedValue, RunState, WalkedStep } from './run-state';
import { exitsOf } from './ways-on';
import { lowerFirst } from './within-a-sentence';

/** One thing that a finding rests on: a measured value, or what a person saw, heard or could not do, in words. */
export type Evidence =
  | { readonly kind: 'value'; readonly value: NamedValue }
  | { readonly kind: 'observation'; readonly step: string; readonly label: string; readonly text: string };

/** What a run holds for its finding: what led to it, the newest decision first, and every other judged value. */
export interface FindingEvidence {
  readonly led: readonly Evidence[];
  /** Newest first. */
  readonly rest: readonly NamedValue[];
}

type Decided = WalkedStep & { readonly way: BranchTaken };
interface Place {
  readonly step: Step;
  readonly claim: Decided;
}

/**
 * The evidence of the finding that was reached: what the rules read by which the run came there, out of the decisions
 * that told something apart. What was decided after no rule could name a finding any more (codes, the road test) is
 * no evidence of it.
 */
export function evidenceOf(
  procedure: CompiledProcedure,
  state: RunState,
  events: readonly RunEvent[],
): FindingEvidence {
  const places = state.walked.flatMap((claim): readonly Place[] => {
    const step = procedure.step(claim.step);
    return step === undefined || claim.way === undefined || claim.isLeft === true
      ? []
      : [{ step, claim: { ...claim, way: claim.way } }];
  });
  const named = places.findLastIndex(({ claim }) => claim.way.verdict === state.finding);
  const last = Math.max(
    named,
    places.findLastIndex(({ step }) => canName(procedure, step)),
  );
  const decisive = places.slice(0, last + 1).filter(({ step, claim }) => tellsApart(procedure, step, claim.way));
  const led = new Map<string, Evidence>();
  for (const { step, claim } of decisive.reverse()) {
    for (const evidence of evidenceAt(procedure, state, events, { step, claim })) {
      const key = evidence.kind === 'value' ? evidence.value.name : `${evidence.step}: ${evidence.label}`;
      if (!led.has(key)) led.set(key, evidence);
    }
  }
  const rest = Object.values(state.values)
    .filter(({ name, judgement }) => judgement !== undefined && !led.has(name))
    .sort((a, b) => b.seq - a.seq);
  return { led: [...led.values()], rest };
}

/** Whether one of the step's rules names a finding. */
function canName(procedure: CompiledProcedure, step: Step): boolean {
  return rulesOf(procedure, step).some(({ verdict }) => verdict !== undefined);
}

/** The exits that the step's own rules lead to, without the honest ways out. */
function rulesOf(procedure: CompiledProcedure, step: Step) {
  return exitsOf(procedure, step).filter(({ exit }) => exit !== 'cannot-measure' && exit !== 'stop');
}

/** A way that the step's `otherwise` shares with other rules says nothing, unless a person was asked there. */
function tellsApart(procedure: CompiledProcedure, step: Step, way: BranchTaken): boolean {
  if (way.verdict !== undefined || way.exit === 'stop' || way.exit === 'cannot-measure') return true;
  if (step.kind === 'choice') return true;
  const rules = rulesOf(procedure, step);
  const usual = rules.find(({ exit }) => exit === 'otherwise');
  const taken = rules.find(({ exit }) => exit === way.exit);
  const isUsual = taken?.to === usual?.to && usual?.verdict === undefined;
  return !isUsual || rules.filter(({ to, verdict }) => to === usual?.to && verdict === undefined).length === 1;
}

function evidenceAt(
  procedure: CompiledProcedure,
  state: RunState,
  events: readonly RunEvent[],
  { step, claim }: Place,
): readonly Evidence[] {
  const { way } = claim;
  if (way.exit === 'stop' || way.exit === 'cannot-measure') return [endedAt(events, step, claim)];
  const said = step.kind === 'choice' ? observationAt(state, step) : undefined;
  const isKnownThen = (from: string): boolean =>
    state.walked.some((walked) => walked.step === from && walked.claimedSeq < way.seq);
  const read = namesRead(procedure, step, way.exit).flatMap((name) => {
    const from = (own(state.values, name) ?? own(state.truths, name))?.step;
    return from !== undefined && isKnownThen(from) ? (evidenceNamed(procedure, state, name) ?? []) : [];
  });
  return said === undefined ? read : [said, ...read];
}

/** Where and why the test was ended before its time. */
function endedAt(events: readonly RunEvent[], { number, title }: Step, claim: Decided): Evidence {
  const { claimedSeq, way } = claim;
  const within = events.filter(({ seq }) => seq > claimedSeq && seq <= way.seq);
  const said = within
    .flatMap((event) => (event.type === 'not-measurable' || event.type === 'stopped' ? [event.data.reason] : []))
    .at(-1);
  const reason = way.reason ?? said;
  const what = way.exit === 'stop' ? 'stopped' : 'cannot be measured';
  const text = reason === undefined || reason === '' ? what : `${what}: ${reason}`;
  return { kind: 'observation', step: claim.step, label: `Step ${number}, ${lowerFirst(title)}`, text };
}

function evidenceNamed(procedure: CompiledProcedure, state: RunState, name: string): Evidence | undefined {
  const value = own(state.values, name);
  if (value !== undefined) return { kind: 'value', value };
  const truth = own(state.truths, name);
  const step = truth === undefined ? undefined : procedure.step(truth.step);
  if (truth === undefined || step === undefined) return undefined;
  const label = procedure.declared(name)?.label ?? name;
  return observationAt(state, step) ?? { kind: 'observation', step: step.id, label, text: truth.holds ? 'yes' : 'no' };
}

/** What a person observed in a step: the options chosen and what was written beside them, or what was heard. */
function observationAt(state: RunState, step: Step): Evidence | undefined {
  if (step.kind === 'listen') {
    return { kind: 'observation', step: step.id, label: 'Noise at the probe', text: noiseWords(state, step.name) };
  }
  if (step.kind !== 'choice' && step.kind !== 'drive') return undefined;
  const choice = own(state.choices, step.name);
  if (choice === undefined) return undefined;
  const said = choice.labels.map((label, index) => (index === 0 ? label : lowerFirst(label))).join(', ');
  const text = choice.text === undefined ? said : `${said}: ${choice.text}`;
  return { kind: 'observation', step: step.id, label: step.title, text };
}

function noiseWords(state: RunState, series: string): string {
  const marks = own(state.series, series)?.marks ?? {};
  if (marks['noise-stops'] !== undefined) return 'heard, and it stopped';
  return marks['noise-begins'] === undefined ? 'none was heard' : 'heard, and it never stopped';
}
