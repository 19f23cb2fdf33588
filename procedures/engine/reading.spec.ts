import { previewReading, type InstrumentSnapshot } from '.';
import { atManifold, procedure, scanTool } from './testing/small-walks';

describe('a reading', () => {
  it.each([
    ['94.2', 'in', 'dipstick'],
    ['98.0', 'out', 'restore'],
    ['95.7', 'too-close', 'manifold'],
  ])('of %s kPa is judged %s and leads to %s', (text, result, to) => {
    const walk = atManifold().cautions(1).do({ do: 'record', name: 'manifoldPressure', text, unit: 'kPa' });
    expect(walk.state.walked.find((claim) => claim.step === 'manifold')?.result).toBe(result);
    expect(walk.state.current?.id).toBe(to);
  });

  it('is kept with the digits it was given', () => {
    const walk = atManifold().cautions(1).do({ do: 'record', name: 'manifoldPressure', text: '94.20', unit: 'kPa' });
    const event = walk.events.find(
      (candidate) => candidate.type === 'reading-recorded' && candidate.data.name === 'manifoldPressure',
    );
    expect(event?.data).toMatchObject({
      figure: { text: '94.20', unit: 'kPa' },
      instrument: 's-3',
      resolution: '0.1',
      source: 'typed',
    });
  });

  it.each([
    ['9999', /between 20 and 250 kPa/],
    ['ninety', /as a number/],
    ['', /as a number/],
    ['9.4.2', /as a number/],
  ])('of %j is refused with words that say how to go on, and nothing is written', (text, words) => {
    const walk = atManifold().cautions(1);
    const before = walk.events.length;
    const outcome = walk.ask({ do: 'record', name: 'manifoldPressure', text, unit: 'kPa' });
    expect(outcome).toMatchObject({ ok: false, field: 'text' });
    expect(outcome.ok ? '' : outcome.message).toMatch(words);
    expect(walk.events).toHaveLength(before);
  });

  it('shows before it is recorded what it would give and where it would lead', () => {
    const walk = atManifold().cautions(1);
    const preview = previewReading(procedure, walk.state, { name: 'manifoldPressure', text: '98.0', unit: 'kPa' });
    expect(preview).toMatchObject({
      ok: true,
      value: { judgement: { result: 'out', lowText: '91.9', highText: '95.9' } },
      way: { to: 'restore', verdict: 'sensorOff' },
    });
  });

  it('that stays too close to call is taken again at most twice, then goes on', () => {
    const walk = atManifold();
    for (const expected of ['manifold', 'manifold', 'dipstick']) {
      walk.cautions(1).do({ do: 'record', name: 'manifoldPressure', text: '95.7', unit: 'kPa' });
      expect(walk.state.current?.id).toBe(expected);
    }
    expect(walk.events.filter(({ type }) => type === 'branch-taken').at(-1)?.data).toMatchObject({
      exit: 'thenceforth-1',
      because: 'it stayed too close to call',
    });
  });

  it('is guarded by what its band rests on too: the 0.3 kPa of the altimeter setting', () => {
    const walk = atManifold().cautions(1).do({ do: 'record', name: 'manifoldPressure', text: '95.25', unit: 'kPa' });
    const value = walk.state.values['manifoldPressure'] ?? walk.state.values['offset'];
    // U = 2 sqrt((0.5 / sqrt 3)^2 + (0.05 / sqrt 3)^2) = 0.580 kPa; with the band's 0.300 kPa: 0.653 kPa (JCGM 100, 5.1.2).
    // 95.25 lies 0.62 kPa inside the upper end 95.87: within the reading's own U it would be in.
    expect(walk.state.walked.find((claim) => claim.step === 'manifold')?.result).toBe('too-close');
    expect(value?.judgement?.guard ?? 653).toBeCloseTo(653, -1);
  });

  it('is judged with the uncertainty of the instrument that was chosen: a coarser one changes the judgement', () => {
    const coarse = {
      ...scanTool,
      id: 's-9',
      label: 'S-9',
      shows: [{ ...scanTool.shows[0], resolution: 1, accuracy: 1.5 }],
    } as InstrumentSnapshot;
    const judged = (instrument: InstrumentSnapshot): string | undefined =>
      atManifold()
        .cautions(1)
        .do(
          { do: 'choose-gear', role: 'scanTool', instrument },
          { do: 'record', name: 'manifoldPressure', text: '95.0', unit: 'kPa' },
        )
        .state.walked.find((claim) => claim.step === 'manifold')?.result;
    expect([judged(scanTool), judged(coarse)]).toEqual(['in', 'too-close']);
  });
});
