import { WorkCounter } from '../../support/work-counter';
import { lintProcedure } from '../../../procedures/document/lint';
import type { ProcedureDocument } from '../../../procedures/document/procedure-document';
import { longProcedure } from '../../../procedures/document/testing/long-procedure';
import { wideProcedure } from '../../../procedures/document/testing/wide-procedure';

const findings = 8;
/** As many steps in all: the start card, the restore step and the findings, "not completed" among them, included. */
const ofSteps = (steps: number): ProcedureDocument => longProcedure(steps - findings - 3, findings);

describe('work', () => {
  let counter: WorkCounter;
  beforeAll(() => {
    counter = new WorkCounter(/procedures\/|mathjs/);
    // What is done once for all, such as making mathjs's grammar, is no document's.
    worked(ofSteps(50));
  });
  afterAll(() => counter.close());

  const worked = (document: ProcedureDocument): number =>
    counter.blocksEntered(() => expect(lintProcedure(document).errors).toEqual([]));

  it('at most doubles, and a little, with twice the steps', () => {
    const [short, long] = [250, 500].map((steps) => worked(ofSteps(steps)));
    expect(short).toBeGreaterThan(100_000);
    expect((long ?? Number.NaN) / (short ?? Number.NaN)).toBeLessThan(2.3);
  });

  it('at most doubles, and a little, with twice the branches', () => {
    const [few, many] = [2, 6].map((more) => worked(wideProcedure(100, findings, more)));
    expect((many ?? Number.NaN) / (few ?? Number.NaN)).toBeLessThan(2.3);
  });

  it('at most doubles, and a little, with twice the findings', () => {
    const [few, many] = [20, 40].map((count) => worked(longProcedure(200, count)));
    expect((many ?? Number.NaN) / (few ?? Number.NaN)).toBeLessThan(2.3);
  });
});
