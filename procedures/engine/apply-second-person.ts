import type { CompiledProcedure } from '../document';
import { requireCurrent, requireStep } from './apply-walk';
import { RefusedEvent } from './refusal';
import type { EventOf } from './run-event';
import type { RunState } from './run-state';

export function applyRelease(procedure: CompiledProcedure, state: RunState, event: EventOf<'released'>): RunState {
  const step = requireStep(procedure, event.data.step);
  const current = requireCurrent(state, step.id);
  const { by } = event.data;
  if (step.release === undefined) throw new RefusedEvent('unknown-name', `step ${step.number} has no release point`);
  if (by !== step.release.by && by !== 'manager') {
    throw new RefusedEvent('not-allowed', `step ${step.number} is released by the ${step.release.by}, not the ${by}`);
  }
  return { ...state, current: { ...current, releasedBy: event.actor } };
}

export function applyVerification(procedure: CompiledProcedure, state: RunState, event: EventOf<'verified'>): RunState {
  const step = requireStep(procedure, event.data.step);
  const current = requireCurrent(state, step.id);
  if (step.verify === undefined)
    throw new RefusedEvent('unknown-name', `step ${step.number} asks for no second person`);
  if (event.data.by === current.claimedBy) {
    throw new RefusedEvent('not-allowed', `step ${step.number} cannot be verified by whoever does it`);
  }
  return { ...state, current: { ...current, verifiedBy: event.data.by } };
}
