import { cellsOf, cellStyleOf, isNothing, type CellStyle } from './log-cells';
import { LogBuilder } from './log-builder';
import { columnsOf, headerLine, isUnitsRow, layoutOf, namesTime, type Layout } from './log-header';
import { decodeLog, isBinary, withoutPadding } from './log-text';
import { overMidnight, secondsPer, timeIn } from './log-time';
import { unitAsWritten } from './log-units';
import { type LogHints, type ScanLog } from './scan-log';

const nothingRead = (line: number, what: string): ScanLog => ({
  channels: [],
  timeS: [],
  values: [],
  problems: [{ line, what }],
});

/**
 * Reads a log of a scan tool or of test gear, whatever tool wrote it.
 *
 * Takes the bytes of the file (UTF-8, UTF-16 or Latin-1) or its text. Understands any delimiter, decimal points and
 * commas, units in the header, in a row below it, glued to the name or to the number, lines before the header, times
 * in h, min, s or ms, as a clock (over midnight too) or as an ISO date, blank cells and words for nothing, headers that
 * come again (with other columns too), lines of words between, and the layout of one channel a row.
 *
 * Values stay in the unit of the file, named as `convert` names it. A row whose time does not rise is left out; one
 * with the time of the row before fills what that left blank. Columns without a number are left out.
 *
 * Never throws on content: `problems` says what could not be read, and in which line. An empty file, one that is no
 * text, and one without a column of time give no channels and one problem. Linear time.
 *
 * @example parseScanLog('Time (s),MAP (kPa)\n0,93.9\n1,94.0').values // [[93.9, 94.0]]
 */
export function parseScanLog(input: Uint8Array | string, hints: LogHints = {}): ScanLog {
  const decoded = typeof input === 'string' ? input.replace(/^\ufeff/, '') : decodeLog(input);
  if (decoded.trim() === '') return nothingRead(1, 'the file is empty');
  const padded = withoutPadding(decoded);
  if (padded.trim() === '' || isBinary(padded)) return nothingRead(1, 'the file is not text');
  const text = padded.replaceAll('\0', '');
  const lines = text.split(/\r\n|\n|\r/);
  const { delimiter, decimalMark } = hints;
  const style = cellStyleOf(lines, {
    ...(delimiter === undefined ? {} : { delimiter }),
    ...(decimalMark === undefined ? {} : { decimalMark }),
  });
  const header = headerLine(lines, style);
  if (header === undefined)
    return nothingRead(1, 'no line names the columns: a header with a column of time is needed');
  return new LogReader(lines, style, hints).read(header);
}

/** Walks through the lines below the header. */
class LogReader {
  private readonly builder: LogBuilder;
  private layout: Layout | undefined;
  /** The lines that named it: the same again change nothing. */
  private header: string | undefined;
  private secondsPerUnit = 1;
  private readonly toSeconds = overMidnight();
  private isBelowHeaderAgain = false;

  constructor(
    private readonly lines: readonly string[],
    private readonly style: CellStyle,
    private readonly hints: LogHints,
  ) {
    this.builder = new LogBuilder(style);
  }

  read(header: number): ScanLog {
    let index = this.takeHeader(header);
    if (this.layout === undefined) return nothingRead(header + 1, 'no column holds the time');
    while (index < this.lines.length) index = this.takeLine(index);
    if (this.builder.lastTimeS === undefined) this.builder.report(header + 1, 'no row of readings follows the header');
    else if (!this.builder.hasNumbers) this.builder.report(header + 1, 'no channel holds a number');
    return this.builder.finish();
  }

  private cellsAt(index: number): string[] {
    return cellsOf(this.lines[index] ?? '', this.style.delimiter);
  }

  /** Reads the header and the row of units below it; gives the index of the line that follows. */
  private takeHeader(index: number): number {
    const below = this.cellsAt(index + 1);
    const hasUnits = isUnitsRow(below);
    const columns = columnsOf(this.cellsAt(index), hasUnits ? below : undefined);
    const next = index + (hasUnits ? 2 : 1);
    let first = next;
    while (first < this.lines.length && this.lines[first]?.trim() === '') first++;
    const header = this.lines.slice(index, next).join('\n');
    if (header === this.header) return next;
    const layout = layoutOf(columns, this.cellsAt(first), this.style);
    if (layout === undefined) return next;
    this.header = header;
    this.layout = layout;
    this.secondsPerUnit = secondsPer(this.hints.timeUnit) ?? this.timeUnitAt(layout, first);
    return next;
  }

  /** Seconds per unit of the time column: by its unit, or its name, or the size of its steps. */
  private timeUnitAt({ timeColumn, columns }: Layout, first: number): number {
    const { name = '', unit } = columns[timeColumn] ?? {};
    const named = secondsPer(unit) ?? secondsPer(name);
    if (named !== undefined) return named;
    const times: number[] = [];
    const lookedTo = Math.min(this.lines.length, first + lookedThrough);
    for (let index = first; index < lookedTo && times.length < steadyTimes; index++) {
      const reading = timeIn(this.cellsAt(index)[timeColumn] ?? '', this.style.decimalMark);
      if (reading?.kind === 'number' && reading.seconds !== times.at(-1)) times.push(reading.seconds);
    }
    const [start = 0, end = 0] = [times[0], times.at(-1)];
    const isCounted =
      times.length > 1 && times.every(Number.isInteger) && (end - start) / (times.length - 1) >= leastMillisecondStep;
    if (!isCounted && start < leastEpochMilliseconds) return 1;
    this.builder.report(
      first + 1,
      `the time column ${name} gives no unit: read as milliseconds, by the size of its steps`,
    );
    return 0.001;
  }

  /** Reads one line; gives the index of the next. */
  private takeLine(index: number): number {
    const { layout } = this;
    const line = this.lines[index] ?? '';
    if (line.trim() === '' || layout === undefined) return index + 1;
    const cells = cellsOf(line, this.style.delimiter);
    const reading = timeIn(cells[layout.timeColumn] ?? '', this.style.decimalMark);
    if (reading === undefined) {
      if (namesTime(cells, this.style)) {
        this.isBelowHeaderAgain = true;
        return this.takeHeader(index);
      }
      if (!isUnitsRow(cells)) this.builder.report(index + 1, 'no time in this line: left out');
      return index + 1;
    }
    const timeS = this.toSeconds(reading) * (reading.kind === 'number' ? this.secondsPerUnit : 1);
    if (!(Math.abs(timeS) <= latestS)) {
      this.builder.report(index + 1, 'no time in this line: left out');
      return index + 1;
    }
    const { lastTimeS = -Infinity } = this.builder;
    if (timeS < lastTimeS && this.isBelowHeaderAgain) {
      this.builder.report(index + 1, 'another recording begins here: left out from here on');
      return this.lines.length;
    }
    this.isBelowHeaderAgain = false;
    if (timeS < lastTimeS) this.builder.report(index + 1, 'the time runs backwards: line left out');
    else this.takeReadings(layout, cells, timeS, index + 1);
    return index + 1;
  }

  private takeReadings(layout: Layout, cells: readonly string[], timeS: number, line: number): void {
    const isAgain = this.builder.openSample(timeS) === 'again';
    if (layout.kind === 'long') {
      const [name = '', value = '', unit = ''] = [
        cells[layout.nameColumn],
        cells[layout.valueColumn],
        cells[layout.unitColumn],
      ];
      if (!this.builder.put(name, unit === '' ? undefined : unitAsWritten(unit), value, line)) this.reportAgain(line);
      return;
    }
    let isNew = true;
    // No further than the row goes: a header may be very wide and the rows short.
    for (const [index, cell] of cells.slice(0, layout.columns.length).entries()) {
      const { name = '', unit } = layout.columns[index] ?? {};
      if (index !== layout.timeColumn) isNew = this.builder.put(name, unit, cell, line) && isNew;
    }
    if (isAgain && !isNew) this.reportAgain(line);
    if (cells.slice(layout.columns.length).some((cell) => !isNothing(cell))) {
      this.builder.report(line, 'more cells than the header names: the rest left out');
    }
  }

  private reportAgain(line: number): void {
    this.builder.report(line, 'the time does not rise: readings left out where there was one already');
  }
}

/** Three million years; a count of seconds, or of microseconds since 1970, ends long before. */
const latestS = 1e14;
/** So many different times show the size of the steps. */
const steadyTimes = 20;
/** They are looked for in so many lines: a header may come again very often, and one moment fill many rows. */
const lookedThrough = 100;
/** No scan tool waits 20 seconds between two rows, so whole numbers that far apart are milliseconds. */
const leastMillisecondStep = 20;
/** A count of seconds since 1970 reaches this in the year 5138; one of milliseconds did in 1973. */
const leastEpochMilliseconds = 1e11;
