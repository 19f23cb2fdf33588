import { lintProcedure } from '../../../procedures/document/lint';
import { longProcedure } from '../../../procedures/document/testing/long-procedure';

describe('time', () => {
  it('is under a second of the processor for the 500 steps that a document can have', () => {
    const document = longProcedure(489, 8);
    expect(document.steps).toHaveLength(500);
    const times = Array.from({ length: 5 }, () => {
      const begin = process.cpuUsage();
      expect(lintProcedure(document).errors).toEqual([]);
      const { user, system } = process.cpuUsage(begin);
      return (user + system) / 1_000;
    });
    const [, , medianMs = Number.NaN] = times.sort((a, b) => a - b);
    expect(medianMs).toBeLessThan(1_000);
  });
});
