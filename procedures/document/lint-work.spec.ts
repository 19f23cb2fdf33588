import { Session, type Profiler } from 'node:inspector';
import { lintProcedure } from './lint';
import type { ProcedureDocument } from './procedure-document';
import { longProcedure } from './testing/long-procedure';
import { wideProcedure } from './testing/wide-procedure';

/*
 * How much work a lint is. It is counted, not timed: V8 counts how often each block of code is entered (precise
 * coverage), so that the figures are the same on every machine and whatever else it does.
 */
class WorkCounter {
  private readonly session = new Session();

  constructor() {
    this.session.connect();
    this.session.post('Profiler.enable');
    this.session.post('Profiler.startPreciseCoverage', { callCount: true, detailed: true });
    // What runs the first time from here on is compiled with its counters: nothing may have been run before.
    this.blocksEntered(longProcedure(40, 8));
  }

  blocksEntered(document: ProcedureDocument): number {
    this.taken();
    expect(lintProcedure(document).errors).toEqual([]);
    const counted = this.taken().filter(({ url }) => /procedures\/|mathjs/.test(url));
    return counted
      .flatMap(({ functions }) => functions.flatMap(({ ranges }) => ranges))
      .reduce((sum, { count }) => sum + count, 0);
  }

  close(): void {
    this.session.post('Profiler.stopPreciseCoverage');
    this.session.disconnect();
  }

  /** What was counted since it was last taken. */
  private taken(): readonly Profiler.ScriptCoverage[] {
    let scripts: readonly Profiler.ScriptCoverage[] = [];
    this.session.post('Profiler.takePreciseCoverage', (_error, { result }) => (scripts = result));
    return scripts;
  }
}

const findings = 8;
/** As many steps in all: the start card, the restore step and the findings, "not completed" among them, included. */
const ofSteps = (steps: number): ProcedureDocument => longProcedure(steps - findings - 3, findings);

describe('work', () => {
  let counter: WorkCounter;
  beforeAll(() => (counter = new WorkCounter()));
  afterAll(() => counter.close());

  it('at most doubles, and a little, with twice the steps', () => {
    const [short, long] = [250, 500].map((steps) => counter.blocksEntered(ofSteps(steps)));
    expect(short).toBeGreaterThan(100_000);
    expect((long ?? Number.NaN) / (short ?? Number.NaN)).toBeLessThan(2.3);
  });

  it('at most doubles, and a little, with twice the branches', () => {
    const [few, many] = [2, 6].map((more) => counter.blocksEntered(wideProcedure(100, findings, more)));
    expect((many ?? Number.NaN) / (few ?? Number.NaN)).toBeLessThan(2.3);
  });

  it('at most doubles, and a little, with twice the findings', () => {
    const [few, many] = [20, 40].map((count) => counter.blocksEntered(longProcedure(200, count)));
    expect((many ?? Number.NaN) / (few ?? Number.NaN)).toBeLessThan(2.3);
  });
});
