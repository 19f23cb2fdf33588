import { inPartTest, logged, partWith, read, rise } from './testing/outer-walk';
import type { RunWalk } from './testing/run-walk';

const atHold = (): RunWalk =>
  partWith(inPartTest(), '5.0').do(
    { do: 'confirm' },
    { do: 'verify', by: 'brandt' },
    { do: 'release', role: 'lead', evidence: 'Seen.' },
    { do: 'confirm' },
  );
const atPhoto = (): RunWalk =>
  atHold().do(
    read('from', '14.0', 'kPa'),
    { do: 'start-timer' },
    { do: 'end-timer', certain: true },
    read('until', '12.5', 'kPa'),
  );
const photo = { do: 'attach-photo', sha256: 'b'.repeat(64), bytes: 120_000, mediaType: 'image/jpeg' } as const;
const atSoak = (): RunWalk =>
  atPhoto().do(photo, { do: 'confirm' }, logged(rise), { do: 'finish-listening', series: rise });

describe('a hold with readings at both ends', () => {
  it('is begun with what it begins at, and ends with what it ends at', () => {
    const walk = atHold();
    expect(walk.ask({ do: 'start-timer' })).toMatchObject({ ok: false, message: 'Enter begins at first.' });
    expect(walk.ask(read('until', '12', 'kPa'))).toMatchObject({ ok: false, code: 'not-yet' });
    walk.do(read('from', '14.0', 'kPa'), { do: 'start-timer' });
    expect(walk.ask(read('from', '13.9', 'kPa'))).toMatchObject({ ok: false, code: 'too-late' });
    expect(walk.ask(read('until', '12', 'kPa'))).toMatchObject({ ok: false, code: 'not-yet' });
    walk.do({ do: 'end-timer', certain: true });
    expect(walk.state.current?.id).toBe('hold');
    walk.do(read('until', '12.5', 'kPa'));
    expect(walk.state.current?.id).toBe('look');
    expect(walk.state.values['lost']).toMatchObject({ text: expect.stringMatching(/^1\.5/), unit: 'kPa' });
  });

  it('is offered again when the clock was not certain', () => {
    const walk = atHold().do(read('from', '14.0', 'kPa'), { do: 'start-timer' }, { do: 'end-timer', certain: false });
    expect(walk.ask(read('until', '12.5', 'kPa'))).toMatchObject({ ok: false, code: 'not-yet' });
    walk.do({ do: 'start-timer' }, { do: 'end-timer', certain: true }, read('until', '12.5', 'kPa'));
    expect(walk.state.current?.id).toBe('look');
  });

  it('holds its readings against the limits', () => {
    expect(atHold().do(read('from', '35', 'kPa')).state.alarm).toMatchObject({ limit: 'ceiling' });
  });
});

describe('a photo', () => {
  it('is there before the run goes on, or cannot be taken', () => {
    const walk = atPhoto();
    expect(walk.ask({ do: 'confirm' })).toMatchObject({
      ok: false,
      message: 'Take a photo first: The plug, in focus. If it cannot be taken, say so below.',
    });
    walk.do(photo, { ...photo, sha256: 'c'.repeat(64) });
    expect(walk.state.photos['plugPhoto']?.photos.map(({ sha256 }) => sha256.charAt(0))).toEqual(['b', 'c']);
    walk.do({ do: 'confirm' });
    expect(walk.state.current?.id).toBe('ramp');
    expect(atPhoto().do({ do: 'cannot-measure', reason: 'no light' }).state.current?.id).toBe('ramp');
  });
});

describe('a ramp without marks', () => {
  it('gives its extreme and its gains; a seal point only where its sound has one', () => {
    const { state } = atSoak();
    expect(state.values['highest']).toMatchObject({ text: '9.00' });
    expect(Number(state.values['gain']?.text)).toBeCloseTo(1, 3);
    expect(state.values['sealedAt']).toBeUndefined();
    expect(state.current?.id).toBe('soak');
  });

  it('takes no marks', () => {
    const walk = atPhoto().do(photo, { do: 'confirm' }, logged(rise));
    expect(walk.ask({ do: 'mark', mark: 'noise-begins', timeS: 2, by: 'tap' })).toMatchObject({ ok: false });
  });
});

describe('a wait with a least time', () => {
  it('goes on when its time is over and what it waits for is true', () => {
    const walk = atSoak().do(read('after', '65', 'degC'));
    expect(walk.state.current?.id).toBe('soak');
    walk.do({ do: 'start-timer' }, { do: 'end-timer', certain: true });
    expect(walk.state.current?.id).toBe('decide');
  });

  it('waits on when the time is over and it is not', () => {
    const walk = atSoak().do(read('after', '80', 'degC'), { do: 'start-timer' }, { do: 'end-timer', certain: true });
    expect(walk.state.current?.id).toBe('soak');
    walk.do(read('after', '69', 'degC'));
    expect(walk.state.current?.id).toBe('decide');
  });
});

describe('what does not apply', () => {
  it('costs a reason, takes nothing apart, and leads to the honest way out', () => {
    const walk = atHold();
    expect(walk.ask({ do: 'not-applicable', reason: ' ' })).toMatchObject({ ok: false, field: 'reason' });
    walk.do({ do: 'not-applicable', reason: 'This car has no port.' });
    expect(walk.state.current?.id).toBe('look');
    expect(walk.state.values['lost']).toBeUndefined();
  });
});
