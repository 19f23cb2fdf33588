import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { parseScanLog } from '../../procedures/calculations';

interface LogTruth {
  readonly file: string;
  readonly note: string;
  readonly samples: number;
  readonly durationS: number;
  /** The lines of which something is told; none when it is left out. */
  readonly problems?: number[];
  readonly channels: { match: string; unit: string; at: { t: number; v: number }[] }[];
}

const folder = join(__dirname, 'logs');
const truths = ['truth.json', 'truth-dirty.json'].flatMap(
  (file) => JSON.parse(readFileSync(join(folder, file), 'utf8')) as LogTruth[],
);

describe('logs in the layouts that are met in the trade (common practice, no source)', () => {
  it.each(truths.map((truth) => [`${truth.file}: ${truth.note}`, truth] as const))('%s', (_title, truth) => {
    const log = parseScanLog(new Uint8Array(readFileSync(join(folder, truth.file))));
    expect(log.problems.map(({ line }) => line)).toEqual(truth.problems ?? []);
    expect(log.timeS).toHaveLength(truth.samples);
    expect(log.timeS[0]).toBe(0);
    expect(log.timeS.at(-1)).toBeCloseTo(truth.durationS, 6);
    expect(log.timeS.every((timeS, index) => index === 0 || timeS > log.timeS[index - 1]!)).toBe(true);
    for (const { match, unit, at } of truth.channels) {
      const channel = log.channels.findIndex(({ name }) => name.toLowerCase().includes(match));
      expect(log.channels[channel]?.unit).toBe(unit);
      for (const { t, v } of at) {
        const sample = log.timeS.findIndex((timeS) => Math.abs(timeS - t) < 1e-6);
        expect(log.values[channel]?.[sample]).toBe(v);
      }
    }
  });

  it('has every file of the folder to look at', () => {
    const files = readdirSync(folder).filter((name) => !name.endsWith('.json'));
    expect(truths.map(({ file }) => file).sort()).toEqual(files.sort());
    expect(files).toHaveLength(22);
  });
});
