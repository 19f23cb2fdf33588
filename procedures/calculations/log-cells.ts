/** What divides a row into cells; `spaces` is any run of blanks. */
export type Delimiter = string;

/** How a file writes its cells. */
export interface CellStyle {
  readonly delimiter: Delimiter;
  readonly decimalMark: '.' | ',';
}

const spaces = 'spaces';
/** In this order where two would do equally well. */
const delimiters: readonly Delimiter[] = ['\t', ';', '|', ',', '^', '~'];
/** The style is judged by so many lines, spread over the file. */
const judgedLines = 400;

/** Words and signs that stand for a reading that there was not. */
const nothing =
  /^(?:|-+|\?+|\.+|_+|#?n[./]?a\.?n?|nil|nan|null|none|nd|no data|not? (?:available|supported)|unsupported|unavailable|invalid|err(?:or)?)$/i;

/** Whether a cell holds nothing: blank, or one of the words and signs that loggers write instead. */
export const isNothing = (cell: string): boolean => nothing.test(cell);

/** No name and no number is longer; what is would make the patterns below slow, so it is cut off. */
const longestCell = 200;

/** The dots keep half a number from being taken for a whole one. */
const trimmed = (cell: string): string =>
  cell.length > longestCell ? `${cell.slice(0, longestCell).trim()}...` : cell.trim();

/** One character more, unless it would be cut off anyway. */
const longer = (cell: string, character: string): string => (cell.length > longestCell ? cell : cell + character);

const isBlank = (cell: string): boolean => cell.length < longestCell && cell.trim() === '';

/** Divides a line into cells without the blanks and quotes around them, none longer than 200 characters. */
export function cellsOf(line: string, delimiter: Delimiter): string[] {
  if (delimiter === spaces) return line.trim().split(/\s+/).map(trimmed);
  if (!line.includes('"')) return line.split(delimiter).map(trimmed);
  const cells: string[] = [];
  let cell = '';
  let isQuoted = false;
  for (let index = 0; index < line.length; index++) {
    const character = line.charAt(index);
    if (character === '"' && isQuoted && line.charAt(index + 1) === '"') {
      cell = longer(cell, line.charAt(index++));
    } else if (character === '"' && (isQuoted || isBlank(cell))) isQuoted = !isQuoted;
    else if (character === delimiter && !isQuoted) {
      cells.push(trimmed(cell));
      cell = '';
    } else cell = longer(cell, character);
  }
  cells.push(trimmed(cell));
  return cells;
}

const plainNumber = /^[+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?$/i;
const thousands = { '.': /^[+-]?\d{1,3}(?:,\d{3})+(?:\.\d+)?$/, ',': /^[+-]?\d{1,3}(?:\.\d{3})+(?:,\d+)?$/ };

/** Reads a number as the file writes it; undefined when the cell is none. Never NaN or infinite. */
export function numberIn(cell: string, decimalMark: '.' | ','): number | undefined {
  let text = cell;
  if (!plainNumber.test(text)) {
    text = text.replace(/[\u00a0\u2007\u202f']/g, '').replace('\u2212', '-');
    if (thousands[decimalMark].test(text)) text = text.replaceAll(decimalMark === '.' ? ',' : '.', '');
    if (decimalMark === ',') text = text.replace(',', '.');
    if (!plainNumber.test(text)) return undefined;
  } else if (decimalMark === ',' && thousands[','].test(text)) text = text.replaceAll('.', '');
  const value = Number(text);
  return Number.isFinite(value) ? value : undefined;
}

/** Enough of a number or of a clock to say that a cell is data and not words. */
const looksLikeData = /^[+-]?\d[\d.,:eE+-]*(?:[TZ ][\d.,:+-]*Z?)?$/;

/** How well a delimiter divides these lines: cells of data less cells of words, over the lines of the usual width. */
function worth(lines: readonly string[], delimiter: Delimiter): number {
  const rows = lines.map((line) => cellsOf(line, delimiter)).filter((cells) => cells.length > 1);
  const widths = new Map<number, number>();
  for (const { length } of rows) widths.set(length, (widths.get(length) ?? 0) + 1);
  const usual = [...widths].reduce((most, entry) => (entry[1] > most[1] ? entry : most), [0, 0])[0];
  let sum = 0;
  for (const cells of rows) {
    if (cells.length !== usual) continue;
    for (const cell of cells) if (!isNothing(cell)) sum += looksLikeData.test(cell) ? 1 : -1;
  }
  return sum;
}

/** Lines from all over the file, so that a long preamble does not decide. */
function someOf(lines: readonly string[]): string[] {
  const filled = lines.filter((line) => line.trim() !== '');
  const stride = Math.max(1, Math.floor(filled.length / judgedLines));
  return filled.filter((_, index) => index % stride === 0);
}

/** Whether commas are decimal marks: more cells read as numbers that way than with points. */
function decimalMarkOf(lines: readonly string[], delimiter: Delimiter): '.' | ',' {
  let [points, commas] = [0, 0];
  for (const line of lines) {
    for (const cell of cellsOf(line, delimiter)) {
      if (/^[+-]?\d*\.\d+$/.test(cell)) points++;
      else if (/^[+-]?\d*,\d+$/.test(cell)) commas++;
    }
  }
  return commas > points ? ',' : '.';
}

/**
 * Tells how a file divides its rows and writes its decimals: the delimiter that leaves most cells of data and fewest of
 * words, runs of blanks when no character does, and the decimal mark that most numbers carry. Linear time.
 */
export function cellStyleOf(lines: readonly string[], known: Partial<CellStyle> = {}): CellStyle {
  const judged = someOf(lines);
  let delimiter = known.delimiter;
  if (delimiter === undefined) {
    let best = 0;
    for (const candidate of delimiters) {
      const candidateWorth = worth(judged, candidate);
      if (candidateWorth > best) [best, delimiter] = [candidateWorth, candidate];
    }
    delimiter ??=
      worth(judged, spaces) > 0
        ? spaces
        : delimiters.find((candidate) => judged.some((line) => line.includes(candidate)));
  }
  delimiter ??= ',';
  return { delimiter, decimalMark: known.decimalMark ?? decimalMarkOf(judged, delimiter) };
}
