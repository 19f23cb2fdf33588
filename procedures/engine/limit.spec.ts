import type { Series } from '.';
import { atListen, record } from './testing/small-walks';

describe('a limit', () => {
  it('that a typed value exceeds takes the run until it is acknowledged, and the value does not count', () => {
    const walk = atListen().do({ do: 'record', name: 'gauge', text: '36.0', unit: 'kPa', timeS: 4 });
    expect(walk.state.alarm).toMatchObject({ limit: 'ceiling', says: 'More than 34.5 kPa.', figure: { text: '36.0' } });
    expect(walk.ask({ do: 'mark', mark: 'noise-begins', timeS: 1, by: 'tap' })).toMatchObject({
      ok: false,
      code: 'alarm',
    });
    walk.do({ do: 'acknowledge-limit' });
    expect(walk.state.alarm).toBeUndefined();
    expect(walk.state.current?.takes['gauge'] ?? []).toEqual([]);
  });

  it('that a ramp exceeds lets it begin anew by itself: no point or mark of it counts, and all stay in the record', () => {
    const walk = atListen().do(
      { do: 'record', name: 'gauge', text: '0.0', unit: 'kPa', timeS: 0 },
      { do: 'mark', mark: 'noise-begins', timeS: 2, by: 'tap' },
      { do: 'record', name: 'gauge', text: '3.0', unit: 'kPa', timeS: 4 },
      { do: 'mark', mark: 'noise-stops', timeS: 6, by: 'tap' },
      { do: 'record', name: 'gauge', text: '36.0', unit: 'kPa', timeS: 8 },
      { do: 'acknowledge-limit' },
    );
    expect(walk.state.current?.takes['gauge'] ?? []).toEqual([]);
    expect(walk.state.series['ramp']).toBeUndefined();
    const points = walk.events.filter(({ type, data }) => type === 'reading-recorded' && 'timeS' in data);
    expect(points).toHaveLength(3);
    expect(walk.events.filter(({ type }) => type === 'mark-placed')).toHaveLength(2);

    walk.do({ do: 'record', name: 'gauge', text: '0.0', unit: 'kPa', timeS: 0 });
    expect(walk.state.current?.takes['gauge']).toMatchObject([{ text: '0.0', timeS: 0 }]);
  });

  it('that a reading exceeds leaves the earlier rounds of the step as they are', () => {
    const walk = atListen();
    const before = walk.state.values;
    walk.do({ do: 'record', name: 'gauge', text: '36.0', unit: 'kPa', timeS: 0 }, { do: 'acknowledge-limit' });
    expect(walk.state.values).toEqual(before);
  });

  it('is held against every sample of a series, manifold pressure less the air of the place too', () => {
    const over: Series = {
      timeS: [0, 1, 2],
      channels: [
        { name: 'gauge', unit: 'kPa', values: [0, 1, 2] },
        { name: 'manifold', unit: 'kPa', values: [94, 130, 95] },
      ],
    };
    const walk = atListen().do({ do: 'import-series', record, series: over });
    expect(walk.state.alarm).toMatchObject({ name: 'manifold', figure: { text: '130.0' } });
    // Acknowledged, it is still no series to find anything in: the ramp is taken again.
    walk.do({ do: 'acknowledge-limit' });
    expect(walk.state.series['ramp']).toBeUndefined();
    expect(walk.ask({ do: 'finish-listening', series: over })).toMatchObject({ ok: false, code: 'no-series' });
    expect(walk.state.exceeded).toHaveLength(1);
  });
});
