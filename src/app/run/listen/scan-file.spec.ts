import type { ListenStep } from '../../../../procedures/document';
import { guessColumns, largestFileBytes, readScanFile, refusedBySize, seriesOf, skippedWords } from './scan-file';

const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);
const step: Pick<ListenStep, 'channels'> = {
  channels: [
    { name: 'gauge', label: 'Gauge', unit: 'kPa', sense: 'gauge', needed: true },
    { name: 'manifold', label: 'Manifold', unit: 'kPa', sense: 'absolute', needed: false },
    { name: 'boost', label: 'Boost', unit: 'kPa', sense: 'absolute', needed: false },
    { name: 'sound', label: 'Level', unit: 'dB', needed: false },
  ],
};

describe('refusedBySize', () => {
  it('refuses a file of 200 MB by its size, and says what to take instead', () => {
    const message = refusedBySize('drive.mp4', 200 * 1024 * 1024);
    expect(message).toContain('200 MB');
    expect(message).toContain('less than 20 MB');
  });

  it('refuses an empty file', () => {
    expect(refusedBySize('log.csv', 0)).toContain('log.csv is empty');
  });

  it('lets the largest file through, and none that is larger', () => {
    expect(refusedBySize('log.csv', largestFileBytes)).toBeUndefined();
    expect(refusedBySize('log.csv', largestFileBytes + 1)).toBeDefined();
  });
});

describe('readScanFile', () => {
  it('reads a log', () => {
    const file = readScanFile('log.csv', bytesOf('time_s,gauge_kpa\n0,0.0\n1,0.1\n2,0.3\n'));
    expect(file).toMatchObject({ ok: true, fileName: 'log.csv', log: { timeS: [0, 1, 2] } });
  });

  it('says that a file without a column of time has none', () => {
    const file = readScanFile('log.csv', bytesOf('MAP (kPa),Boost (kPa)\n93.9,94.0\n94.0,94.1\n'));
    expect(file.ok).toBe(false);
    expect(file.ok ? '' : file.message).toMatch(/log\.csv cannot be used: .*time/);
  });

  it('says that a picture is not text', () => {
    const picture = Uint8Array.from(
      { length: 400 },
      (_, index) => [0x89, 0x50, 0x00, 0x01, 0xff, 0x07][index % 6] ?? 0,
    );
    const file = readScanFile('IMG_1.png', picture);
    expect(file.ok ? '' : file.message).toContain('the file is not text');
  });
});

describe('guessColumns', () => {
  it('tells the channels by their names, each column once', () => {
    const file = readScanFile(
      'log.csv',
      bytesOf('time_s,gauge_kpa,map_kpa,boost_kpa,sound_db\n0,0,94,94,46\n1,0.1,94,94,47\n'),
    );
    if (!file.ok) throw new Error(file.message);
    expect(guessColumns(step, file.log)).toEqual({ gauge: 0, manifold: 1, boost: 2, sound: 3 });
  });

  it('leaves a channel open that no column is named after', () => {
    const file = readScanFile('log.csv', bytesOf('Time (s),MAP (kPa)\n0,93.9\n1,94.0\n'));
    if (!file.ok) throw new Error(file.message);
    expect(guessColumns(step, file.log)).toEqual({ gauge: undefined, manifold: 0, boost: undefined, sound: undefined });
  });
});

describe('seriesOf', () => {
  it('keeps the unit of the file, and takes the channel of a column without one', () => {
    const file = readScanFile('log.csv', bytesOf('Time (s),Gauge (psi),MAP\n0,0.0,94.0\n1,0.1,94.5\n2,0.2,95.0\n'));
    if (!file.ok) throw new Error(file.message);
    const series = seriesOf(step, file.log, { gauge: 0, manifold: 1 });
    expect(series.channels).toEqual([
      { name: 'gauge', unit: 'psi', values: [0, 0.1, 0.2] },
      { name: 'manifold', unit: 'kPa', values: [94, 94.5, 95] },
    ]);
  });
});

describe('skippedWords', () => {
  it('names the first three lines and counts the rest', () => {
    const problems = [1, 2, 3, 4, 5].map((line) => ({ line, what: 'no number' }));
    expect(skippedWords({ channels: [], timeS: [], values: [], problems })).toEqual([
      'line 1: no number',
      'line 2: no number',
      'line 3: no number',
      'and 2 more lines',
    ]);
  });
});
