import * as fc from 'fast-check';
import { parseScanLog } from '../../procedures/calculations';
import { brokenContract, cellSoup, damagedLog, goodLogs } from '../support/scan-log-contract';

/** Ten times as many in npm run test:long. */
const numRuns = 300;

describe('parseScanLog on what is no log', () => {
  it.each([
    ['random bytes', fc.uint8Array({ maxLength: 400 })],
    ['random text', fc.string({ unit: 'binary', maxLength: 300 })],
    ['cells in any order', cellSoup],
    ['good files that were damaged', damagedLog],
  ] as [string, fc.Arbitrary<Uint8Array | string>][])('keeps its contract: %s', (_what, input) => {
    fc.assert(
      fc.property(input, (bytes) => expect(brokenContract(bytes)).toBeUndefined()),
      { numRuns },
    );
  });

  it('keeps its contract on the good files themselves', () => {
    expect(goodLogs.map(brokenContract)).toEqual(goodLogs.map(() => undefined));
  });
});

/** Processor time of this process in milliseconds, which a busy machine does not stretch; the least of three. */
function costMs(text: string): number {
  const costs = Array.from({ length: 3 }, () => {
    const began = process.cpuUsage();
    parseScanLog(text);
    const { user, system } = process.cpuUsage(began);
    return (user + system) / 1000;
  });
  return Math.min(...costs);
}

const repeated = (part: string, length: number): string => part.repeat(Math.ceil(length / part.length));

describe('the time of parseScanLog', () => {
  it.each<[string, (length: number) => string]>([
    ['a plain log', (length) => `Time,MAP (kPa),IAT (C)\n${rows(length)}`],
    ['one line of cells', (length) => `Time,MAP\n0,93.9\n${repeated('1.5,', length)}`],
    ['one line of digits', (length) => `Time,MAP\n0,93.9\n${repeated('1', length)}`],
    ['one line of blanks', (length) => `Time,MAP\n0,93.9\n${repeated(' ', length)}x`],
    ['one line of quotes', (length) => `Time,MAP\n0,93.9\n${repeated('"', length)}`],
    [
      'a header of very many columns over short rows',
      (length) => `Time,${repeated('a,', length / 2)}\n${rows(length / 2)}`,
    ],
    ['every row a channel of its own', (length) => `time,channel,value\n${ownChannels(length)}`],
    ['headers that come again', (length) => repeated('Time,MAP (kPa)\n0,93.9\n', length)],
    ['a preamble without end', (length) => `${repeated('words, and more of them\n', length)}Time,MAP\n0,1\n`],
  ])('grows with the length of the file and no faster: %s', (_what, textOf) => {
    const [short, long] = [textOf(200_000), textOf(2_000_000)];
    costMs(short);
    // Ten times the length; what memory costs beyond that is the machine's.
    expect(costMs(long)).toBeLessThan(16 * costMs(short) + 100);
  });
});

function rows(length: number): string {
  const lines: string[] = [];
  for (let index = 0, sum = 0; sum < length; index++) {
    const line = `${(index / 10).toFixed(1)},${(93.9 + (index % 50) / 10).toFixed(1)},${24 + (index % 7)}\n`;
    lines.push(line);
    sum += line.length;
  }
  return lines.join('');
}

function ownChannels(length: number): string {
  const lines: string[] = [];
  for (let index = 0, sum = 0; sum < length; index++) {
    const line = `${index},c${index},${index % 9}\n`;
    lines.push(line);
    sum += line.length;
  }
  return lines.join('');
}
