import * as fc from 'fast-check';
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { parseScanLog } from '../../procedures/calculations';

const folder = join(__dirname, '../reference/logs');

/** Every log of the folder, as its bytes. */
export const goodLogs: readonly Uint8Array[] = readdirSync(folder)
  .filter((name) => !name.endsWith('.json'))
  .sort()
  .map((name) => new Uint8Array(readFileSync(join(folder, name))));

/** The most lines that bytes can be read as: a line ends with CR, LF or both, in whatever encoding. */
const mostLines = (input: Uint8Array | string): number =>
  1 + (typeof input === 'string' ? [...input].filter((sign) => sign === '\n' || sign === '\r').length : ends(input));
const ends = (bytes: Uint8Array): number =>
  bytes.reduce((count, byte) => count + (byte === 10 || byte === 13 ? 1 : 0), 0);

/** Reads the input and gives what is against the contract of a log, or undefined. */
export function brokenContract(input: Uint8Array | string): string | undefined {
  const { channels, timeS, values, problems } = parseScanLog(input);
  if (values.length !== channels.length) return 'as many series as channels';
  if (values.some((series) => series.length !== timeS.length)) return 'series as long as the times';
  if (values.some((series) => series.some((value) => value !== undefined && !Number.isFinite(value))))
    return 'finite numbers';
  if (values.some((series) => series.every((value) => value === undefined))) return 'no channel without a number';
  if (timeS.length > 0 && timeS[0] !== 0) return 'time from 0';
  if (timeS.some((time, index) => index > 0 && !(time > (timeS[index - 1] ?? NaN) && time < Infinity)))
    return 'rising time';
  const lines = mostLines(input);
  if (problems.some(({ line, what }) => !Number.isInteger(line) || line < 1 || line > lines || what === ''))
    return 'problems at lines of the file';
  return channels.length + problems.length === 0 ? 'channels or a problem' : undefined;
}

const place = fc.double({ min: 0, max: 1, maxExcluded: true, noNaN: true });

/** One way in which a file is damaged. */
const damage: fc.Arbitrary<(bytes: Uint8Array) => Uint8Array> = fc.oneof(
  fc.array(fc.tuple(place, fc.nat(255)), { minLength: 1, maxLength: 20 }).map((flips) => (bytes: Uint8Array) => {
    const flipped = bytes.slice();
    for (const [where, byte] of flips) flipped[Math.floor(where * bytes.length)] = byte;
    return flipped;
  }),
  fc.tuple(place, place).map(([one, other]) => (bytes: Uint8Array) => {
    const [from, to] = [one, other].sort((a, b) => a - b).map((where) => Math.floor(where * bytes.length));
    return Uint8Array.from([...bytes.subarray(0, from), ...bytes.subarray(to)]);
  }),
  place.map((where) => (bytes: Uint8Array) => bytes.slice(0, Math.floor(where * bytes.length))),
  fc.tuple(place, place, place).map(([one, other, where]) => (bytes: Uint8Array) => {
    const lines = Buffer.from(bytes).toString('latin1').split('\n');
    const [from = 0, to = 0] = [one, other].sort((a, b) => a - b).map((share) => Math.floor(share * lines.length));
    const again = lines.slice(from, to);
    return new Uint8Array(
      Buffer.from(lines.toSpliced(Math.floor(where * lines.length), 0, ...again).join('\n'), 'latin1'),
    );
  }),
  fc.tuple(place, fc.uint8Array({ maxLength: 40 })).map(([where, more]) => (bytes: Uint8Array) => {
    const at = Math.floor(where * bytes.length);
    return Uint8Array.from([...bytes.subarray(0, at), ...more, ...bytes.subarray(at)]);
  }),
);

/** Good logs that were damaged once to three times. */
export const damagedLog: fc.Arbitrary<Uint8Array> = fc
  .tuple(fc.constantFrom(...goodLogs), fc.array(damage, { minLength: 1, maxLength: 3 }))
  .map(([log, damages]) => damages.reduce((bytes, harm) => harm(bytes), log));

/** Rows of cells as loggers write them, in any order, with numbers at the edges of what a number can be. */
const cell = fc.constantFrom(
  ...[
    'Time',
    'Time (s)',
    'time_ms',
    'MAP (kPa)',
    'Channel',
    'Value',
    'Unit',
    's',
    'kPa',
    'h',
    'x',
    '',
    ' ',
    'N/A',
    '"',
    '""',
  ],
  ...[
    '0',
    '1',
    '2.5',
    '3,7',
    '1e308',
    '-1e308',
    '1e-320',
    '1e999',
    '12:00:01',
    '23:59:59.9',
    '0:00:00',
    '99999999999999999',
  ],
  ...[
    '2026-03-28T10:00:00Z',
    '9999-99-99 99:99',
    '1 s',
    '1e308 h',
    '93.9 kPa',
    "1'000",
    '1.000,5',
    '\0',
    '\ufeff',
    '\u00b0C',
  ],
);
export const cellSoup: fc.Arbitrary<string> = fc
  .tuple(
    fc.array(fc.array(cell, { maxLength: 6 }), { maxLength: 12 }),
    fc.constantFrom(',', ';', '\t', '|', ' '),
    fc.constantFrom('\n', '\r\n', '\r'),
  )
  .map(([rows, delimiter, end]) => rows.map((cells) => cells.join(delimiter)).join(end));
