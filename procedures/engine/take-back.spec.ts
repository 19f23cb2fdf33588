import { atListen } from './testing/small-walks';

const point = (text: string, timeS: number) => ({ do: 'record', name: 'gauge', text, unit: 'kPa', timeS }) as const;

describe('taking back', () => {
  it('lets the newest typed point of a ramp no longer count, and keeps it in the record', () => {
    const walk = atListen();
    walk.do(point('0.0', 0), point('0.5', 4), point('10.5', 8));
    walk.do({ do: 'take-back', name: 'gauge', reason: 'slip of the finger' });
    expect(walk.state.current?.takes['gauge']?.map(({ text }) => text)).toEqual(['0.0', '0.5']);
    const [taken, undone] = walk.events.slice(-2);
    expect(taken).toMatchObject({ type: 'reading-recorded', data: { figure: { text: '10.5' } } });
    expect(undone).toMatchObject({ type: 'undone', data: { seq: taken?.seq, reason: 'slip of the finger' } });
  });

  it('says that there is nothing to be taken back yet', () => {
    const walk = atListen();
    expect(walk.ask({ do: 'take-back', name: 'gauge', reason: '' })).toMatchObject({
      ok: false,
      code: 'nothing-taken',
    });
  });
});
