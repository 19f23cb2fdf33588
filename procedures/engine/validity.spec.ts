import { inPartTest, type outerWalk, partWith, read } from './testing/outer-walk';

const atCallAfter = (minutes: number): ReturnType<typeof outerWalk> => partWith(inPartTest(), '5.0').later(minutes);

describe('a reading that holds for a while', () => {
  it('counts while it holds', () => {
    const walk = atCallAfter(15).do({ do: 'confirm' });
    expect(walk.state.values['coolant']?.stale).toBeUndefined();
    expect(walk.state.current?.id).toBe('lead');
  });

  it('decides no way once it is over; what to do is said', () => {
    const walk = atCallAfter(21);
    expect(walk.ask({ do: 'confirm' })).toMatchObject({
      ok: false,
      code: 'stale',
      takeAgain: 'warm',
      message: 'Coolant no longer holds. A warm engine cools. Take it again: go back to step 2.',
    });
    walk.do({ do: 'redo', step: 'warm', reason: 'it cooled' });
    expect(walk.state.current?.id).toBe('warm');
    walk.do(read('coolant', '86', 'degC'));
    expect(walk.state.values['coolant']?.stale).toBeUndefined();
  });

  it('ends with the step that the author named, whatever the time', () => {
    const walk = atCallAfter(0).do(
      { do: 'confirm' },
      { do: 'verify', by: 'brandt' },
      { do: 'release', role: 'lead', evidence: 'seen' },
      { do: 'confirm' },
      { do: 'cannot-measure', reason: 'no room' },
      { do: 'cannot-measure', reason: 'no camera' },
      { do: 'cannot-measure', reason: 'no log' },
      read('after', '65', 'degC'),
      { do: 'start-timer' },
      { do: 'end-timer', certain: true },
    );
    expect(walk.state.current?.id).toBe('decide');
    expect(walk.state.values['coolant']?.stale).toMatchObject({ because: 'A warm engine cools.' });
    expect(walk.ask({ do: 'confirm' })).toMatchObject({ ok: false, code: 'stale' });
  });

  it('is still written in the state, so that the record shows it', () => {
    const walk = atCallAfter(30);
    walk.do({ do: 'redo', step: 'plug', reason: 'look again' });
    expect(walk.state.values['coolant']).toMatchObject({ text: '88', stale: { because: 'A warm engine cools.' } });
  });
});
