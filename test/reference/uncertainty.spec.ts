import { expandedUncertainty, judge } from '../../procedures/calculations';
import { checkValues, expectWithin, numberOf } from './check-values';

describe('expanded uncertainty', () => {
  it.each(
    checkValues('i', 'distribution', 'half_width').filter(([, { inputs }]) => inputs['distribution'] === 'rectangular'),
  )('%s', (_title, value) => {
    expectWithin(value, 'u', expandedUncertainty({ accuracy: numberOf(value.inputs, 'half_width'), k: 1 }));
  });

  it.each(checkValues('i', 'resolution'))('%s', (_title, value) => {
    expectWithin(value, 'u', expandedUncertainty({ resolution: numberOf(value.inputs, 'resolution'), k: 1 }));
  });

  it.each(checkValues('i', 'type_a_u', 'rectangular_half_width'))('%s', (_title, value) => {
    const accuracy = numberOf(value.inputs, 'rectangular_half_width');
    const repeatDeviation = numberOf(value.inputs, 'type_a_u');
    expectWithin(value, 'u_rect', expandedUncertainty({ accuracy, k: 1 }));
    expectWithin(value, 'u_combined', expandedUncertainty({ accuracy, repeatDeviation, k: 1 }));
  });

  it.each(checkValues('i', 'components'))('%s', (_title, value) => {
    const components = value.inputs['components'] as Record<string, unknown>[];
    const sources = {
      resolution: numberOf(components[0]!, 'resolution'),
      accuracy: numberOf(components[1]!, 'half_width'),
    };
    expectWithin(value, 'u_combined', expandedUncertainty({ ...sources, k: 1 }));
    expectWithin(value, 'U', expandedUncertainty({ ...sources, k: numberOf(value.inputs, 'k') }));
  });
});

describe('decisions with a guard band', () => {
  const verdicts: Record<string, string> = { accept: 'in', reject: 'out', inconclusive: 'too-close' };
  const limit = (name: 'low' | 'high', found: unknown) => (found === null ? {} : { [name]: Number(found) });

  it.each(checkValues('i', 'guard_band'))('%s', (_title, { inputs, expected }) => {
    const verdict = judge({
      value: numberOf(inputs, 'y'),
      uncertainty: numberOf(inputs, 'U'),
      ...limit('low', inputs['lower_limit']),
      ...limit('high', inputs['upper_limit']),
    });
    expect(verdict).toBe(verdicts[String(expected['decision'])]);
  });
});
