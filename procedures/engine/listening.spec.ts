import type { ListenStep } from '../document';
import type { Series } from '.';
import { analyseListening } from './listening';
import { atListen, procedure, record, series } from './testing/small-walks';

describe('listening', () => {
  it('finds the seal point between the marks and goes on to its finding', () => {
    const walk = atListen().do(
      { do: 'import-series', record, series },
      { do: 'mark', mark: 'noise-begins', timeS: 5, by: 'tap' },
      { do: 'mark', mark: 'noise-stops', timeS: 30, by: 'tap' },
      { do: 'finish-listening', series },
    );
    const sealPoint = walk.state.values['sealPoint'];
    // The ramp of this spec rises by 0.1 kPa a second; a person's mark at 30 s belongs to 29.4 s on average: 2.94 kPa.
    expect(Math.abs((sealPoint?.value ?? 0) - 2_940)).toBeLessThan(sealPoint?.uncertainty ?? 0);
    expect(sealPoint?.uncertainty).toBeLessThan(500);
    expect(walk.state.verdict).toBe('seals');
    expect(walk.state.current?.id).toBe('restore');
  });

  it('tells the gain of one sensor without the other', () => {
    const gauge = series.channels[0]?.values ?? [];
    const tracked: Series = {
      ...series,
      channels: [
        ...series.channels,
        { name: 'manifold', unit: 'kPa', values: gauge.map((value) => 93.9 + 0.9 * (value ?? 0)) },
      ],
    };
    const walk = atListen().do({ do: 'import-series', record, series: tracked });
    const step = { ...procedure.document.steps.find(({ id }) => id === 'listen')! } as ListenStep;
    const gains: ListenStep = {
      ...step,
      finds: [
        { what: 'manifold-gain', name: 'manifoldGain', label: 'Manifold gain', unit: '1' },
        { what: 'boost-gain', name: 'boostGain', label: 'Boost gain', unit: '1' },
      ],
    };
    const { found, problems } = analyseListening(walk.state, gains, tracked);
    expect(found.map(({ quantity, figure }) => [quantity.name, Number(figure.text).toFixed(3)])).toEqual([
      ['manifoldGain', '0.900'],
    ]);
    expect(problems).toHaveLength(1);
  });

  it('without a mark that it stopped gives no seal point and another way', () => {
    const walk = atListen().do(
      { do: 'import-series', record, series },
      { do: 'mark', mark: 'noise-begins', timeS: 5, by: 'tap' },
      { do: 'finish-listening', series },
    );
    expect(walk.state.values['sealPoint']).toBeUndefined();
    expect(walk.state.truths['noiseStopped']?.holds).toBe(false);
    expect(walk.state.current?.id).toBe('where');
  });

  it('drops what an earlier claim gave when the step is claimed again', () => {
    const walk = atListen().do(
      { do: 'import-series', record, series },
      { do: 'mark', mark: 'noise-begins', timeS: 5, by: 'tap' },
      { do: 'finish-listening', series },
      { do: 'choose', options: ['airAtJoint'], text: 'hose at the cooler' },
    );
    expect(walk.state.current?.id).toBe('listen');
    expect(walk.state.series['ramp']).toBeUndefined();
    expect(walk.state.values['highestGauge']).toBeUndefined();
  });

  it('refuses marks in the wrong order, and a series without its needed channel', () => {
    const walk = atListen().do(
      { do: 'import-series', record, series },
      { do: 'mark', mark: 'noise-begins', timeS: 30, by: 'tap' },
    );
    expect(walk.ask({ do: 'mark', mark: 'noise-stops', timeS: 10, by: 'tap' })).toMatchObject({
      ok: false,
      code: 'mark-order',
    });
    expect(walk.ask({ do: 'import-series', record, series: { ...series, channels: [] } })).toMatchObject({
      ok: false,
      code: 'missing-channel',
    });
  });
});

describe('a series that does not begin at zero', () => {
  const lifted = (by: number): Series => ({
    ...series,
    channels: series.channels.map((channel) => ({
      ...channel,
      values: channel.values.map((value) => (value ?? 0) + by),
    })),
  });

  it.each([
    [1.2, '1.3'],
    [-2, '-1.9'],
  ])('is refused: the gauge off by %d kPa would move the seal point by as much', (by, shown) => {
    const outcome = atListen().ask({ do: 'import-series', record, series: lifted(by) });
    expect(outcome).toMatchObject({ ok: false, code: 'not-at-zero', field: 'file' });
    expect(outcome.ok ? '' : outcome.message).toContain(`begins at ${shown} kPa, not at zero (0.6 kPa`);
  });

  it('is taken where the gauge is off by no more than its accuracy and step allow', () => {
    expect(atListen().ask({ do: 'import-series', record, series: lifted(0.5) })).toMatchObject({ ok: true });
  });

  it('is taken where the second point was typed within the first second', () => {
    const quick: Series = {
      timeS: [0, 0.9, 2],
      channels: [{ name: 'gauge', unit: 'kPa', values: [0, 1, 2] }],
    };
    expect(atListen().ask({ do: 'import-series', record, series: quick })).toMatchObject({ ok: true });
  });
});
