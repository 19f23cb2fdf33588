import type { CompiledProcedure } from '../document';
import { requireCurrent, requireStep } from './apply-walk';
import { cautionCount } from './cautions';
import { newCodesAgainst } from './compare-codes';
import { own } from './environment';
import { added, withEntry } from './state-changes';
import { RefusedEvent } from './refusal';
import type { EventOf } from './run-event';
import type { RunState } from './run-state';

export function acknowledge(
  procedure: CompiledProcedure,
  state: RunState,
  event: EventOf<'caution-acknowledged'>,
): RunState {
  const current = requireCurrent(state, event.data.step);
  const step = requireStep(procedure, current.id);
  if (event.data.caution >= cautionCount(procedure, step)) {
    throw new RefusedEvent('unknown-name', `step ${step.number} has no caution ${event.data.caution}`);
  }
  const acknowledged = [...new Set([...current.acknowledged, event.data.caution])];
  return { ...state, current: { ...current, acknowledged } };
}

export function recordCodes(procedure: CompiledProcedure, state: RunState, event: EventOf<'codes-recorded'>): RunState {
  const codesStep = requireStep(procedure, event.data.step);
  requireCurrent(state, codesStep.id);
  if (codesStep.kind !== 'codes' || codesStep.name !== event.data.name) {
    throw new RefusedEvent('unknown-name', `step ${codesStep.number} takes no codes ${event.data.name}`);
  }
  const entry = { step: codesStep.id, seq: event.seq, codes: event.data.codes };
  const earlier = codesStep.comparedWith === undefined ? undefined : own(state.codes, codesStep.comparedWith);
  const codes = withEntry(state.codes, codesStep.name, entry);
  if (codesStep.newCodes === undefined) return { ...state, codes };
  const holds = newCodesAgainst(earlier?.codes ?? [], event.data.codes).length > 0;
  const truth = { holds, step: codesStep.id, seq: event.seq };
  return { ...state, codes, truths: withEntry(state.truths, codesStep.newCodes, truth) };
}

export function runTimer(state: RunState, event: EventOf<'timer-started'> | EventOf<'timer-ended'>): RunState {
  const current = requireCurrent(state, event.data.step);
  if (event.type === 'timer-started') {
    const timer = {
      startedAt: event.at,
      startedElapsed: event.elapsed,
      seconds: event.data.seconds,
      ended: false,
      certain: true,
    };
    return { ...state, current: { ...current, timer } };
  }
  if (current.timer === undefined) throw new RefusedEvent('not-done', 'the timer was never started');
  return { ...state, current: { ...current, timer: { ...current.timer, ended: true, certain: event.data.certain } } };
}

export function makeChoice(procedure: CompiledProcedure, state: RunState, event: EventOf<'choice-made'>): RunState {
  const { step: stepId, name, options, text } = event.data;
  const chosen = requireStep(procedure, stepId);
  requireCurrent(state, stepId);
  if ((chosen.kind !== 'choice' && chosen.kind !== 'drive') || chosen.name !== name) {
    throw new RefusedEvent('unknown-name', `step ${chosen.number} takes no choice ${name}`);
  }
  const offered = chosen.kind === 'choice' ? chosen.options : chosen.windows;
  if (options.some((option) => !offered.some((candidate) => candidate.name === option))) {
    throw new RefusedEvent('unknown-name', `step ${chosen.number} does not offer that option`);
  }
  const truths = offered.reduce((record, option) => {
    const holds = options.includes(option.name);
    return withEntry(record, option.name, { holds, step: stepId, seq: event.seq });
  }, state.truths);
  const labels = offered.filter((option) => options.includes(option.name)).map((option) => option.label);
  const choice = { step: stepId, seq: event.seq, options, labels, ...(text === undefined ? {} : { text }) };
  return { ...state, truths, choices: withEntry(state.choices, name, choice) };
}

export function keepPhoto(procedure: CompiledProcedure, state: RunState, event: EventOf<'photo-attached'>): RunState {
  const { step: stepId, sha256, mediaType } = event.data;
  const step = requireStep(procedure, stepId);
  // Evidence of any other step is kept and shown, and asks nothing of the run.
  if (step.kind !== 'photo') return state;
  requireCurrent(state, stepId);
  const photos = added(own(state.photos, step.name)?.photos ?? [], { seq: event.seq, sha256, mediaType });
  return { ...state, photos: withEntry(state.photos, step.name, { step: stepId, seq: event.seq, photos }) };
}

export function disturb(procedure: CompiledProcedure, state: RunState, event: EventOf<'disturbed'>): RunState {
  const { step: stepId, item, label } = event.data;
  requireCurrent(state, stepId);
  const declared = requireStep(procedure, stepId).disturbs?.find((candidate) => candidate.item === item);
  if (declared === undefined) throw new RefusedEvent('unknown-name', `${item} is not disturbed by that step`);
  const rest = state.disturbed.filter((candidate) => candidate.item !== item);
  return { ...state, disturbed: [{ item, label, restore: declared.restore, step: stepId, seq: event.seq }, ...rest] };
}

export function restore(state: RunState, { data: { item } }: EventOf<'restored'>): RunState {
  const disturbed = state.disturbed.filter((candidate) => candidate.item !== item);
  if (disturbed.length === state.disturbed.length) {
    throw new RefusedEvent('unknown-name', `${item} is not disturbed: it cannot be put back`);
  }
  return { ...state, disturbed };
}

export function chooseGear(procedure: CompiledProcedure, state: RunState, event: EventOf<'gear-chosen'>): RunState {
  const { role, instrument, overdueBecause } = event.data;
  const need = procedure.document.gear.find((candidate) => candidate.role === role);
  if (need?.kind !== instrument.kind) {
    throw new RefusedEvent('unknown-name', `the procedure asks for no ${instrument.kind} as ${role}`);
  }
  const chosen = { ...instrument, seq: event.seq, ...(overdueBecause === undefined ? {} : { overdueBecause }) };
  return { ...state, gear: { ...state.gear, [role]: chosen } };
}
