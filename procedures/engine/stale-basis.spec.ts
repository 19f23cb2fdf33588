import type { RunCommand } from '.';
import { begunWith, changedProcedure } from './testing/small-walks';
import type { RunWalk } from './testing/run-walk';

const air: RunCommand = {
  do: 'record',
  name: 'stationPressure',
  way: 'altimeter-setting',
  text: '1013.25',
  unit: 'hPa',
};
const manifold: RunCommand = { do: 'record', name: 'manifoldPressure', text: '94.2', unit: 'kPa' };
const validity = { minutes: 10, because: 'A warm engine cools.' };

/** At step 4, whose way is decided by what step 3 read; that reading holds ten minutes. */
function atDipstick(when: string): RunWalk {
  const changed = changedProcedure(
    ['steps/2/reads/0', (read) => Object.assign(read, { validity })],
    [
      'steps/3',
      (step) => Object.assign(step, { next: [{ when, to: 'restore', because: 'it is off', verdict: 'sensorOff' }] }),
    ],
  );
  return begunWith(changed).do(air).cautions(1).do(manifold);
}

describe('what rests on a reading that no longer holds', () => {
  it.each(['manifoldPressure > 200 kPa', 'offset > 5 kPa'])('decides nothing either: %s', (when) => {
    const walk = atDipstick(when);
    expect(walk.ask({ do: 'confirm' })).toMatchObject({ ok: true });
    expect(walk.later(11).ask({ do: 'confirm' })).toMatchObject({ ok: false, code: 'stale' });
    walk.do({ do: 'redo', step: 'manifold', reason: 'it cooled' }).cautions(1).do(manifold, { do: 'confirm' });
    expect(walk.state.current?.id).toBe('listen');
    expect(walk.state.discrepancies).toEqual([]);
  });

  it('is not judged: the air of the place is taken again first', () => {
    const changed = changedProcedure(['steps/1/reads/0', (read) => Object.assign(read, { validity })]);
    const walk = begunWith(changed).do(air).cautions(1).later(11);
    expect(walk.ask(manifold)).toMatchObject({ ok: false, code: 'stale' });
    walk.do({ do: 'redo', step: 'air', reason: 'old' }, air).cautions(1).do(manifold);
    expect(walk.state.walked.find(({ step, result }) => step === 'manifold' && result !== undefined)?.result).toBe(
      'in',
    );
  });
});

describe('a clock that was set back', () => {
  it('ends a reading where nobody noted by how much; noted, the time is counted right', () => {
    expect(atDipstick('manifoldPressure > 200 kPa').later(-60).ask({ do: 'confirm' })).toMatchObject({ code: 'stale' });
    const noted = atDipstick('manifoldPressure > 200 kPa').later(-60);
    noted.write({ type: 'clock-jumped', data: { byMs: -3_600_000 } });
    expect(noted.ask({ do: 'confirm' })).toMatchObject({ ok: true });
    expect(noted.later(11).ask({ do: 'confirm' })).toMatchObject({ code: 'stale' });
  });
});

describe('what is entered at a step that waits for somebody', () => {
  it('is kept, so that it can be what the release rests on', () => {
    const changed = changedProcedure(
      [
        'steps/1',
        (step) => Object.assign(step, { release: { by: 'lead', evidence: 'The figure stands on the sheet.' } }),
      ],
      ['steps/5', (step) => Object.assign(step, { verify: { how: 'independent', what: 'The place is seen.' } })],
    );
    const walk = begunWith(changed).do(air);
    expect(walk.state).toMatchObject({ current: { id: 'air' }, values: { stationPressure: { step: 'air' } } });
    expect(walk.ask({ do: 'confirm' })).toMatchObject({ ok: false, code: 'release-first' });
    walk.do({ do: 'release', role: 'lead', evidence: 'seen' }, { do: 'confirm' });
    expect(walk.state.current?.id).toBe('manifold');
  });
});

describe('a limit on what a way enters', () => {
  it('takes the run as one on a quantity does', () => {
    const changed = changedProcedure(
      ['limits/0/of', (of) => (of as unknown as string[]).push('altimeterSetting')],
      ['steps/1/reads/0/ways/0/entry', (entry) => Object.assign(entry, { sense: 'gauge' })],
      ['steps/1/reads/0/ways/0', (way) => Object.assign(way, { is: '94 kPa' })],
    );
    const walk = begunWith(changed).do(air);
    expect(walk.state.alarm).toMatchObject({ limit: 'ceiling', name: 'stationPressure' });
    expect(walk.state.values['stationPressure']).toBeUndefined();
  });
});

describe('a photo of a step that asks for none', () => {
  it('is kept as evidence, and the run stands where it stood', () => {
    const walk = begunWith(changedProcedure());
    const before = walk.state;
    walk.write({
      type: 'photo-attached',
      data: { step: 'air', sha256: 'ab'.repeat(32), bytes: 10, mediaType: 'image/jpeg' },
    });
    expect(walk.state).toMatchObject({ current: before.current, photos: {} });
  });
});
