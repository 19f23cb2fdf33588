import { readsOf, type Step } from '../../../procedures/document';
import type { RunCommand, Series } from '../../../procedures/engine';
import { importOf } from '../../support/ramp-file';
import type { RunModel } from './run-model';

/** What a person may do, right or wrong. */
export const acts = [
  'answer',
  'answer',
  'answer',
  'answer',
  'answer',
  'answer',
  'answer',
  'answer',
  'cautions',
  'confirm',
  'read',
  'choose',
  'stop',
  'go-back',
  'end',
  'set-aside',
  'resume',
  'acknowledge-limit',
  'cannot-measure',
  'not-applicable',
  'redo',
  'overrule',
  'close',
  'release',
  'verify',
  'take-back',
  'restore',
  'start-timer',
  'end-timer',
  'mark',
  'codes',
] as const;

export type Act = (typeof acts)[number];

/** A ramp to 7 kPa, from rest. */
const quiet: Series = {
  timeS: [0, 10, 20, 30],
  channels: [{ name: 'gauge', unit: 'kPa', values: [0, 2, 4, 7] }],
};

/** Readings in and out of the band, near its ends, over the limits of a called procedure and of the run. */
const pressures = ['3.0', '5.4', '5.6', '10.0', '14.0', '18.0', '20.4', '25.0', '33.0', '40.0'];

/** The command that an act comes to where the run stands. */
export function commandOf(model: RunModel, act: Act, pick: number): RunCommand {
  const { state, currentStep: step } = model;
  switch (act) {
    case 'answer':
      return state.hasAlarm ? { do: 'acknowledge-limit' } : answerAt(model, step, pick);
    case 'cautions':
      return { do: 'acknowledge-caution', caution: pick % 2 };
    case 'read':
      return takeOf(model, step === undefined ? 'r0' : (readsOf(step)[pick % 2]?.name ?? 'r0'), pick);
    case 'choose':
      return { do: 'choose', options: [pick % 2 === 0 ? 'o0a' : 'd1'] };
    case 'stop':
      return { do: 'stop', reason: 'a hose moved' };
    case 'go-back':
    case 'end':
      return { do: 'leave-stop', how: act === 'end' ? 'not-completed' : 'go-back' };
    case 'set-aside':
      return { do: 'set-aside', reason: 'phone call' };
    case 'cannot-measure':
    case 'not-applicable':
      return { do: act, reason: 'it is not there' };
    case 'redo':
      return { do: 'redo', step: state.walked[pick % state.walked.length]?.step ?? '', reason: 'a slip' };
    case 'overrule': {
      const last = state.walked.findLast(({ way, isLeft }) => way !== undefined && isLeft !== true);
      const exits = last === undefined ? [] : model.exitsOf(model.step(last.step));
      return { do: 'overrule', exit: exits[pick % Math.max(1, exits.length)]?.name ?? 'otherwise', reason: 'seen' };
    }
    case 'release':
      return { do: 'release', role: 'lead', evidence: 'seen' };
    case 'verify':
      return { do: 'verify', by: 'brandt' };
    case 'take-back':
      return { do: 'take-back', name: Object.keys(state.current?.takes ?? {})[0] ?? 'r0', reason: 'a slip' };
    case 'restore':
      return { do: 'restore', item: state.disturbed[pick % Math.max(1, state.disturbed.length)]?.item ?? 'item0' };
    case 'end-timer':
      return { do: 'end-timer', certain: pick % 3 > 0 };
    case 'mark':
      return { do: 'mark', mark: 'noise-begins', timeS: 2, by: 'tap' };
    case 'codes':
      return { do: 'record-codes', codes: [] };
    default:
      return { do: act };
  }
}

function answerAt(model: RunModel, step: Step | undefined, pick: number): RunCommand {
  const { current, series, given } = model.state;
  if (model.state.status === 'stopped') return { do: 'leave-stop', how: 'go-back' };
  if (model.state.status === 'set-aside') return { do: 'resume' };
  if (step === undefined || current === undefined) {
    // Mostly the run goes on from its finding: a closed one takes nothing any more.
    if (pick % 8 === 0) return { do: 'close' };
    return { do: 'redo', step: model.state.walked[pick % model.state.walked.length]?.step ?? '', reason: 'again' };
  }
  const unseen = Array.from({ length: model.cautions(step) }, (_, index) => index).find(
    (n) => !current.seen.includes(n),
  );
  if (unseen !== undefined) return { do: 'acknowledge-caution', caution: unseen };
  if (step.verify !== undefined && !current.isVerified && pick % 2 === 0) return { do: 'verify', by: 'brandt' };
  if (step.release !== undefined && !current.isReleased && pick % 2 === 0) {
    return { do: 'release', role: 'lead', evidence: 'seen' };
  }
  switch (step.kind) {
    case 'reading':
    case 'wait':
    case 'hold':
      return readOrTime(model, step, pick);
    case 'choice':
      if (given[step.name] === step.id) return { do: 'confirm' };
      return { do: 'choose', options: [step.options[pick % step.options.length]?.name ?? ''] };
    case 'drive':
      if (given[step.name] === step.id) return { do: 'confirm' };
      return { do: 'choose', options: step.windows.slice(0, pick % 2).map(({ name }) => name) };
    case 'codes':
      if (given[step.name] === step.id) return { do: 'confirm' };
      return { do: 'record-codes', codes: pick % 2 === 0 ? [] : [{ code: 'P0068', status: 'stored' }] };
    case 'photo':
      if (given[step.name] === step.id) return { do: 'confirm' };
      return { do: 'attach-photo', sha256: 'ab'.repeat(32), bytes: 10, mediaType: 'image/jpeg' };
    case 'ramp':
    case 'listen':
      if (series[step.name]?.isKept !== true) return importOf(quiet, 'ramp.csv');
      if (step.kind === 'listen' && pick % 3 === 0) {
        return {
          do: 'mark',
          mark: pick % 2 === 0 ? 'noise-begins' : 'noise-stops',
          timeS: pick % 2 === 0 ? 2 : 20,
          by: 'tap',
        };
      }
      return { do: 'finish-listening', series: quiet };
    case 'restore': {
      const [first] = model.dueAt(step);
      return first === undefined ? { do: 'confirm' } : { do: 'restore', item: first.item };
    }
    default:
      return { do: 'confirm' };
  }
}

function readOrTime(
  model: RunModel,
  step: Extract<Step, { kind: 'reading' | 'wait' | 'hold' }>,
  pick: number,
): RunCommand {
  const { current, values } = model.state;
  const missing = readsOf(step).find(({ name }) => values[name]?.step !== step.id);
  const isTimed = step.kind === 'hold' || (step.kind === 'wait' && step.atLeastSeconds !== undefined);
  const isEnd = step.kind === 'hold' && missing !== undefined && (step.ends ?? []).includes(missing);
  if (isTimed && current?.timer !== 'over' && (missing === undefined || isEnd)) {
    return current?.timer === 'running' ? { do: 'end-timer', certain: pick % 4 > 0 } : { do: 'start-timer' };
  }
  if (missing === undefined) {
    return step.kind === 'wait'
      ? { do: 'record', name: readsOf(step)[0]?.name ?? '', text: '10.0', unit: 'kPa' }
      : { do: 'confirm' };
  }
  return takeOf(model, missing.name, pick);
}

/** Takes of one claim are alike: their spread is no part of the model's uncertainty. */
function takeOf(model: RunModel, name: string, pick: number): RunCommand {
  const earlier = model.state.current?.takes[name]?.[0];
  return earlier === undefined ? readingOf(name, pick) : { do: 'record', name, text: earlier.toFixed(1), unit: 'kPa' };
}

function readingOf(name: string, pick: number): RunCommand {
  return { do: 'record', name, text: pressures[pick % pressures.length] ?? '10.0', unit: 'kPa' };
}
