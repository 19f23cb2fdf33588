import { convert, isUnit } from '../calculations/for-a-run';
import type { SeriesStep } from '../document';
import { CannotDo, type Drafting } from './drafting';
import { own } from './environment';
import { completeStep } from './go-on';
import { brokenLimit } from './limits';
import { trimmed } from './figures';
import { analyseListening, gaugeRange } from './listening';
import type { RunCommand } from './run-command';
import type { Series } from './series';

type Import = Extract<RunCommand, { do: 'import-series' }>;
type Mark = Extract<RunCommand, { do: 'mark' }>;

/** So much of the beginning tells where the gauge rests. */
const restS = 1;

/** Keeps a series with the step and holds every sample against the limits. */
export function importSeries(drafting: Drafting, step: SeriesStep, { record, series }: Import): void {
  const missing = step.channels.filter(
    (channel) => channel.needed && !series.channels.some((candidate) => candidate.name === channel.name),
  );
  if (missing.length > 0) {
    const labels = missing.map(({ label }) => label.toLowerCase()).join(' and ');
    throw new CannotDo(
      'missing-channel',
      `The series has no ${labels}. Choose its column, or take another file.`,
      'channels',
    );
  }
  if (series.timeS.length < 3)
    throw new CannotDo('too-short', 'The series has fewer than three samples. Take another file.', 'file');
  const worst = worstSample(drafting, step, series);
  if (worst === undefined) requireRestAtZero(drafting, step, series);
  drafting.add({ type: 'series-recorded', data: { ...record, step: step.id, name: step.name } });
  if (worst !== undefined) {
    drafting.add({
      type: 'limit-exceeded',
      data: { step: step.id, limit: worst.limit, name: worst.name, figure: { text: worst.text, unit: 'kPa' } },
    });
  }
}

/** The highest sample of the first channel that breaks a limit. */
function worstSample(
  drafting: Drafting,
  step: SeriesStep,
  series: Series,
): { readonly limit: string; readonly name: string; readonly text: string } | undefined {
  for (const channel of series.channels) {
    const authored = step.channels.find((candidate) => candidate.name === channel.name);
    if (authored === undefined || !isUnit(channel.unit)) continue;
    const highest = channel.values.reduce<number>(
      (most, value) => (value === undefined ? most : Math.max(most, value)),
      Number.NEGATIVE_INFINITY,
    );
    if (!Number.isFinite(highest)) continue;
    const sense = authored.sense === undefined ? {} : { sense: authored.sense };
    const broken = brokenLimit(drafting.procedure, drafting.state, {
      name: channel.name,
      value: highest,
      unit: channel.unit,
      ...sense,
    });
    if (broken !== undefined) return { limit: broken.id, name: channel.name, text: highest.toFixed(1) };
  }
  return undefined;
}

/**
 * Refuses a series whose gauge does not begin at zero, by more than its accuracy and its step allow: every figure of
 * the ramp would carry that offset, and a log that begins under pressure has no rest to measure a rise from.
 */
function requireRestAtZero(drafting: Drafting, step: SeriesStep, series: Series): void {
  const channel = series.channels.find(({ name }) => name === 'gauge');
  const range = gaugeRange(drafting.state, step);
  if (channel === undefined || range === undefined || !isUnit(channel.unit)) return;
  const begin = series.timeS[0] ?? 0;
  const first = channel.values.filter(
    (value, index): value is number => value !== undefined && (series.timeS[index] ?? begin) <= begin + restS,
  );
  // Of two in the middle the lower one: a point that was typed within the first second belongs to the ramp.
  const rest = [...first].sort((a, b) => a - b)[Math.floor((first.length - 1) / 2)];
  if (rest === undefined) return;
  const allowed = 2 * range.accuracy + range.resolution;
  const shown = convert(rest, channel.unit, range.unit);
  if (Math.abs(shown) <= allowed) return;
  throw new CannotDo(
    'not-at-zero',
    `The gauge begins at ${trimmed(shown, 2)} ${range.unit}, not at zero (${trimmed(allowed, 2)} ${range.unit} either way is allowed). Let it fall to zero, begin the log at rest, and take that one.`,
    'file',
  );
}

/** Places one of the two marks; the noise cannot stop before it began. */
export function placeMark(drafting: Drafting, step: SeriesStep, { mark, timeS, by }: Mark): void {
  const marks = own(drafting.state.series, step.name)?.marks ?? {};
  const begins = mark === 'noise-begins' ? timeS : marks['noise-begins']?.timeS;
  const stops = mark === 'noise-stops' ? timeS : marks['noise-stops']?.timeS;
  if (!(timeS >= 0)) throw new CannotDo('no-time', 'The mark lies before the series begins.', 'timeS');
  if (begins !== undefined && stops !== undefined && stops <= begins) {
    throw new CannotDo('mark-order', 'Noise stops must lie after noise begins. Move one of the marks.', 'timeS');
  }
  drafting.add({ type: 'mark-placed', data: { step: step.id, series: step.name, mark, timeS, by } });
}

export function takeMarkAway(drafting: Drafting, step: SeriesStep, mark: Mark['mark']): void {
  const seq = own(drafting.state.series, step.name)?.marks[mark]?.seq;
  if (seq === undefined) throw new CannotDo('no-mark', 'There is no such mark to take away.');
  drafting.add({ type: 'undone', data: { seq, reason: 'mark taken away' } });
}

/** Computes what is to be found, names it, and goes on. */
export function finishListening(drafting: Drafting, step: SeriesStep, series: Series): void {
  if (own(drafting.state.series, step.name)?.record === undefined) {
    throw new CannotDo(
      'no-series',
      'Type at least three points of the ramp, or take the file from the scan tool, first.',
      'series',
    );
  }
  const { found } = analyseListening(drafting.state, step, series);
  for (const { quantity, figure } of found) {
    drafting.add({
      type: 'reading-recorded',
      data: {
        step: step.id,
        name: quantity.name,
        figure: {
          text: figure.text,
          unit: quantity.unit,
          ...(quantity.sense === undefined ? {} : { sense: quantity.sense }),
        },
        source: 'computed',
        uncertainty: figure.uncertaintyText,
      },
    });
  }
  completeStep(drafting, step);
}
