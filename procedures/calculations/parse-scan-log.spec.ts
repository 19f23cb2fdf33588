import * as fc from 'fast-check';
import { parseScanLog } from './parse-scan-log';

const log = (...lines: string[]) => parseScanLog(lines.join('\n'));
const utf16 = (text: string, highFirst: boolean) =>
  Uint8Array.from(
    [...text].flatMap((character) => {
      const code = character.charCodeAt(0);
      return highFirst ? [code >> 8, code & 255] : [code & 255, code >> 8];
    }),
  );
const table = 'Time (s),MAP (kPa),IAT (\u00b0C)\n0,93.9,24\n0.5,94.1,24.5\n';
const expected = {
  timeS: [0, 0.5],
  values: [
    [93.9, 94.1],
    [24, 24.5],
  ],
  problems: [],
};

describe('parseScanLog', () => {
  it('reads every encoding that loggers write', () => {
    const utf8 = Uint8Array.from(
      [...table].flatMap((sign) => (sign === '\u00b0' ? [0xc2, 0xb0] : [sign.charCodeAt(0)])),
    );
    const files = [
      table,
      `\ufeff${table}`,
      utf8,
      Uint8Array.from([0xef, 0xbb, 0xbf, ...utf8]),
      Uint8Array.from([0xff, 0xfe, ...utf16(table, false)]),
      Uint8Array.from([0xfe, 0xff, ...utf16(table, true)]),
      utf16(table, false),
      utf16(table, true),
      Uint8Array.from(table, (character) => character.charCodeAt(0)),
      table.replaceAll('\n', '\r\n'),
      table.replaceAll('\n', '\r'),
    ];
    for (const file of files) {
      const { channels, ...rest } = parseScanLog(file);
      expect(rest).toEqual(expected);
      expect(channels).toEqual([
        { name: 'MAP', unit: 'kPa', quantity: 'manifold-pressure' },
        { name: 'IAT', unit: 'degC', quantity: 'intake-temperature' },
      ]);
    }
  });

  it.each(['\t', ';', '|', ',', '^', '  '])(
    'finds the delimiter %j, with decimal points and, where it can be, commas',
    (delimiter) => {
      const rows = ['time_s,map_kpa,iat_c', '0.0,93.9,24.0', '0.5,94.1,24.5'].map((row) =>
        row.replaceAll(',', delimiter),
      );
      expect(log(...rows)).toMatchObject(expected);
      if (delimiter !== ',')
        expect(log(...rows.map((row) => row.replace(/(\d)\.(\d)/g, '$1,$2')))).toMatchObject(expected);
    },
  );

  it('obeys a hint where the file could be read in two ways', () => {
    const lines = ['Time;A', '0;1,234', '10;2,345'];
    expect(log(...lines).values).toEqual([[1.234, 2.345]]);
    expect(parseScanLog(lines.join('\n'), { decimalMark: '.' }).values).toEqual([[1234, 2345]]);
    expect(parseScanLog(lines.join('\n'), { timeUnit: 'min' }).timeS).toEqual([0, 600]);
    expect(parseScanLog('Time/A\n0/1\n1/2', { delimiter: '/' }).values).toEqual([[1, 2]]);
  });

  it.each([
    ['Time (ms)', ['1000', '1500'], [0, 0.5]],
    ['timestamp_ms', ['250', '251'], [0, 0.001]],
    ['Time [min]', ['0', '0.5'], [0, 30]],
    ['Elapsed', ['2.25', '2.5'], [0, 0.25]],
    ['Time', ['23:59:59.5', '00:00:00.25'], [0, 0.75]],
    ['Time', ['11:59:59 PM', '12:00:01 AM'], [0, 2]],
    ['Time', ['01:30.5', '01:31'], [0, 0.5]],
    ['Timestamp', ['2020-02-28T23:59:59.5Z', '2020-02-29T00:00:00.5Z'], [0, 1]],
    ['Timestamp', ['2020-03-01 00:00:01+01:00', '2020-02-29 23:00:02Z'], [0, 1]],
    ['Date/Time', ['31.12.2020 23:59:59', '01.01.2021 00:00:01'], [0, 2]],
    ['Timestamp', ['1600000000000', '1600000000250'], [0, 0.25]],
  ])('reads the time of %s: %p', (name, times, timeS) => {
    const { timeS: read, problems } = log(`${name},MAP (kPa)`, ...times.map((time) => `${time},94`));
    expect(read).toEqual(timeS);
    // Milliseconds that only their size gives away are told.
    expect(problems).toHaveLength(times[0]!.length === 13 ? 1 : 0);
  });

  it('takes whole steps of twenty and more for milliseconds, and says so', () => {
    const { timeS, problems } = log('Time,MAP (kPa)', '0,94', '100,95', '200,96');
    expect(timeS).toEqual([0, 0.1, 0.2]);
    expect(problems).toEqual([
      { line: 2, what: 'the time column Time gives no unit: read as milliseconds, by the size of its steps' },
    ]);
  });

  it('finds units in brackets, behind the name, in a row below and beside the number', () => {
    const units = (...lines: string[]) => log(...lines).channels.map(({ unit }) => unit);
    expect(units('Time,A (inHg),B [mbar],c_psi,Speed km/h', '0,1,2,3,4')).toEqual(['inHg', 'hPa', 'psi', 'km/h']);
    expect(units('Time,A,B,C,D', 'sec,\u00b0F,1/min,%,', '0,1,2,3,4')).toEqual(['degF', 'rpm', '%', undefined]);
    expect(units('Time,A,B (mA)', '0,93.9 kPa,3', '1,94.0 kPa,3')).toEqual(['kPa', 'mA']);
  });

  it('keeps columns of one name apart, by their units or by number', () => {
    const { channels, values } = log(
      'Time,MAP (kPa),MAP (inHg),B,B',
      '0,94,27.8,1,2',
      'Time,MAP (kPa),MAP (inHg),B,B',
      '1,95,28.1,3,4',
    );
    expect(channels.map(({ name, unit }) => [name, unit])).toEqual([
      ['MAP', 'kPa'],
      ['MAP', 'inHg'],
      ['B', undefined],
      ['B (2)', undefined],
    ]);
    expect(values).toEqual([
      [94, 95],
      [27.8, 28.1],
      [1, 3],
      [2, 4],
    ]);
  });

  it('leaves blanks and words for nothing blank, without a word', () => {
    const { values, problems } = log('Time,A,B', '0,,1', '1,N/A,2', '2,---,3', '3,not supported,4', '4,7,NaN');
    expect(values).toEqual([
      [undefined, undefined, undefined, undefined, 7],
      [1, 2, 3, 4, undefined],
    ]);
    expect(problems).toEqual([]);
  });

  it('says what it could not read and where', () => {
    const { channels, values, problems } = log(
      'A bench test',
      '',
      'Time,A,State',
      '0,1,open',
      '1,1x2,open',
      'supply opened by hand',
      '0.5,3,open',
      '2,4,open,9',
    );
    expect(channels.map(({ name }) => name)).toEqual(['A']);
    expect(values).toEqual([[1, undefined, 4]]);
    expect(problems).toEqual([
      { line: 4, what: 'State holds words and no numbers: left out' },
      { line: 5, what: 'A: "1x2" is no number' },
      { line: 6, what: 'no time in this line: left out' },
      { line: 7, what: 'the time runs backwards: line left out' },
      { line: 8, what: 'more cells than the header names: the rest left out' },
    ]);
  });

  it('goes on under a header that comes again, with its own columns', () => {
    const { channels, timeS, values, problems } = log('Time,A,B', 's,V,V', '0,1,2', 'Time,B,C', 's,V,V', '1,3,4');
    expect(channels.map(({ name }) => name)).toEqual(['A', 'B', 'C']);
    expect(timeS).toEqual([0, 1]);
    expect(values).toEqual([
      [1, undefined],
      [2, 3],
      [undefined, 4],
    ]);
    expect(problems).toEqual([]);
  });

  it('ends where another recording begins', () => {
    const { timeS, problems } = log('Time,A', '5,1', '6,2', 'Time,A', '0,3', '9,4');
    expect(timeS).toEqual([0, 1]);
    expect(problems).toEqual([{ line: 5, what: 'another recording begins here: left out from here on' }]);
  });

  it('puts rows of one time together, and keeps the first where both have a value', () => {
    const { timeS, values, problems } = log('Time,A,B', '0,1,', '0,,2', '0,9,2', '1,3,4');
    expect(timeS).toEqual([0, 1]);
    expect(values).toEqual([
      [1, 3],
      [2, 4],
    ]);
    expect(problems).toEqual([
      { line: 4, what: 'the time does not rise: readings left out where there was one already' },
    ]);
  });

  it('reads quoted cells, with the delimiter and quotes in them', () => {
    const { channels, values } = log('"Time","MAP, rear ""B"" (kPa)"', '"0","93.9"', '"1","1,094.0"');
    expect(channels[0]).toMatchObject({ name: 'MAP, rear "B"', unit: 'kPa' });
    expect(values).toEqual([[93.9, 1094]]);
  });

  it.each([
    ['', 'the file is empty'],
    [' \r\n\t', 'the file is empty'],
    ['MAP (kPa),IAT\n93.9,24\n94,25', 'no column holds the time'],
    ['0,1\n1,2', 'no line names the columns: a header with a column of time is needed'],
    ['only words\nand more of them', 'no line names the columns: a header with a column of time is needed'],
    [Uint8Array.from({ length: 4000 }, (_, index) => (index * index * 31 + 7 * index) % 256), 'the file is not text'],
    [new Uint8Array(500), 'the file is not text'],
  ])('says what is the matter with %j', (input, what) => {
    expect(parseScanLog(input)).toEqual({ channels: [], timeS: [], values: [], problems: [{ line: 1, what }] });
  });

  it('says that nothing follows the header', () => {
    expect(log('', 'Time,A,B').problems).toEqual([{ line: 2, what: 'no row of readings follows the header' }]);
  });

  it('says that there are times and nothing else', () => {
    expect(log('Time,A', '0,', '1,').problems).toEqual([{ line: 1, what: 'no channel holds a number' }]);
  });

  it('tells a hundred problems and sums up the rest', () => {
    const { problems } = log(
      'Time,A',
      ...Array.from({ length: 300 }, (_, index) => `${index},${index === 0 ? 1 : 'x'}`),
    );
    expect(problems).toHaveLength(101);
    expect(problems.at(-1)).toEqual({ line: 103, what: 'and 199 more from here on' });
  });

  it('is not brought to a halt by very long cells', () => {
    const long = 100_000;
    const lines = [
      `Time,A${' '.repeat(long)}b`,
      `0,${'-'.repeat(long)}x`,
      `1,${'1'.repeat(long)}x`,
      `"2","${'"'.repeat(long)}"`,
      '3,4',
    ];
    const { timeS, values } = log(...lines);
    expect(timeS).toEqual([0, 1, 2, 3]);
    expect(values).toEqual([[undefined, undefined, undefined, 4]]);
  });

  it('never throws and keeps its shape, whatever the bytes', () => {
    const cell = fc.constantFrom(
      'Time',
      'MAP (kPa)',
      '0',
      '1',
      '2.5',
      '3,7',
      '12:00:01',
      '',
      'N/A',
      '"',
      'x',
      's',
      'kPa',
      ';',
      '\t',
    );
    const rows = fc
      .array(
        fc.array(cell, { maxLength: 5 }).map((cells) => cells.join(',')),
        { maxLength: 8 },
      )
      .map((lines) => lines.join('\n'));
    fc.assert(
      fc.property(fc.oneof(rows, fc.string(), fc.uint8Array({ maxLength: 200 })), (input) => {
        const { channels, timeS, values, problems } = parseScanLog(input);
        expect(values).toHaveLength(channels.length);
        for (const series of values) {
          expect(series).toHaveLength(timeS.length);
          expect(series.every((value) => value === undefined || Number.isFinite(value))).toBe(true);
        }
        expect(timeS.every((time, index) => (index === 0 ? time === 0 : time >= timeS[index - 1]!))).toBe(true);
        expect(channels.length + problems.length).toBeGreaterThan(0);
      }),
      { numRuns: 500 },
    );
  });
});
