import { atListen, atManifold } from './testing/small-walks';

describe('stop, pause and what is disturbed', () => {
  it('stops on any step and leads back to it', () => {
    const walk = atListen().do({ do: 'stop', reason: '' });
    expect(walk.state.status).toBe('stopped');
    expect(walk.ask({ do: 'confirm' })).toMatchObject({ ok: false, code: 'not-open' });
    walk.do({ do: 'leave-stop', how: 'go-back' });
    expect(walk.state).toMatchObject({ status: 'open', current: { id: 'listen' } });
  });

  it('or ends as not completed, and does not close before all is put back', () => {
    const walk = atListen().do({ do: 'stop', reason: 'hose moved' }, { do: 'leave-stop', how: 'not-completed' });
    expect(walk.state).toMatchObject({ status: 'open', verdict: 'notCompleted', current: { id: 'restore' } });
    expect(walk.ask({ do: 'confirm' })).toMatchObject({
      ok: false,
      code: 'still-disturbed',
      message: 'Still to be put back: dipstick.',
    });
    expect(walk.ask({ do: 'close' })).toMatchObject({ ok: false });
    walk.do({ do: 'restore', item: 'dipstick' });
    expect(walk.state.finding).toBe('notCompleted');
    walk.do({ do: 'close' });
    expect(walk.state.status).toBe('closed');
  });

  it('asks why before it ends as not completed, keeps it, and leaves it open on the way back', () => {
    const walk = atListen().do({ do: 'stop', reason: '' });
    expect(walk.ask({ do: 'leave-stop', how: 'not-completed', reason: ' ' })).toMatchObject({
      ok: false,
      code: 'say-why',
      field: 'reason',
      message: 'Say in a few words why the test ends here.',
    });
    walk.do({ do: 'leave-stop', how: 'go-back', reason: ' the plug sits again ' });
    expect(walk.events.at(-1)).toMatchObject({
      type: 'resumed',
      data: { from: 'stopped', reason: 'the plug sits again' },
    });
    walk.do({ do: 'stop', reason: '' }, { do: 'leave-stop', how: 'not-completed', reason: 'the plug moved' });
    expect(walk.state.walked.find(({ step }) => step === 'listen')?.way).toMatchObject({
      exit: 'stop',
      reason: 'the plug moved',
    });
  });

  it('puts on the open list what the stopped step may have taken apart already', () => {
    const walk = atManifold().cautions(1).do({ do: 'record', name: 'manifoldPressure', text: '94.2', unit: 'kPa' });
    walk.do({ do: 'stop', reason: '' });
    expect(walk.state.current?.id).toBe('dipstick');
    expect(walk.state.disturbed.map(({ item }) => item)).toEqual(['dipstick']);
    walk.do({ do: 'leave-stop', how: 'go-back' }, { do: 'confirm' });
    expect(walk.state.disturbed).toHaveLength(1);
  });

  it('sets aside and resumes at the same step', () => {
    const walk = atListen().do({ do: 'set-aside', reason: 'phone call' }, { do: 'resume' });
    expect(walk.state).toMatchObject({ status: 'open', current: { id: 'listen' } });
  });

  it('goes the authored way when something cannot be measured, with the reason', () => {
    const walk = atManifold().cautions(1);
    expect(walk.ask({ do: 'cannot-measure', reason: '' })).toMatchObject({ ok: false, field: 'reason' });
    walk.do({ do: 'cannot-measure', reason: 'no link to the car' });
    expect(walk.state.finding ?? walk.state.current?.id).toBe('restore');
    expect(walk.state.walked.at(-2)).toMatchObject({ step: 'manifold', notMeasured: true });
  });

  it('takes a step again from where it stood, the verdict of then included', () => {
    const walk = atManifold()
      .cautions(1)
      .do(
        { do: 'record', name: 'manifoldPressure', text: '98.0', unit: 'kPa' },
        { do: 'redo', step: 'manifold', reason: 'misread' },
      );
    expect(walk.state).toMatchObject({ verdict: undefined, current: { id: 'manifold' } });
    expect(walk.state.values['manifoldPressure']).toBeUndefined();
  });
});
