import { instruments, stepOf, viewOf, walkedTo } from '../testing/run-for-specs';
import { startStage, type StartAnswers } from './start-stages';

const nothing: StartAnswers = { isPrepared: false, knowsStopActions: false, without: [], again: undefined };
const prepared: StartAnswers = { ...nothing, isPrepared: true, knowsStopActions: true };

const fresh = () => walkedTo('start', { cautions: false });
const stage = (walk: ReturnType<typeof fresh>, answers: StartAnswers) =>
  startStage(viewOf(walk), stepOf(walk, 'start'), answers);

describe('startStage', () => {
  it('asks for what must be ready, then for the stop actions, then shows the first caution', () => {
    expect(stage(fresh(), nothing)).toEqual({ show: 'prerequisites' });
    expect(stage(fresh(), { ...nothing, isPrepared: true })).toEqual({ show: 'stop-actions' });
    expect(stage(fresh(), prepared)).toEqual({ show: 'caution', caution: 0 });
  });

  it('goes on after a reload with the first caution that was not acknowledged', () => {
    const walk = fresh().do({ do: 'acknowledge-caution', caution: 0 }, { do: 'acknowledge-caution', caution: 1 });
    expect(stage(walk, nothing)).toEqual({ show: 'caution', caution: 2 });
  });

  it('asks for the gear one by one, optional ones too, and is ready when each is answered', () => {
    const walk = walkedTo('start');
    expect(stage(walk, prepared)).toMatchObject({ show: 'gear', need: { role: 'gauge' }, place: 1, of: 5 });
    for (const [role, instrument] of Object.entries(instruments)) walk.do({ do: 'choose-gear', role, instrument });
    expect(stage(walk, prepared)).toMatchObject({ show: 'gear', need: { role: 'barometer', optional: true } });
    expect(stage(walk, { ...prepared, without: ['barometer'] })).toEqual({ show: 'ready' });
  });

  it('shows a piece of gear again that is to be changed', () => {
    const walk = walkedTo('start');
    for (const [role, instrument] of Object.entries(instruments)) walk.do({ do: 'choose-gear', role, instrument });
    expect(stage(walk, { ...prepared, without: ['barometer'], again: 'probe' })).toMatchObject({
      show: 'gear',
      need: { role: 'probe' },
    });
  });
});
