import { applyEvent, headerHash, replay } from '.';
import { atListen, procedure } from './testing/small-walks';

describe('replay', () => {
  const walk = atListen().do(
    { do: 'stop', reason: '' },
    { do: 'leave-stop', how: 'not-completed', reason: 'the plug moved' },
    { do: 'restore', item: 'dipstick' },
    { do: 'close' },
  );

  it('gives the same state from the start as event by event, and on from any prefix', () => {
    for (let cut = 1; cut <= walk.events.length; cut += 1) {
      const head = replay(procedure, walk.header, walk.events.slice(0, cut));
      if (!head.ok) throw new Error(head.refusal.what);
      expect(replay(procedure, walk.header, walk.events.slice(cut), head.state)).toEqual({
        ok: true,
        state: walk.state,
      });
    }
  });

  it('refuses with the event and the reason what has no place in the run', () => {
    const [first] = walk.events;
    expect(replay(procedure, walk.header, [])).toMatchObject({ ok: false, refusal: { code: 'not-opened' } });
    expect(replay(procedure, { ...walk.header, kind: 'practice' }, walk.events)).toMatchObject({
      ok: false,
      refusal: { seq: 1, code: 'chain' },
    });
    expect(applyEvent(procedure, walk.header, undefined, { ...first!, seq: 2 })).toMatchObject({
      ok: false,
      refusal: { code: 'chain' },
    });
    expect(first?.prev).toBe(headerHash(walk.header));
  });
});
