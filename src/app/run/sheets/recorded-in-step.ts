import { shownUnit, type NamedValue, type RunEvent } from '../../../../procedures/engine/showing';
import type { RunView } from '../run-view';
import { valuesOf, type WalkedPlace } from '../walked-steps';

/** What one claim of a step recorded: its values as they stand, and everything else in words. */
export interface RecordedInStep {
  readonly values: readonly NamedValue[];
  readonly lines: readonly string[];
}

/** What was recorded between a claim and the next one. A value that a later claim superseded stands as a line. */
export function recordedIn({ procedure, events, state }: RunView, place: WalkedPlace): RecordedInStep {
  const { claimedSeq } = place.walked;
  const next = state.walked[place.index + 1]?.claimedSeq ?? Number.POSITIVE_INFINITY;
  const own = events.filter(({ seq }) => seq > claimedSeq && seq < next);
  const values = valuesOf(state, place.step.id).filter(({ seq }) => seq > claimedSeq && seq < next);
  const isShown = new Set(values.map(({ seq }) => seq));
  const lines = own.flatMap((event) => (isShown.has(event.seq) ? [] : (lineOf(event, procedure) ?? [])));
  return { values, lines };
}

function lineOf(event: RunEvent, procedure: RunView['procedure']): string | undefined {
  switch (event.type) {
    case 'reading-recorded': {
      const { name, figure, timeS } = event.data;
      const label = procedure.declared(name)?.label ?? name;
      const at = timeS === undefined ? '' : ` at ${timeS.toFixed(1)} s`;
      return `${label}: ${figure.text} ${shownUnit(figure.unit)}${at}`;
    }
    case 'not-measurable':
      return `Not measured: ${event.data.reason}`;
    case 'choice-made': {
      const { options, text } = event.data;
      const labels = options.map((option) => procedure.declared(option)?.label ?? option).join(', ');
      return `Chosen: ${labels}${text === undefined ? '' : `. ${text}`}`;
    }
    case 'codes-recorded': {
      const codes = event.data.codes.map(({ code, status }) => `${code} ${status}`).join(', ');
      return `Codes: ${codes === '' ? 'none' : codes}`;
    }
    case 'series-recorded':
      return `Series: ${event.data.samples} samples over ${event.data.durationS.toFixed(1)} s`;
    case 'mark-placed':
      return `Mark: ${event.data.mark === 'noise-begins' ? 'noise begins' : 'noise stops'} at ${event.data.timeS.toFixed(1)} s`;
    case 'gear-chosen':
      return `Gear: ${event.data.instrument.label}`;
    case 'disturbed':
      return `Disturbed: ${event.data.label}`;
    case 'restored':
      return `Put back: ${event.data.item}`;
    case 'limit-exceeded':
      return `Limit exceeded: ${event.data.figure.text} ${shownUnit(event.data.figure.unit)}`;
    case 'branch-overruled':
      return `Overruled: ${event.data.reason}`;
    case 'step-redone':
      return event.data.reason === '' ? undefined : `Taken again: ${event.data.reason}`;
    case 'photo-attached':
      return `Photo kept, ${Math.ceil(event.data.bytes / 1000)} kB`;
    case 'not-applicable':
      return `Does not apply: ${event.data.reason}`;
    case 'verified':
      return 'A second person has looked';
    case 'released':
      return `Released by the ${event.data.by}: ${event.data.evidence}`;
    case 'timer-ended':
      return event.data.certain ? 'Held to the end' : 'Held, time not certain';
    default:
      return undefined;
  }
}
