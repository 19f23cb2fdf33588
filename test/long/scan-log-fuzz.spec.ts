import * as fc from 'fast-check';
import { mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { parseScanLog } from '../../procedures/calculations';
import { brokenContract, cellSoup, damagedLog } from '../support/scan-log-contract';

const numRuns = 10_000;
const results = join(__dirname, '../../test-results/long');

describe('parseScanLog on what is no log', () => {
  it.each([
    ['random bytes', fc.uint8Array({ maxLength: 2000 })],
    ['random text', fc.string({ unit: 'binary', maxLength: 1000 })],
    ['cells in any order', cellSoup],
    ['good files that were damaged', damagedLog],
  ] as [string, fc.Arbitrary<Uint8Array | string>][])('keeps its contract: %s', (_what, input) => {
    fc.assert(
      fc.property(input, (bytes) => expect(brokenContract(bytes)).toBeUndefined()),
      { numRuns },
    );
  });
});

describe('a file of 20 MB', () => {
  it('is read in ten times the time of one of 2 MB', () => {
    const costS = (megabytes: number): number => {
      const row = (index: number) => `${(index / 10).toFixed(1)},${(93.9 + (index % 50) / 10).toFixed(1)},24.5,1500\n`;
      const lines = ['Time,MAP (kPa),IAT (C),Engine speed (rpm)\n'];
      for (let index = 0, sum = 0; sum < megabytes * 1e6; index++)
        sum += lines[lines.push(row(index)) - 1]?.length ?? 0;
      const bytes = new Uint8Array(Buffer.from(lines.join('')));
      const began = process.cpuUsage();
      expect(parseScanLog(bytes).timeS).toHaveLength(lines.length - 1);
      const { user, system } = process.cpuUsage(began);
      return (user + system) / 1e6;
    };
    costS(2);
    const [two, twenty] = [costS(2), costS(20)];
    mkdirSync(results, { recursive: true });
    const told = `parseScanLog: 2 MB in ${two.toFixed(2)} s, 20 MB in ${twenty.toFixed(2)} s of processor time\n`;
    writeFileSync(join(results, 'scan-log.txt'), told);
    expect(twenty / two).toBeLessThan(16);
  });
});
