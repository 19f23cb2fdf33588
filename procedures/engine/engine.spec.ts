import { compileProcedure, type CompiledProcedure, type ListenStep } from '../document';
import { analyseListening } from './listening';
import {
  applyEvent,
  composeWriteUp,
  headerHash,
  previewReading,
  replay,
  routeAhead,
  type InstrumentSnapshot,
  type Series,
} from '.';
import { RunWalk } from './testing/run-walk';
import { smallProcedure } from './testing/small-procedure';

const fineGauge: InstrumentSnapshot = {
  id: 'g-12',
  kind: 'pressure-gauge',
  label: 'G-12',
  dueOn: '2027-03-01',
  shows: [{ unit: 'kPa', sense: 'gauge', low: 0, high: 60, resolution: 0.1, accuracy: 0.25 }],
};
const scanTool: InstrumentSnapshot = {
  id: 's-3',
  kind: 'scan-tool',
  label: 'S-3',
  dueOn: '2027-03-01',
  shows: [{ unit: 'kPa', sense: 'absolute', low: 0, high: 400, resolution: 0.1, accuracy: 0.5 }],
};

function compiled(): CompiledProcedure {
  const result = compileProcedure(smallProcedure);
  if (!result.ok) throw new Error(JSON.stringify(result.problems));
  return result.procedure;
}

const procedure = compiled();

/** Up to step 3, with the air of the place from the altimeter setting 1013.25 hPa at 640 m. */
function atManifold(): RunWalk {
  return new RunWalk(procedure)
    .cautions(1)
    .do(
      { do: 'choose-gear', role: 'gauge', instrument: fineGauge },
      { do: 'choose-gear', role: 'scanTool', instrument: scanTool },
      { do: 'confirm' },
      { do: 'record', name: 'stationPressure', way: 'altimeter-setting', text: '1013.25', unit: 'hPa' },
    );
}

/** A ramp of invented figures: 1 kPa in 10 s, noise from 10 s until 30 s. */
const series: Series = {
  timeS: Array.from({ length: 121 }, (_, i) => i * 0.5),
  channels: [{ name: 'gauge', unit: 'kPa', values: Array.from({ length: 121 }, (_, i) => Math.round(i * 0.5) / 10) }],
};
const record = {
  sha256: 'ab'.repeat(32),
  bytes: 10,
  samples: 121,
  durationS: 60,
  channels: [],
  source: 'typed',
  skipped: 0,
  problems: [],
} as const;

function atListen(): RunWalk {
  return atManifold()
    .cautions(1)
    .do({ do: 'record', name: 'manifoldPressure', text: '94.2', unit: 'kPa' }, { do: 'confirm' });
}

describe('opening a run', () => {
  it('starts at the first step with every input resolved and its source named', () => {
    const { state } = new RunWalk(procedure);
    expect(state.current?.id).toBe('start');
    expect(state.inputs['elevation']).toEqual({ text: '640', unit: 'm', source: 'the site' });
    expect(state.inputs['sealHigh']).toMatchObject({ text: '5.0', source: 'common practice, no source' });
  });

  it('asks for an input that neither site nor visit has', () => {
    const open = (): RunWalk =>
      new RunWalk(procedure, {}, { siteName: 'x', person: 'x', visit: new RunWalk(procedure).state.visit });
    expect(open).toThrow(/elevation of the site/);
  });

  it('holds the first step back until its cautions were seen and the gear chosen', () => {
    const walk = new RunWalk(procedure);
    expect(walk.ask({ do: 'confirm' })).toMatchObject({ ok: false, code: 'caution-first' });
    walk.cautions(1);
    expect(walk.ask({ do: 'confirm' })).toMatchObject({
      ok: false,
      code: 'gear-first',
      message: 'Choose first: test gauge, scan tool.',
    });
  });
});

describe('the air of the place', () => {
  it('comes from the altimeter setting with its 0.3 kPa (standard setting: the ISA value at 640 m, ISO 2533)', () => {
    const value = atManifold().state.values['stationPressure'];
    // p0 (1 - L H / T0)^5.25588 with H = r0 Z / (r0 + Z), computed by hand for Z = 640 m: 93.870 kPa.
    expect(value?.value).toBeCloseTo(93_870, -1.2);
    expect(value?.uncertainty).toBe(300);
  });

  it('comes from elevation alone with its 2 kPa, and then the sensor is not judged against it', () => {
    const walk = new RunWalk(procedure)
      .cautions(1)
      .do(
        { do: 'choose-gear', role: 'gauge', instrument: fineGauge },
        { do: 'choose-gear', role: 'scanTool', instrument: scanTool },
        { do: 'confirm' },
        { do: 'record', name: 'stationPressure', way: 'elevation', text: '640', unit: 'm' },
      );
    expect(walk.state.values['stationPressure']?.uncertaintyText).toBe('2');
    walk.cautions(1).do({ do: 'record', name: 'manifoldPressure', text: '98.0', unit: 'kPa' });
    expect(walk.state.values['manifoldPressure']?.judgement).toMatchObject({
      unjudged: 'The air of the place is not known well enough.',
    });
    expect(walk.state.values['manifoldPressure']?.judgement?.result).toBeUndefined();
    expect(walk.state.current?.id).toBe('dipstick');
  });
});

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
      value: { judgement: { result: 'out', lowText: '91.87', highText: '95.87' } },
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

describe('a branch', () => {
  it('is recorded with its expression, the numbers that decided and why', () => {
    const walk = atManifold().cautions(1).do({ do: 'record', name: 'manifoldPressure', text: '98.0', unit: 'kPa' });
    expect(
      walk.events.find(({ type, data }) => type === 'branch-taken' && 'step' in data && data.step === 'manifold')?.data,
    ).toMatchObject({
      when: 'outOfBand(manifoldPressure)',
      inputs: [{ name: 'manifoldPressure', label: 'Manifold pressure', text: '98.0', unit: 'kPa', uncertainty: '0.6' }],
      because: expect.stringMatching(/^manifold pressure is off by 4\.1 \u00b1 0\.7 kPa$/) as string,
      verdict: 'sensorOff',
    });
  });

  it('may be overruled with a reason; both ways are kept', () => {
    const walk = atManifold().cautions(1).do({ do: 'record', name: 'manifoldPressure', text: '98.0', unit: 'kPa' });
    expect(walk.ask({ do: 'overrule', exit: 'otherwise', reason: ' ' })).toMatchObject({ ok: false, field: 'reason' });
    walk.do({ do: 'overrule', exit: 'otherwise', reason: 'the sensor was changed yesterday' });
    expect(walk.state.current?.id).toBe('dipstick');
    expect(walk.state.verdict).toBeUndefined();
    expect(walk.events.find(({ type }) => type === 'branch-overruled')?.data).toMatchObject({
      computed: 'next-0',
      chosen: 'otherwise',
    });
  });
});

describe('listening', () => {
  it('finds the seal point between the marks and goes on to its finding', () => {
    const walk = atListen().do(
      { do: 'import-series', record, series },
      { do: 'mark', mark: 'noise-begins', timeS: 5, by: 'tap' },
      { do: 'mark', mark: 'noise-stops', timeS: 30, by: 'tap' },
      { do: 'finish-listening', series },
    );
    const sealPoint = walk.state.values['sealPoint'];
    // The ramp of this spec rises by 0.1 kPa a second; a person's mark at 30 s belongs to 29.4 s on average: 2.94 kPa.
    expect(Math.abs((sealPoint?.value ?? 0) - 2_940)).toBeLessThan(sealPoint?.uncertainty ?? 0);
    expect(sealPoint?.uncertainty).toBeLessThan(500);
    expect(walk.state.verdict).toBe('seals');
    expect(walk.state.current?.id).toBe('restore');
  });

  it('tells the gain of one sensor without the other', () => {
    const gauge = series.channels[0]?.values ?? [];
    const tracked: Series = {
      ...series,
      channels: [
        ...series.channels,
        { name: 'manifold', unit: 'kPa', values: gauge.map((value) => 93.9 + 0.9 * (value ?? 0)) },
      ],
    };
    const walk = atListen().do({ do: 'import-series', record, series: tracked });
    const step = { ...procedure.document.steps.find(({ id }) => id === 'listen')! } as ListenStep;
    const gains: ListenStep = {
      ...step,
      finds: [
        { what: 'manifold-gain', name: 'manifoldGain', label: 'Manifold gain', unit: '1' },
        { what: 'boost-gain', name: 'boostGain', label: 'Boost gain', unit: '1' },
      ],
    };
    const { found, problems } = analyseListening(walk.state, gains, tracked);
    expect(found.map(({ quantity, figure }) => [quantity.name, Number(figure.text).toFixed(3)])).toEqual([
      ['manifoldGain', '0.900'],
    ]);
    expect(problems).toHaveLength(1);
  });

  it('without a mark that it stopped gives no seal point and another way', () => {
    const walk = atListen().do(
      { do: 'import-series', record, series },
      { do: 'mark', mark: 'noise-begins', timeS: 5, by: 'tap' },
      { do: 'finish-listening', series },
    );
    expect(walk.state.values['sealPoint']).toBeUndefined();
    expect(walk.state.truths['noiseStopped']?.holds).toBe(false);
    expect(walk.state.current?.id).toBe('where');
  });

  it('drops what an earlier claim gave when the step is claimed again', () => {
    const walk = atListen().do(
      { do: 'import-series', record, series },
      { do: 'mark', mark: 'noise-begins', timeS: 5, by: 'tap' },
      { do: 'finish-listening', series },
      { do: 'choose', options: ['airAtJoint'], text: 'hose at the cooler' },
    );
    expect(walk.state.current?.id).toBe('listen');
    expect(walk.state.series['ramp']).toBeUndefined();
    expect(walk.state.values['highestGauge']).toBeUndefined();
  });

  it('refuses marks in the wrong order, and a series without its needed channel', () => {
    const walk = atListen().do(
      { do: 'import-series', record, series },
      { do: 'mark', mark: 'noise-begins', timeS: 30, by: 'tap' },
    );
    expect(walk.ask({ do: 'mark', mark: 'noise-stops', timeS: 10, by: 'tap' })).toMatchObject({
      ok: false,
      code: 'mark-order',
    });
    expect(walk.ask({ do: 'import-series', record, series: { ...series, channels: [] } })).toMatchObject({
      ok: false,
      code: 'missing-channel',
    });
  });
});

describe('a series that does not begin at zero', () => {
  const lifted = (by: number): Series => ({
    ...series,
    channels: series.channels.map((channel) => ({
      ...channel,
      values: channel.values.map((value) => (value ?? 0) + by),
    })),
  });

  it.each([
    [1.2, '1.3'],
    [-2, '-1.9'],
  ])('is refused: the gauge off by %d kPa would move the seal point by as much', (by, shown) => {
    const outcome = atListen().ask({ do: 'import-series', record, series: lifted(by) });
    expect(outcome).toMatchObject({ ok: false, code: 'not-at-zero', field: 'file' });
    expect(outcome.ok ? '' : outcome.message).toContain(`begins at ${shown} kPa, not at zero (0.6 kPa`);
  });

  it('is taken where the gauge is off by no more than its accuracy and step allow', () => {
    expect(atListen().ask({ do: 'import-series', record, series: lifted(0.5) })).toMatchObject({ ok: true });
  });
});

describe('an overdue instrument', () => {
  it('costs a reason, which stands in the write-up', () => {
    const overdue = { ...fineGauge, id: 'g-3', label: 'G-3', dueOn: '2026-01-01' };
    const walk = new RunWalk(procedure).cautions(1);
    expect(walk.ask({ do: 'choose-gear', role: 'gauge', instrument: overdue })).toMatchObject({
      ok: false,
      code: 'overdue',
    });
    walk.do(
      { do: 'choose-gear', role: 'gauge', instrument: overdue, overdueBecause: 'no other one is here' },
      { do: 'choose-gear', role: 'scanTool', instrument: scanTool },
      { do: 'confirm' },
    );
    const { correction } = composeWriteUp(procedure, walk.state);
    expect(correction.text).toContain(
      'with G-3 (its check ran out on 2026-01-01; used because: no other one is here), S-3.',
    );
  });
});

describe('a limit', () => {
  it('that a typed value exceeds takes the run until it is acknowledged, and the value does not count', () => {
    const walk = atListen().do({ do: 'record', name: 'gauge', text: '36.0', unit: 'kPa', timeS: 4 });
    expect(walk.state.alarm).toMatchObject({ limit: 'ceiling', says: 'More than 34.5 kPa.', figure: { text: '36.0' } });
    expect(walk.ask({ do: 'mark', mark: 'noise-begins', timeS: 1, by: 'tap' })).toMatchObject({
      ok: false,
      code: 'alarm',
    });
    walk.do({ do: 'acknowledge-limit' });
    expect(walk.state.alarm).toBeUndefined();
    expect(walk.state.current?.takes['gauge']).toEqual([]);
  });

  it('is held against every sample of a series, manifold pressure less the air of the place too', () => {
    const over: Series = {
      timeS: [0, 1, 2],
      channels: [
        { name: 'gauge', unit: 'kPa', values: [0, 1, 2] },
        { name: 'manifold', unit: 'kPa', values: [94, 130, 95] },
      ],
    };
    const walk = atListen().do({ do: 'import-series', record, series: over });
    expect(walk.state.alarm).toMatchObject({ name: 'manifold', figure: { text: '130.0' } });
    // Acknowledged, it is still no series to find anything in: the ramp is taken again.
    walk.do({ do: 'acknowledge-limit' });
    expect(walk.state.series['ramp']).toBeUndefined();
    expect(walk.ask({ do: 'finish-listening', series: over })).toMatchObject({ ok: false, code: 'no-series' });
    expect(walk.state.exceeded).toHaveLength(1);
  });
});

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

describe('replay', () => {
  const walk = atListen().do(
    { do: 'stop', reason: '' },
    { do: 'leave-stop', how: 'not-completed' },
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

describe('the write-up', () => {
  it('is composed from what was measured, each number with its step', () => {
    const walk = atListen().do(
      { do: 'import-series', record, series },
      { do: 'mark', mark: 'noise-begins', timeS: 5, by: 'tap' },
      { do: 'mark', mark: 'noise-stops', timeS: 30, by: 'tap' },
      { do: 'finish-listening', series },
      { do: 'restore', item: 'dipstick' },
    );
    const { concern, cause, correction } = composeWriteUp(procedure, walk.state);
    expect(concern.text).toBe(
      'Merrow Heron 1.6 turbo, silver, RO 4417, 84210 km: Whistle at idle, hesitates under load.',
    );
    expect(cause.text).toMatch(
      /^The valve seals at \d\.\d \u00b1 0\.\d kPa \(step 5\)\. The noise stopped at .* \(step 5\)\. Manifold pressure read 94\.2 \u00b1 0\.6 kPa \(step 3\)\.$/,
    );
    expect(correction.text).toBe('None needed. Tested by Small check, version 1 with G-12, S-3.');
  });

  it('tells what was edited from what was composed', () => {
    const walk = atListen().do(
      { do: 'stop', reason: '' },
      { do: 'leave-stop', how: 'not-completed' },
      { do: 'restore', item: 'dipstick' },
    );
    const { concern, cause, correction, customer } = composeWriteUp(procedure, walk.state);
    walk.do({
      do: 'keep-write-up',
      concern: concern.text,
      cause: `${cause.text} Hose split.`,
      correction: correction.text,
      customer: customer.text,
    });
    expect(walk.state.writeUp?.edited).toEqual(['cause']);
  });
});

describe('the Route', () => {
  it('names the way that comes next first, then the others', () => {
    expect(routeAhead(procedure, atManifold().state)).toEqual([
      { to: 'dipstick', label: '4, pull the dipstick', isMain: true },
      { to: 'restore', label: '7, put everything back', isMain: false },
    ]);
  });
});
