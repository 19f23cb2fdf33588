import { compareHalves } from '.';
import { RunWalk } from './testing/run-walk';
import { fineGauge, procedure, scanTool } from './testing/small-walks';

function half(named: 'cold' | 'warm', manifold: string, header: object = {}): RunWalk {
  return new RunWalk(procedure, { half: named, pairId: 'pair-1', ...header })
    .cautions(1)
    .do(
      { do: 'choose-gear', role: 'gauge', instrument: fineGauge },
      { do: 'choose-gear', role: 'scanTool', instrument: scanTool },
      { do: 'confirm' },
      { do: 'record', name: 'stationPressure', way: 'altimeter-setting', text: '1013.25', unit: 'hPa' },
    )
    .cautions(1)
    .do({ do: 'record', name: 'manifoldPressure', text: manifold, unit: 'kPa' });
}

describe('the halves of a pair', () => {
  it('are compared quantity by quantity, warm less cold, with what the difference is known to', () => {
    const comparison = compareHalves(half('warm', '95.2').state, half('cold', '94.0').state);
    if (!comparison.ok) throw new Error(comparison.what);
    const manifold = comparison.compared.find(({ name }) => name === 'manifoldPressure');
    // U of each: 2 sqrt((0.5 / sqrt 3)^2 + (0.05 / sqrt 3)^2) = 0.580 kPa; of the difference: 0.821 kPa (JCGM 100, 5.1.2).
    expect(manifold).toMatchObject({ text: '1.2', uncertaintyText: '0.8', unit: 'kPa', differs: true });
    expect(manifold?.uncertainty).toBeCloseTo(821, -1);
    expect(comparison.compared.find(({ name }) => name === 'stationPressure')).toMatchObject({
      difference: 0,
      differs: false,
    });
  });

  it.each([
    ['the same half twice', {}, 'cold'],
    ['another pair', { pairId: 'pair-2' }, 'warm'],
    ['practice', { kind: 'practice' }, 'warm'],
    ['another visit', { visitId: 'another' }, 'warm'],
  ] as const)('are none with %s', (_words, header, named) => {
    expect(compareHalves(half('cold', '94.0').state, half(named, '94.0', header).state)).toMatchObject({ ok: false });
  });
});
