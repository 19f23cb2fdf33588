import { numberIn } from './log-cells';

/** A time cell in seconds, but a bare number in the unit of its column: of a day for a clock, of any zero otherwise. */
export interface TimeReading {
  readonly seconds: number;
  readonly kind: 'number' | 'measured' | 'clock' | 'date';
}

const daySeconds = 86_400;
const clock = /^(?:(\d{1,3}):)?(\d{1,2}):(\d{1,2}(?:[.,]\d+)?)\s*(am|pm)?$/i;
const isoDate = /^(\d{4})-(\d{2})-(\d{2})[T ]+(\d{1,2}:\d{2}(?::\d{2}(?:[.,]\d+)?)?)\s*(Z|[+-]\d{2}:?\d{2})?$/i;
/** A date that does not say which figure is the month: only its clock is used. */
const otherDate = /^\d{1,4}[./-]\d{1,2}[./-]\d{1,4}[T ]+(\S.*)$/;

function clockSeconds(text: string): number | undefined {
  const [whole, hours = '0', minutes = '', seconds = '', half = ''] = clock.exec(text) ?? [];
  if (whole === undefined || Number(minutes) > 59) return undefined;
  const second = Number(seconds.replace(',', '.'));
  if (second >= 61) return undefined;
  const hour = half === '' ? Number(hours) : (Number(hours) % 12) + (half.toLowerCase() === 'pm' ? 12 : 0);
  return hour * 3600 + Number(minutes) * 60 + second;
}

function zoneSeconds(zone: string): number {
  if (zone === '' || zone.toUpperCase() === 'Z') return 0;
  const [hours, minutes] = [Number(zone.slice(1, 3)), Number(zone.slice(-2))];
  return (zone.startsWith('-') ? -1 : 1) * (hours * 3600 + minutes * 60);
}

const withUnit = /^([+-]?[\d.,]+)\s*([a-z\u00b5]{1,12})$/i;

/** Reads a time that has its unit beside it, such as `0.5 s`. */
function measuredIn(cell: string, decimalMark: '.' | ','): TimeReading | undefined {
  const [, figures = '', unit] = withUnit.exec(cell) ?? [];
  const per = secondsPer(unit);
  const value = per === undefined ? undefined : numberIn(figures, decimalMark);
  return value === undefined || per === undefined ? undefined : { seconds: value * per, kind: 'measured' };
}

/** Reads a time: a number, one with its unit, h:mm:ss or mm:ss with fractions, or a date with a clock. Undefined when it is none. */
export function timeIn(cell: string, decimalMark: '.' | ','): TimeReading | undefined {
  const seconds = numberIn(cell, decimalMark) ?? numberIn(cell, decimalMark === '.' ? ',' : '.');
  if (seconds !== undefined) return { seconds, kind: 'number' };
  if (!cell.includes(':')) return measuredIn(cell, decimalMark);
  const [iso, year = '', month = '', day = '', hours = '', zone = ''] = isoDate.exec(cell) ?? [];
  if (iso !== undefined) {
    // Hours and minutes alone are not minutes and seconds behind a date.
    const ofDay = clockSeconds(hours.split(':').length === 2 ? `${hours}:00` : hours);
    const days = Date.UTC(Number(year), Number(month) - 1, Number(day)) / 1000;
    return ofDay === undefined ? undefined : { seconds: days + ofDay - zoneSeconds(zone), kind: 'date' };
  }
  const ofDay = clockSeconds(otherDate.exec(cell)?.[1] ?? cell);
  return ofDay === undefined ? undefined : { seconds: ofDay, kind: 'clock' };
}

/** Half a day back can only be midnight; anything less is a fault of the log. */
const midnightFallS = daySeconds / 2;

/** Carries a clock over midnight: gives the seconds since its first day began, for times in the order of the file. */
export function overMidnight(): (reading: TimeReading) => number {
  let dayStart = 0;
  let before = -Infinity;
  return ({ seconds, kind }) => {
    if (kind !== 'clock') return seconds;
    if (before - seconds > midnightFallS) dayStart += daySeconds;
    before = seconds;
    return dayStart + seconds;
  };
}

/** Seconds in one of the units that a time column may be in; undefined for any other. */
export function secondsPer(unit: string | undefined): number | undefined {
  switch (unit?.toLowerCase()) {
    case 's':
      return 1;
    case 'ms':
    case 'msec':
    case 'millisecond':
    case 'milliseconds':
      return 0.001;
    case 'us':
    case '\u00b5s':
      return 1e-6;
    case 'min':
      return 60;
    case 'h':
      return 3600;
    default:
      return undefined;
  }
}

const timeWords = [
  '(?:(?:elapsed|relative|rel|log|test|sample|recording|local|system|device|run|total) ?)?time(?: ?stamp| of day| elapsed)?',
  'time ?stamp|elapsed|clock|date ?(?:/|&|and)? ?time|seconds?|secs?|millis|ms|t',
  'zeit|uhrzeit|zeitstempel|temps|tiempo|hora|tempo|tijd|tid|czas|aika',
];
const timeName = new RegExp(`^(?:${timeWords.join('|')})$`);

/** Whether a column's name, its unit taken away, says that it holds the time. */
export const isTimeName = (name: string): boolean =>
  timeName.test(
    name
      .toLowerCase()
      .replace(/[\s_.:-]+/g, ' ')
      .trim(),
  );
