import { isUnit, unitKind, type LogChannel, type ScanLog } from '../../../../procedures/calculations/for-a-run';
// By its path: through the room's face it would come with the first step already.
import { parseScanLog } from '../../../../procedures/calculations/parse-scan-log';
import type { Channel, ListenStep } from '../../../../procedures/document';
import type { Series } from '../../../../procedures/engine/showing';

/** A log of a ramp of some minutes has well under a megabyte; anything near this is another kind of file. */
export const largestFileBytes = 20 * 1024 * 1024;

/** A file that was read, or why it was not, in words that say what to do. */
export type ScanFile =
  | { readonly ok: true; readonly log: ScanLog; readonly fileName: string; readonly bytes: number }
  | { readonly ok: false; readonly message: string };

/** Why a file is refused before a byte of it is read; undefined when it is not. */
export function refusedBySize(name: string, bytes: number): string | undefined {
  if (bytes === 0) return `${name} is empty. Save the log on the scan tool again, then take the file.`;
  if (bytes <= largestFileBytes) return undefined;
  const size = Math.round(bytes / (1024 * 1024));
  return `${name} has ${size} MB; a log of a ramp has less than ${largestFileBytes / (1024 * 1024)} MB. Take the log itself, not a recording or an archive.`;
}

/** Reads the bytes of a file. */
export function readScanFile(fileName: string, bytes: Uint8Array): ScanFile {
  const log = parseScanLog(bytes);
  if (log.channels.length > 0 && log.timeS.length > 0) return { ok: true, log, fileName, bytes: bytes.length };
  const what = log.problems[0]?.what ?? 'no readings were found in it';
  return { ok: false, message: `${fileName} cannot be used: ${what}. Save the log as text with a column of time.` };
}

/** Which column of a log stands for which channel of the step; undefined for none. */
export type ColumnChoice = Readonly<Record<string, number | undefined>>;

/** The columns that a channel may be read from: those with a unit of its kind, and those that name none. */
export function columnsFor(channel: Channel, log: ScanLog): readonly number[] {
  return log.channels.flatMap(({ unit }, index) => (fits(channel, unit) ? [index] : []));
}

function fits(channel: Channel, unit: string | undefined): boolean {
  if (unit === undefined) return true;
  if (channel.unit === 'dB') return unit === 'dB';
  return isUnit(unit) && unitKind(unit) === unitKind(channel.unit);
}

const measured: Readonly<Record<Channel['name'], LogChannel['quantity']>> = {
  gauge: 'gauge-pressure',
  manifold: 'manifold-pressure',
  boost: 'boost-pressure',
  sound: 'sound-level',
};

/** The column for each channel as the names tell it, each column once. */
export function guessColumns(step: Pick<ListenStep, 'channels'>, log: ScanLog): ColumnChoice {
  const taken = new Set<number>();
  return Object.fromEntries(
    step.channels.map((channel) => {
      const found = columnsFor(channel, log).find(
        (index) => !taken.has(index) && log.channels[index]?.quantity === measured[channel.name],
      );
      if (found !== undefined) taken.add(found);
      return [channel.name, found];
    }),
  );
}

/** The chosen columns as a series. */
export function seriesOf(step: Pick<ListenStep, 'channels'>, log: ScanLog, choice: ColumnChoice): Series {
  return {
    timeS: log.timeS,
    channels: step.channels.flatMap(({ name, unit }) => {
      const index = choice[name];
      const values = index === undefined ? undefined : log.values[index];
      if (index === undefined || values === undefined) return [];
      return [{ name, unit: log.channels[index]?.unit ?? unit, values }];
    }),
  };
}

/** What could not be read, in a few lines. */
export function skippedWords({ problems }: ScanLog): readonly string[] {
  const few = problems.slice(0, 3).map(({ line, what }) => `line ${line}: ${what}`);
  return problems.length > few.length ? [...few, `and ${problems.length - few.length} more lines`] : few;
}
