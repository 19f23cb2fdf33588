import type { CompiledProcedure, Step } from '../../../procedures/document';
import { lowerFirst, shownUnit, type EventOf, type RunEvent, type RunState } from '../../../procedures/engine/showing';
import { clockTime } from '../core/time-words';
import type { Tone } from './story-line';

/** An event in words. */
export interface EventWords {
  readonly what: string;
  readonly words?: string;
  /** The id of the person whom it is about. */
  readonly person?: string;
  readonly tone: Tone;
}

const plain = (what: string, words?: string): EventWords => ({ what, words, tone: 'plain' });
const live = (what: string, words?: string): EventWords => ({ what, words, tone: 'live' });
const out = (what: string, words?: string): EventWords => ({ what, words, tone: 'out' });

/** Which limit a person acknowledged, by the state before they did. */
export function acknowledged(procedure: CompiledProcedure, before: RunState | undefined): EventWords {
  const alarm = before?.alarm;
  if (alarm === undefined) return plain('Acknowledged');
  const { text, unit } = alarm.figure;
  const number = procedure.step(alarm.step)?.number ?? alarm.step;
  return plain('Acknowledged', `the limit exceeded at step ${number}, ${text} ${shownUnit(unit)}: ${alarm.then}`);
}

/**
 * Says what an event was, for those that the story tells in words: place-keeping marks, readings, series, codes and
 * photos and ways have lines of their own and give undefined.
 */
export function sayEvent(procedure: CompiledProcedure, event: RunEvent): EventWords | undefined {
  switch (event.type) {
    case 'step-claimed':
    case 'step-done':
    case 'reading-recorded':
    case 'series-recorded':
    case 'codes-recorded':
    case 'photo-attached':
    case 'branch-taken':
    case 'alert-acknowledged':
      return undefined;
    case 'opened':
      return sayOpened(event);
    case 'gear-chosen':
      return sayGear(procedure, event);
    case 'caution-acknowledged':
      return sayCaution(procedure.step(event.data.step), procedure, event.data.caution);
    case 'not-measurable':
      return live('Could not be measured', event.data.reason);
    case 'not-applicable':
      return plain('Does not apply', event.data.reason);
    case 'predicted':
      return plain('Said beforehand', event.data.option);
    case 'mark-placed':
      return sayMark(event);
    case 'timer-started':
      return plain(`Timer of ${event.data.seconds} s started`);
    case 'timer-ended':
      return event.data.certain ? plain('Timer ended') : live('Timer ended, time not certain');
    case 'choice-made':
      return sayChoice(procedure.step(event.data.step), event);
    case 'note-written':
      return plain('Note', event.data.text);
    case 'margin-note-written':
      return plain('Margin note to the lead', event.data.text);
    case 'disturbed':
      return live('Disturbed', event.data.label);
    case 'restored':
      return plain('Restored', labelOfDisturbed(procedure, event.data.item));
    case 'branch-overruled':
      return live('Way overruled by hand', event.data.reason);
    case 'step-redone':
      return live(`Step ${numberOf(procedure, event.data.step)} done again`, event.data.reason);
    case 'undone':
      return live(`Event ${event.data.seq} taken back`, event.data.reason);
    case 'lead-called':
      return live('Not sure, lead called', event.data.question);
    case 'released':
      return { ...plain(`Released by the ${event.data.by}`, event.data.evidence), person: event.actor };
    case 'set-aside':
      return live('Set aside', event.data.reason);
    case 'resumed':
      return plain(`Gone on after ${resumedAfter[event.data.from]}`, event.data.reason);
    case 'handed-over':
      return plain(`Handed over to ${event.data.to}`, event.data.reason);
    case 'limit-exceeded':
      return sayLimit(procedure, event);
    case 'alert-raised':
      return live('Alert', event.data.text);
    case 'stopped':
      return out('Stopped, supply off', event.data.reason);
    case 'version-notice-answered':
      return plain(
        `Told that version ${event.data.version} is out`,
        event.data.answer === 'go-on' ? 'went on with this one' : 'ended the run',
      );
    case 'finding-reached':
      return plain('Finding reached', event.data.verdict);
    case 'write-up-written':
      return plain('Write-up kept', editedWords(event.data.edited));
    case 'closed':
      return plain('Run closed');
    case 'verified':
      return {
        ...plain('A second person has looked', procedure.step(event.data.step)?.verify?.what),
        person: event.data.by,
      };
    case 'signed':
      return plain(`Signed: ${event.data.meaning}`);
    case 'amended':
      return live(`Amended: ${event.data.reason}`, event.data.text);
    case 'joined':
      return plain('Branches joined', event.data.branch);
    case 'clock-jumped':
      return live('The tablet’s clock was changed', `by ${jumpText(event.data.byMs)}`);
    case 'transcribed':
      return plain('Transcribed from paper', event.data.from);
    default:
      return unknownWords(event);
  }
}

const resumedAfter = {
  'set-aside': 'being set aside',
  stopped: 'the stop',
  reload: 'the app was opened again',
  'lead-called': 'the lead was called',
} as const;

function sayOpened({ data: { person, siteName, again } }: EventOf<'opened'>): EventWords {
  const by = `${person}, ${siteName}`;
  if (again === undefined) return plain('Run opened', by);
  const others = again.besides.length === 1 ? 'another' : `${again.besides.length} others`;
  return live(`Run opened beside ${others} of the same half: ${again.because}`, by);
}

function sayGear(procedure: CompiledProcedure, { data }: EventOf<'gear-chosen'>): EventWords {
  const role = procedure.document.gear.find((need) => need.role === data.role)?.label ?? data.role;
  const what = `${data.instrument.label} taken as ${lowerFirst(role)}`;
  return data.overdueBecause === undefined ? plain(what) : live(`${what}, its check was overdue`, data.overdueBecause);
}

function sayCaution(step: Step | undefined, procedure: CompiledProcedure, place: number): EventWords {
  const throughout = step?.kind === 'start' ? procedure.document.start.throughout : [];
  const caution = [...throughout, ...(step?.cautions ?? [])][place];
  if (caution === undefined) return plain('Caution acknowledged');
  return plain(`${caution.word.charAt(0).toUpperCase()}${caution.word.slice(1)} acknowledged`, caution.text);
}

function sayMark({ data }: EventOf<'mark-placed'>): EventWords {
  const name = data.mark === 'noise-begins' ? 'Noise begins' : 'Noise stops';
  const by = { tap: 'by tap', pedal: 'by pedal', suggested: 'suggested by the level, accepted' }[data.by];
  return plain(`${name}: mark at ${Number(data.timeS.toFixed(2))} s`, by);
}

function sayChoice(step: Step | undefined, { data }: EventOf<'choice-made'>): EventWords {
  const offered = step?.kind === 'choice' ? step.options : step?.kind === 'drive' ? step.windows : [];
  const labels = data.options.map((name) => offered.find((option) => option.name === name)?.label ?? name);
  const verb = step?.kind === 'drive' ? 'Visited' : 'Chosen';
  const what = labels.length === 0 ? `${verb}: none` : `${verb}: ${labels.map(lowerFirst).join(', ')}`;
  return plain(what, data.text);
}

function sayLimit(procedure: CompiledProcedure, { data }: EventOf<'limit-exceeded'>): EventWords {
  const limit = procedure.document.limits.find((candidate) => candidate.id === data.limit);
  return out(`Limit exceeded: ${data.figure.text} ${data.figure.unit}`, limit?.says ?? data.limit);
}

function labelOfDisturbed(procedure: CompiledProcedure, item: string): string {
  for (const step of procedure.document.steps) {
    const label = step.disturbs?.find((candidate) => candidate.item === item)?.label;
    if (label !== undefined) return label;
  }
  return item;
}

function numberOf(procedure: CompiledProcedure, id: string): string {
  return procedure.step(id)?.number ?? id;
}

function editedWords(edited: readonly string[]): string {
  return edited.length === 0 ? 'as composed from the record' : `edited by hand: ${edited.join(', ')}`;
}

function jumpText(byMs: number): string {
  const seconds = Math.round(Math.abs(byMs) / 1000);
  return `${seconds} s ${byMs < 0 ? 'back' : 'forward'}`;
}

/** A later build may write types that this one does not know: they are shown, not hidden. */
function unknownWords(event: never): EventWords {
  const { type, at } = event as RunEvent;
  return live('An event that this build does not know', `${type}, ${clockTime(at)}`);
}
