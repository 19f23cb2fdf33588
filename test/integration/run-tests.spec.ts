import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { closingLine, ledgerOf, sum } from '../support/ledger.mjs';
import { countsOf } from '../support/run-part.mjs';
import { runSideBySide } from '../support/side-by-side.mjs';
import { testParts } from '../support/test-parts.mjs';

describe('how a part of the tests is counted', () => {
  let folder: string;
  beforeEach(() => (folder = mkdtempSync(join(tmpdir(), 'bayhand-report-'))));
  afterEach(() => rmSync(folder, { recursive: true }));

  const part = (kind: 'check' | 'jest' | 'browser', report?: unknown) => {
    const path = join(folder, 'report.json');
    if (report !== undefined) writeFileSync(path, typeof report === 'string' ? report : JSON.stringify(report));
    return { name: 'part', command: [], kind, report: path, cores: 1, after: [], needs: [] };
  };
  const jestReport = {
    numPassedTests: 5,
    numFailedTests: 0,
    numRuntimeErrorTestSuites: 0,
    numPendingTests: 1,
    numTodoTests: 1,
  };
  const browserReport = { stats: { expected: 4, unexpected: 0, flaky: 0, skipped: 2 }, errors: [] };

  it.each([
    ['a check by its exit code', part0('check'), 0, { passed: 1, failed: 0, skipped: 0 }],
    ['a check that fails', part0('check'), 2, { passed: 0, failed: 1, skipped: 0 }],
    ['specs', part0('jest', jestReport), 0, { passed: 5, failed: 0, skipped: 2 }],
    [
      'a spec file that can not be run',
      part0('jest', { ...jestReport, numRuntimeErrorTestSuites: 1 }),
      1,
      { passed: 5, failed: 1, skipped: 2 },
    ],
    ['browser tests', part0('browser', browserReport), 0, { passed: 4, failed: 0, skipped: 2 }],
    [
      'a browser test that passed only when tried again, and an error outside of all',
      part0('browser', { stats: { ...browserReport.stats, flaky: 1 }, errors: [{ message: 'x' }] }),
      1,
      { passed: 4, failed: 2, skipped: 2 },
    ],
    [
      'failure without a failed test',
      part0('jest', jestReport),
      1,
      { passed: 5, failed: 1, skipped: 2, note: 'exit code 1' },
    ],
    [
      'no test at all',
      part0('browser', { stats: { expected: 0, unexpected: 0, flaky: 0, skipped: 0 }, errors: [] }),
      0,
      { passed: 0, failed: 1, skipped: 0, note: 'ran no test' },
    ],
    [
      'too long',
      part0('jest', jestReport),
      undefined,
      { passed: 0, failed: 1, skipped: 0, note: 'ended after 15 minutes' },
    ],
  ])('%s', (_what, make, code, expected) => {
    expect(countsOf(make(), code)).toEqual(expected);
  });

  it.each([
    ['no report', undefined],
    ['half a report', '{"numPassedTests":5'],
    ['a report of something else', { passed: 5 }],
  ])('%s is a failure, whatever the exit code', (_what, report) => {
    expect(countsOf(part('jest', report), 0)).toMatchObject({
      passed: 0,
      failed: 1,
      note: expect.stringMatching(/^gave no result: /),
    });
  });

  /** A table is read before the folder is made. */
  function part0(kind: 'check' | 'jest' | 'browser', report?: unknown) {
    return () => part(kind, report);
  }
});

describe('the end of a test run', () => {
  it('adds up and says it in one line', () => {
    const counts = sum([
      { passed: 2, failed: 0, skipped: 1 },
      { passed: 3, failed: 1, skipped: 0 },
    ]);
    expect(closingLine(counts)).toBe('5 passed, 1 failed, 1 skipped');
  });

  it('tells what each part took', () => {
    const ledger = ledgerOf(
      [
        { name: 'set up', seconds: 0.44 },
        { name: 'types', seconds: 12.34, passed: 0, failed: 1, skipped: 0, note: 'could not run' },
      ],
      61.25,
    );
    expect(ledger.split('\n').map((line) => line.trimEnd())).toEqual([
      '',
      'What each part took:',
      'set up     0.4 s',
      'types     12.3 s  0 passed, 1 failed, 0 skipped  (could not run)',
      'whole     61.3 s',
      '',
    ]);
  });
});

describe('parts side by side', () => {
  const part = (name: string, more: { cores?: number; after?: string[]; needs?: string[] } = {}) => ({
    name,
    cores: 1,
    after: [],
    needs: [],
    ...more,
  });
  const run = async (parts: ReturnType<typeof part>[], failing: string[] = []) => {
    const begun: string[] = [];
    let busy = 0;
    let busiest = 0;
    const results = await runSideBySide(parts, 2, async ({ name, cores }, missing) => {
      begun.push(name);
      busy += cores;
      busiest = Math.max(busiest, busy);
      await new Promise((resolve) => setImmediate(resolve));
      busy -= cores;
      return { name, failed: failing.includes(name) || missing !== undefined ? 1 : 0, missing };
    });
    return { begun, busiest, results };
  };

  it('keeps both cores busy and no more', async () => {
    const { begun, busiest } = await run([part('a'), part('b'), part('c'), part('both', { cores: 2 }), part('d')]);
    expect(busiest).toBe(2);
    expect([...begun].sort()).toEqual(['a', 'b', 'both', 'c', 'd']);
  });

  it('begins a part after those that it comes after, failed or not', async () => {
    const { begun, results } = await run([part('types', { after: ['build'] }), part('build')], ['build']);
    expect(begun).toEqual(['build', 'types']);
    expect(results.map(({ failed }) => failed)).toEqual([0, 1]);
  });

  it('tells a part which needed one is missing', async () => {
    const { results } = await run([part('build'), part('browser', { needs: ['build'] })], ['build']);
    expect(results[1]).toEqual({ name: 'browser', failed: 1, missing: 'build' });
  });

  it('refuses to wait for what never begins', async () => {
    await expect(run([part('a', { after: ['nowhere'] })])).rejects.toThrow('Nothing can be begun of: a');
  });

  it('is given parts that wait only for one another', () => {
    const parts = testParts('/results');
    const names = parts.map(({ name }) => name);
    expect(new Set(names).size).toBe(names.length);
    for (const { after, needs } of parts) expect(names).toEqual(expect.arrayContaining([...after, ...needs]));
  });
});
