import { valveSeal, viewOf, walkedTo } from '../testing/run-for-specs';
import { formulaParts } from './formula-words';

describe('formulaParts', () => {
  it('puts the run\u2019s numbers where the names stand, with real signs between', () => {
    expect(formulaParts(viewOf(walkedTo('sensors-at-rest')), 'manifoldPressure - boostPressure')).toEqual([
      { kind: 'value', name: 'manifoldPressure', label: 'Manifold pressure', value: '94.2 kPa' },
      { kind: 'text', text: ' \u2212 ' },
      { kind: 'value', name: 'boostPressure', label: 'Boost pressure', value: '94.1 kPa' },
    ]);
  });

  it('leaves a name without a number where it was never measured', () => {
    const parts = formulaParts({ procedure: valveSeal, state: walkedTo('key-on').state }, 'highestGauge < sealHigh');
    expect(parts).toMatchObject([
      { name: 'highestGauge', value: undefined },
      {},
      { name: 'sealHigh', value: '5.0 kPa' },
    ]);
  });
});
