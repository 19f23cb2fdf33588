import { cellsOf, isNothing, numberIn, type CellStyle } from './log-cells';
import { isTimeName, timeIn } from './log-time';
import { isUnitText, nameAndUnit, unitAsWritten, type NamedUnit } from './log-units';

/** A column of the file as its header names it. */
export type Column = NamedUnit;

/** What the columns mean: one channel a column, or one channel a row. */
export type Layout =
  | { readonly kind: 'wide'; readonly timeColumn: number; readonly columns: readonly Column[] }
  | {
      readonly kind: 'long';
      readonly timeColumn: number;
      readonly columns: readonly Column[];
      readonly nameColumn: number;
      readonly valueColumn: number;
      readonly unitColumn: number;
    };

const channelColumn = /^(?:channel|name|parameter|signal|sensor|item|pid|label|measurement|quantity)(?: name)?$/i;
const valueColumn = /^(?:value|reading|data|result)$/i;
const unitColumn = /^units?$/i;

const isData = (cell: string, { decimalMark }: CellStyle): boolean =>
  numberIn(cell, decimalMark) !== undefined || timeIn(cell, decimalMark) !== undefined;

/** Whether the cells are words and blanks only, two at least. */
const areWords = (cells: readonly string[], style: CellStyle): boolean =>
  cells.filter((cell) => cell !== '').length > 1 && !cells.some((cell) => isData(cell, style));

/** Whether the row is a row of units: blanks apart, hardly anything else. */
export function isUnitsRow(cells: readonly string[]): boolean {
  const filled = cells.filter((cell) => cell !== '');
  return filled.length > 0 && filled.filter(isUnitText).length > 0.7 * filled.length;
}

/** Whether the row is a header that names a time column. */
export const namesTime = (cells: readonly string[], style: CellStyle): boolean =>
  areWords(cells, style) && !isUnitsRow(cells) && cells.some((cell) => isTimeName(nameAndUnit(cell).name));

/** Whether the row is data: more than half of what is filled reads as numbers or times. */
function isDataRow(cells: readonly string[], style: CellStyle): boolean {
  const filled = cells.filter((cell) => !isNothing(cell));
  return filled.length > 0 && filled.filter((cell) => isData(cell, style)).length > filled.length / 2;
}

/** The index of the header's line, or undefined when the file has none. */
export function headerLine(lines: readonly string[], style: CellStyle): number | undefined {
  let lastWords: number | undefined;
  for (const [index, line] of lines.entries()) {
    if (line.trim() === '') continue;
    const cells = cellsOf(line, style.delimiter);
    if (namesTime(cells, style)) return index;
    if (areWords(cells, style) && !isUnitsRow(cells)) lastWords = index;
    // Data without a header that names the time: the words just above have to do.
    else if (cells.length > 1 && isDataRow(cells, style)) return lastWords;
  }
  return undefined;
}

/**
 * Names the columns of a header, with the units of the row below it where there is one. A column that another one is
 * named like, unit and all, gets a number behind its name.
 */
export function columnsOf(header: readonly string[], units: readonly string[] | undefined): Column[] {
  const times = new Map<string, number>();
  return header.map((cell, index) => {
    const { name, unit: glued } = nameAndUnit(cell);
    const below = units?.[index] ?? '';
    const unit = glued ?? (below === '' ? undefined : unitAsWritten(below));
    const key = `${name}\n${unit ?? ''}`;
    const time = (times.get(key) ?? 0) + 1;
    times.set(key, time);
    return { name: time === 1 || name === '' ? name : `${name} (${time})`, unit };
  });
}

/** Tells what the columns mean; undefined when none of them holds the time, judged by name and then by a first row. */
export function layoutOf(
  columns: readonly Column[],
  firstRow: readonly string[],
  style: CellStyle,
): Layout | undefined {
  const find = (pattern: RegExp): number => columns.findIndex(({ name }) => pattern.test(name));
  const isTime = (index: number): boolean => timeIn(firstRow[index] ?? '', style.decimalMark) !== undefined;
  let timeColumn = columns.findIndex(({ name }, index) => isTimeName(name) && isTime(index));
  if (timeColumn < 0) timeColumn = columns.findIndex(({ name }) => isTimeName(name));
  if (timeColumn < 0) {
    timeColumn = firstRow.findIndex((cell) => cell.includes(':') && timeIn(cell, style.decimalMark) !== undefined);
  }
  if (timeColumn < 0) return undefined;
  const [nameColumn, value] = [find(channelColumn), find(valueColumn)];
  if (nameColumn >= 0 && value >= 0) {
    return { kind: 'long', timeColumn, columns, nameColumn, valueColumn: value, unitColumn: find(unitColumn) };
  }
  return { kind: 'wide', timeColumn, columns };
}
