import { RunWalk } from './testing/run-walk';
import { atManifold, fineGauge, procedure, scanTool } from './testing/small-walks';

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
