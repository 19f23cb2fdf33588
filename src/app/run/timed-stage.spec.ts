import { viewOf } from './testing/run-for-specs';
import { roundTo } from '../../../procedures/engine/testing/walk-round-walk';
import { timedStage } from './timed-stage';
import type { RunWalk } from '../../../procedures/engine/testing/run-walk';

function stageOf(walk: RunWalk) {
  const step = walk.procedure.step(walk.state.current?.id ?? '');
  if (step?.kind !== 'hold' && step?.kind !== 'wait') throw new Error('no timed step');
  return timedStage(viewOf(walk), step);
}

describe('what a timed step asks for', () => {
  it('is in a hold its first reading, the clock, and its last reading, in this order', () => {
    const walk = roundTo('hold');
    expect(stageOf(walk)).toBe('read');
    walk.do({ do: 'record', name: 'heldFrom', text: '6.0', unit: 'kPa' });
    expect(stageOf(walk)).toBe('clock');
    walk.do({ do: 'start-timer' });
    expect(stageOf(walk)).toBe('clock');
    // A clock that was set back proves nothing: the time is offered again.
    walk.do({ do: 'end-timer', certain: false });
    expect(stageOf(walk)).toBe('clock');
    walk.do({ do: 'start-timer' }, { do: 'end-timer', certain: true });
    expect(stageOf(walk)).toBe('read');
  });

  it('begins anew when the hold is taken again', () => {
    const walk = roundTo('where').do({ do: 'redo', step: 'hold', reason: 'once more' });
    expect(stageOf(walk)).toBe('read');
  });

  it('is in a wait with a least time the clock first', () => {
    const walk = roundTo('stand');
    expect(stageOf(walk)).toBe('clock');
    walk.do({ do: 'start-timer' }, { do: 'end-timer', certain: true });
    expect(stageOf(walk)).toBe('read');
  });
});
