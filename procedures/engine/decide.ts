import type { CompiledProcedure, Step } from '../document';
import { isSeriesStep } from '../document/step-parts';
import { cautionCount } from './cautions';
import { isComplete, recordTake, takeBack } from './decide-readings';
import { finishListening, importSeries, placeMark, takeMarkAway } from './decide-listening';
import { close, keepWriteUp, leavePause, leaveStop, overrule, pause, redo } from './decide-run';
import { chooseGear, requireGear } from './decide-gear';
import { CannotDo, Drafting } from './drafting';
import { startTimer, endTimer } from './decide-timer';
import { attachPhoto } from './decide-photo';
import { completeStep, passOver } from './go-on';
import { requireNothingDue, restore } from './restoring';
import { release, verify } from './decide-second-person';
import { own } from './environment';
import { wrongKind } from './wrong-kind';
import { requireCautions } from './require-cautions';
import { exitsOf } from './ways-on';
import type { Outcome, RunCommand } from './run-command';
import { RefusedEvent } from './refusal';
import type { RunState } from './run-state';
import { waitsForSomebody } from './waits-for-somebody';

/** What may be done while the run waits, before its current step's cautions, or under an alarm. */
const always: ReadonlySet<RunCommand['do']> = new Set([
  'stop',
  'note',
  'resume',
  'leave-stop',
  'set-aside',
  'acknowledge-limit',
]);
const beforeCautions: ReadonlySet<RunCommand['do']> = new Set([
  ...always,
  'acknowledge-caution',
  'choose-gear',
  'not-sure',
  'redo',
  'overrule',
  'cannot-measure',
  'not-applicable',
  'verify',
  'restore',
  'keep-write-up',
  'close',
  'unmark',
]);

/**
 * Decides what a command means as the run stands: the events to write, in order, or why it cannot be done, in words
 * that say how to go on. Writes nothing; `at` is the device's clock, by which readings that hold for a while are told
 * from those that no longer do.
 */
export function decide(procedure: CompiledProcedure, state: RunState, command: RunCommand, at?: number): Outcome {
  const drafting = new Drafting(procedure, state, at);
  try {
    requireOpen(state, command);
    perform(drafting, command);
    return { ok: true, drafts: drafting.drafts };
  } catch (error) {
    if (error instanceof CannotDo) {
      const { code, message, field, takeAgain } = error;
      return {
        ok: false,
        code,
        message,
        ...(field === undefined ? {} : { field }),
        ...(takeAgain === undefined ? {} : { takeAgain }),
      };
    }
    // The reducer refuses what has no place in the run; a RangeError is a figure outside of a calculation's range.
    if (error instanceof RefusedEvent || error instanceof RangeError) {
      return { ok: false, code: 'refused', message: `This cannot be done here: ${error.message}.` };
    }
    throw error;
  }
}

function requireOpen(state: RunState, command: RunCommand): void {
  if (state.status === 'closed' || state.status === 'signed') {
    throw new CannotDo('closed', 'The run is closed. What is to be added now is an amendment.');
  }
  if (state.alarm !== undefined && command.do !== 'acknowledge-limit' && command.do !== 'stop') {
    throw new CannotDo('alarm', `${state.alarm.says} ${state.alarm.then} Acknowledge it first.`);
  }
  if (state.status !== 'open' && !always.has(command.do)) {
    throw new CannotDo('not-open', 'The run is not open: go back to its step first.');
  }
}

function perform(drafting: Drafting, command: RunCommand): void {
  switch (command.do) {
    case 'note':
      return note(drafting, command);
    case 'stop':
    case 'set-aside':
    case 'not-sure':
      return pause(drafting, command);
    case 'resume':
      return leavePause(drafting);
    case 'leave-stop':
      return leaveStop(drafting, command);
    case 'acknowledge-limit':
      return acknowledgeLimit(drafting);
    case 'redo':
      return redo(drafting, command);
    case 'overrule':
      return overrule(drafting, command);
    case 'restore':
      return restore(drafting, command.item);
    case 'keep-write-up':
      return keepWriteUp(drafting, command);
    case 'close':
      return close(drafting);
    default:
      return performInStep(drafting, command);
  }
}

function performInStep(drafting: Drafting, command: RunCommand): void {
  const step = currentStep(drafting);
  if (!beforeCautions.has(command.do)) requireCautions(drafting, step);
  switch (command.do) {
    case 'acknowledge-caution':
      return acknowledgeCaution(drafting, step, command.caution);
    case 'choose-gear':
      return chooseGear(drafting, command);
    case 'confirm':
      return confirm(drafting, step);
    case 'record':
      return recordTake(drafting, step, command);
    case 'take-back':
      return takeBack(drafting, command);
    case 'choose':
      return choose(drafting, step, command);
    case 'record-codes':
      if (step.kind !== 'codes') throw wrongKind(step);
      drafting.add({ type: 'codes-recorded', data: { step: step.id, name: step.name, codes: command.codes } });
      return waitsForSomebody(step, drafting.state.current) === undefined ? completeStep(drafting, step) : undefined;
    case 'attach-photo':
      return attachPhoto(drafting, step, command);
    case 'start-timer':
      return startTimer(drafting, step);
    case 'end-timer':
      return endTimer(drafting, step, command.certain);
    case 'release':
      return release(drafting, step, command);
    case 'verify':
      return verify(drafting, step, command);
    case 'cannot-measure':
      return cannotMeasure(drafting, step, command.reason);
    case 'not-applicable':
      return notApplicable(drafting, step, command.reason);
    case 'import-series':
      if (!isSeriesStep(step)) throw wrongKind(step);
      return importSeries(drafting, step, command);
    case 'mark':
      if (step.kind !== 'listen') throw wrongKind(step);
      return placeMark(drafting, step, command);
    case 'unmark':
      if (step.kind !== 'listen') throw wrongKind(step);
      return takeMarkAway(drafting, step, command.mark);
    case 'finish-listening':
      if (!isSeriesStep(step)) throw wrongKind(step);
      return finishListening(drafting, step, command.series);
    default:
      throw wrongKind(step);
  }
}

function currentStep(drafting: Drafting): Step {
  const { current } = drafting.state;
  const step = current === undefined ? undefined : drafting.procedure.step(current.id);
  if (step === undefined)
    throw new CannotDo('no-step', 'The run has reached its finding: nothing is left to do in a step.');
  return step;
}

function acknowledgeCaution(drafting: Drafting, step: Step, caution: number): void {
  if (!Number.isInteger(caution) || caution < 0 || caution >= cautionCount(drafting.procedure, step)) {
    throw new CannotDo('no-caution', `Step ${step.number} has no such caution.`);
  }
  if (drafting.state.current?.acknowledged.includes(caution)) return;
  drafting.add({ type: 'caution-acknowledged', data: { step: step.id, caution } });
}

function confirm(drafting: Drafting, step: Step): void {
  switch (step.kind) {
    case 'start':
      requireGear(drafting);
      return completeStep(drafting, step);
    case 'action':
    case 'compute':
    case 'call':
      return completeStep(drafting, step);
    case 'restore':
      requireNothingDue(drafting, step);
      return completeStep(drafting, step);
    case 'photo':
      if (own(drafting.state.photos, step.name) === undefined) {
        throw new CannotDo(
          'no-photo',
          `Take a photo first: ${step.shows.join(' ')} If it cannot be taken, say so below.`,
        );
      }
      return completeStep(drafting, step);
    case 'hold':
    case 'reading':
    case 'wait':
      if (!isComplete(drafting, step)) throw new CannotDo('not-complete', 'Enter what the step asks for first.');
      return completeStep(drafting, step);
    case 'choice':
    case 'drive':
    case 'codes':
      // Only what had to wait for somebody is entered and not done.
      if (!isEntered(drafting.state, step)) {
        throw new CannotDo('not-complete', 'Enter what the step asks for first.');
      }
      return completeStep(drafting, step);
    default:
      throw new CannotDo('not-complete', 'Enter what the step asks for first.');
  }
}

function isEntered({ codes, choices }: RunState, step: Extract<Step, { kind: 'choice' | 'drive' | 'codes' }>): boolean {
  return own<object>(step.kind === 'codes' ? codes : choices, step.name) !== undefined;
}

function choose(drafting: Drafting, step: Step, { options, text }: Extract<RunCommand, { do: 'choose' }>): void {
  if (step.kind !== 'choice' && step.kind !== 'drive') throw wrongKind(step);
  if (step.kind === 'choice') {
    if (options.length === 0)
      throw new CannotDo('choose-one', 'Choose what you see. If it cannot be seen, say so below.', 'options');
    if (options.length > 1 && step.several !== true) throw new CannotDo('choose-one', 'Choose one only.', 'options');
    const alone = step.options.find((option) => option.alone === true && options.includes(option.name));
    if (alone !== undefined && options.length > 1) {
      throw new CannotDo('choose-one', `"${alone.label}" cannot be true beside another one: choose again.`, 'options');
    }
    const asked = step.options.find((option) => options.includes(option.name) && option.ask !== undefined);
    if (asked?.ask !== undefined && (text ?? '').trim() === '') throw new CannotDo('say-which', asked.ask, 'text');
  }
  const words = (text ?? '').trim();
  drafting.add({
    type: 'choice-made',
    data: { step: step.id, name: step.name, options, ...(words === '' ? {} : { text: words }) },
  });
  if (waitsForSomebody(step, drafting.state.current) === undefined) completeStep(drafting, step);
}

function cannotMeasure(drafting: Drafting, step: Step, reason: string): void {
  if (!('cannotMeasure' in step))
    throw new CannotDo(
      'wrong-kind',
      'There is nothing to be measured in this step. If it cannot be done, stop the test or ask the lead.',
    );
  const why = reason.trim();
  if (why === '') throw new CannotDo('say-why', 'Say in a few words why it cannot be measured.', 'reason');
  drafting.add({ type: 'not-measurable', data: { step: step.id, reason: why } });
  const exit = exitsOf(drafting.procedure, step).find((candidate) => candidate.exit === 'cannot-measure');
  completeStep(drafting, step, exit);
}

function notApplicable(drafting: Drafting, step: Step, reason: string): void {
  const why = reason.trim();
  if (why === '') throw new CannotDo('say-why', 'Say in a few words why this does not apply to the car.', 'reason');
  if (step.kind === 'start' || step.kind === 'restore' || step.kind === 'call') throw wrongKind(step);
  drafting.add({
    type: 'not-applicable',
    data: { step: step.id, reason: why },
  });
  const exit = exitsOf(drafting.procedure, step).find((candidate) => candidate.exit === 'cannot-measure');
  passOver(drafting, step, exit);
}

function acknowledgeLimit(drafting: Drafting): void {
  const { alarm } = drafting.state;
  if (alarm === undefined) throw new CannotDo('no-alarm', 'No limit is exceeded.');
  drafting.add({ type: 'alert-acknowledged', data: { seq: alarm.seq } });
}

function note(drafting: Drafting, { text, isMargin }: Extract<RunCommand, { do: 'note' }>): void {
  const words = text.trim();
  if (words === '') throw new CannotDo('empty', 'Write the note first.', 'text');
  const step = drafting.state.current?.id ?? drafting.state.finding ?? '';
  drafting.add({ type: isMargin === true ? 'margin-note-written' : 'note-written', data: { step, text: words } });
}
