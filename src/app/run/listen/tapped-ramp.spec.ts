import type { Take } from '../../../../procedures/engine';
import { tappedRamp } from './tapped-ramp';

const take = (timeS: number, text: string): Take => ({ seq: 1, text, unit: 'kPa', source: 'typed', timeS });
const point = (timeS: number, text: string) => ({ do: 'record', name: 'gauge', text, unit: 'kPa', timeS }) as const;

describe('a ramp as it was tapped', () => {
  it('goes on from what is written with what waits, in its order', () => {
    const ramp = tappedRamp({ points: [take(0, '0.0')], marks: {} }, [
      point(2, '0.5'),
      { do: 'mark', mark: 'noise-begins', timeS: 2.1, by: 'tap' },
      point(3, '1.0'),
      { do: 'take-back', name: 'gauge', reason: 'taken back' },
    ]);
    expect(ramp.points.map(({ text }) => text)).toEqual(['0.0', '0.5']);
    expect(ramp.marks).toEqual({ 'noise-begins': { timeS: 2.1 } });
  });

  it('counts a point once that is written and still in line', () => {
    expect(tappedRamp({ points: [take(0, '0.0')], marks: {} }, [point(0, '0.0')]).points).toHaveLength(1);
  });

  it('takes a mark away', () => {
    const marks = { 'noise-stops': { timeS: 4, seq: 3, by: 'tap' } };
    expect(tappedRamp({ points: [], marks }, [{ do: 'unmark', mark: 'noise-stops' }]).marks).toEqual({});
  });
});
