import type { InstrumentKind } from '../../../procedures/document';
import { shownUnit, type InstrumentRange } from '../../../procedures/engine/showing';
import { daysUntil } from '../core/time-words';

/** What an instrument is, as people call it. */
export const kindWords: Readonly<Record<InstrumentKind, string>> = {
  'pressure-gauge': 'Pressure gauge',
  'scan-tool': 'Scan tool',
  'listening-probe': 'Listening probe',
  barometer: 'Barometer',
  thermometer: 'Thermometer',
};

/** What an instrument shows, `0 to 60 kPa gauge`. */
export function rangeText({ low, high, unit, sense }: InstrumentRange): string {
  return `${low} to ${high} ${shownUnit(unit)}${sense === undefined ? '' : ` ${sense}`}`;
}

/** The step of its display, `0.1 kPa`. */
export function stepText({ resolution, unit }: InstrumentRange): string {
  return `${resolution} ${shownUnit(unit)}`.trim();
}

/** Half its stated accuracy, `± 0.25 kPa`. */
export function accuracyText({ accuracy, unit }: InstrumentRange): string {
  return `\u00b1 ${accuracy} ${shownUnit(unit)}`.trim();
}

/** How an instrument stands with its check. */
export interface DueWords {
  /** `due 10 Dec 2026`. */
  readonly day: string;
  /** `in 9 days`, or how long it has been overdue. */
  readonly when: string;
  /** `soon`: within 14 days, time to send it (common practice, no source). */
  readonly state: 'overdue' | 'soon' | 'fine';
}

const soonDays = 14;
const day = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric', timeZone: 'UTC' });

/** Says when an instrument's check is due, or that it is overdue, plainly. */
export function dueWords(dueOn: string, now: number): DueWords {
  const days = daysUntil(dueOn, now);
  const on = dayText(dueOn);
  if (days < 0) return { day: `was due ${on}`, when: `overdue by ${counted(-days)}`, state: 'overdue' };
  const when = days === 0 ? 'today is the last day' : `in ${counted(days)}`;
  return { day: `due ${on}`, when, state: days <= soonDays ? 'soon' : 'fine' };
}

/** `10 Dec 2026` for `2026-12-10`. */
export function dayText(date: string): string {
  return day.format(Date.parse(date));
}

function counted(days: number): string {
  return days === 1 ? '1 day' : `${days} days`;
}
