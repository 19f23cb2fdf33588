import { areUnaware, begunUnaware, begunWords, knownRuns, runsOfSameWork, standingWords } from './known-runs';
import type { RunRow } from './stored-rows';
import type { VisitRun } from './wire';

const told = (runId: string, change: Partial<VisitRun> = {}): VisitRun => ({
  runId,
  visitId: 'v-1',
  procedureId: 'seal',
  procedureTitle: 'Crankcase valve seal',
  half: 'cold',
  personName: 'R. Adeyemi',
  tabletLabel: 'B2',
  openedAt: Date.UTC(2026, 11, 2, 8, 5),
  status: 'open',
  ...change,
});
const own = (runId: string, status = 'closed'): RunRow =>
  ({
    runId,
    visitId: 'v-1',
    header: { visitId: 'v-1', procedureId: 'seal', half: 'cold' },
    changedAt: Date.UTC(2026, 11, 2, 9),
    summary: { procedureTitle: 'Seal', personName: 'I. Okafor', openedAt: 1, status, verdict: 'Does not seal' },
  }) as unknown as RunRow;

describe('the runs that a tablet knows of', () => {
  it('are its own and those of others, each once: what is here knows better', () => {
    const runs = knownRuns([own('r-1')], [told('r-1'), told('r-2')]);
    expect(runs.map(({ runId, isHere, tablet, status }) => [runId, isHere, tablet, status])).toEqual([
      ['r-1', true, 'this tablet', 'closed'],
      ['r-2', false, 'tablet B2', 'open'],
    ]);
  });

  it.each<[Partial<VisitRun>, number]>([
    [{}, 1],
    [{ half: 'warm' }, 0],
    [{ visitId: 'v-2' }, 0],
    [{ procedureId: 'drop' }, 0],
  ])('are the same work with %o: %d', (change, count) => {
    const work = { visitId: 'v-1', procedureId: 'seal', half: 'cold' } as const;
    expect(runsOfSameWork(knownRuns([], [told('r-2', change)]), work)).toHaveLength(count);
  });

  it('are the same work without halves, too', () => {
    const { half: _half, ...whole } = told('r-3');
    const runs = knownRuns([], [whole, told('r-2')]);
    const work = { visitId: 'v-1', procedureId: 'seal' };
    expect(runsOfSameWork(runs, work).map(({ runId }) => runId)).toEqual(['r-3']);
  });

  it('were begun unaware unless the one names the other', () => {
    const again = (...besides: string[]) => ({ again: { because: 'Repaired since', besides } });
    expect(areUnaware([told('r-1')])).toBe(false);
    expect(areUnaware([told('r-1'), told('r-2')])).toBe(true);
    expect(areUnaware([told('r-1'), told('r-2', again('r-1'))])).toBe(false);
    expect(areUnaware([told('r-1', again('r-2')), told('r-2')])).toBe(false);
    expect(areUnaware([told('r-1'), told('r-2', again('r-1')), told('r-3', again('r-1'))])).toBe(true);
    expect(areUnaware([told('r-1'), told('r-2', again('r-1')), told('r-3', again('r-1', 'r-2'))])).toBe(false);
  });

  it('are grouped by visit, procedure and half', () => {
    const runs = knownRuns([own('r-1')], [told('r-2'), told('r-3', { half: 'warm' }), told('r-4', { visitId: 'v-2' })]);
    expect(begunUnaware(runs).map((group) => group.map(({ runId }) => runId))).toEqual([['r-1', 'r-2']]);
  });

  it('are told in words', () => {
    const [here, there] = knownRuns([own('r-1')], [told('r-2')]);
    const now = Date.UTC(2026, 11, 3, 12);
    expect(begunWords(there!, now)).toMatch(/^R\. Adeyemi, yesterday \d+:05, on tablet B2$/);
    expect([standingWords(here!), standingWords(there!)]).toEqual(['closed: Does not seal', 'still open']);
  });
});
