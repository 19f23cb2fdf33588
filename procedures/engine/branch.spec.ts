import { routeAhead } from '.';
import { atManifold, procedure } from './testing/small-walks';

describe('a branch', () => {
  it('is recorded with its expression, the numbers that decided and why', () => {
    const walk = atManifold().cautions(1).do({ do: 'record', name: 'manifoldPressure', text: '98.0', unit: 'kPa' });
    expect(
      walk.events.find(({ type, data }) => type === 'branch-taken' && 'step' in data && data.step === 'manifold')?.data,
    ).toMatchObject({
      when: 'outOfBand(manifoldPressure)',
      inputs: [{ name: 'manifoldPressure', label: 'Manifold pressure', text: '98.0', unit: 'kPa', uncertainty: '0.6' }],
      because: expect.stringMatching(/^manifold pressure is off by 4\.1 \u00b1 0\.7 kPa$/) as string,
      verdict: 'sensorOff',
    });
  });

  it('may be overruled with a reason; both ways are kept', () => {
    const walk = atManifold().cautions(1).do({ do: 'record', name: 'manifoldPressure', text: '98.0', unit: 'kPa' });
    expect(walk.ask({ do: 'overrule', exit: 'otherwise', reason: ' ' })).toMatchObject({ ok: false, field: 'reason' });
    walk.do({ do: 'overrule', exit: 'otherwise', reason: 'the sensor was changed yesterday' });
    expect(walk.state.current?.id).toBe('dipstick');
    expect(walk.state.verdict).toBeUndefined();
    expect(walk.events.find(({ type }) => type === 'branch-overruled')?.data).toMatchObject({
      computed: 'next-0',
      chosen: 'otherwise',
    });
  });
});

describe('the Route', () => {
  it('names the way that comes next first, then the others', () => {
    expect(routeAhead(procedure, atManifold().state)).toEqual([
      { to: 'dipstick', label: '4, pull the dipstick', isMain: true },
      { to: 'restore', label: '7, put everything back', isMain: false },
    ]);
  });
});
