import { evidenceOf, type Evidence } from '../../../procedures/engine/evidence';
import type { RunWalk } from '../../../procedures/engine/testing/run-walk';
import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear, gaugeG7, scanToolS1 } from '../../support/ossenholt-gear';
import { readRamp, withChannel } from '../../support/ramp-file';
import { driveRun, type Row } from '../../support/run-driver';
import {
  codesClearedAfter,
  coldToAir,
  gaugeAtZero,
  otherHalfNext,
  sensorsInBand,
  warmToAir,
} from '../../support/valve-seal-rows';

const cold = (...table: readonly Row[]): RunWalk =>
  driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [...coldToAir, ...sensorsInBand, ...table],
  });
const warm = (...table: readonly Row[]): RunWalk =>
  driveRun({ procedure: compiledValveSeal(), half: 'warm', gear: fineGear, table: [...warmToAir, ...table] });

const neverStops: Row = ['11', { listen: readRamp('demo-cold-never-seals'), begins: 13 }];
const sealing: Row = ['11', { listen: readRamp('demo-warm-seals'), begins: 13, stops: 'suggested' }];
const silent: Row = ['11', { listen: readRamp('demo-warm-seals') }];

/** One line a piece of evidence, as a person would read it out. */
function line(evidence: Evidence): string {
  if (evidence.kind === 'observation') return `${evidence.label}: ${evidence.text}`;
  const { label, text, uncertaintyText, unit, judgement } = evidence.value;
  return `${label}: ${text} ± ${uncertaintyText} ${unit}${judgement?.result === undefined ? '' : `, ${judgement.result}`}`;
}

function evidence({ procedure, state, events }: RunWalk) {
  const { led, rest } = evidenceOf(procedure, state, events);
  return { finding: state.finding, led: led.map(line), rest: rest.map(({ name }) => name) };
}

/** The seven judged values of a run whose ramp had all channels and which are no evidence of its finding. */
const sensors = ['worstGap', 'boostGain', 'manifoldGain', 'riseRate', 'sensorGap', 'boostPressure', 'manifoldPressure'];

describe('the evidence of each finding of the crankcase valve seal: what led there, the newest decision first', () => {
  it('seals: quiet in the hold, and where the noise stopped', () => {
    const walk = warm(
      ...sensorsInBand,
      sealing,
      ['11a', { read: { coolantAtMark: '78' } }],
      ['12b', { choose: ['stillQuiet'] }],
      ...gaugeAtZero,
      ...codesClearedAfter,
      ...otherHalfNext,
    );
    expect(evidence(walk)).toEqual({
      finding: 'seals',
      led: [
        'Still quiet: It stayed quiet',
        'Noise at the probe: heard, and it stopped',
        'Seal point: 3.4 ± 0.3 kPa, in',
        'Coolant when the noise was heard: 78 ± 1.3 degC',
      ],
      rest: sensors,
    });
  });

  it('seals outside the band: the seal point, and what was seen', () => {
    const walk = warm(
      ...sensorsInBand,
      ['11', { listen: readRamp('demo-seals-outside-band'), begins: 13, stops: 'suggested' }],
      ['11a', { read: { coolantAtMark: '74' } }],
      ...gaugeAtZero,
      ['17b', { choose: ['clean'], text: 'a dry valve, its spring upright' }],
      ...codesClearedAfter,
      ['19', { choose: ['bothHalvesDone'] }],
    );
    expect(evidence(walk)).toEqual({
      finding: 'sealsOutsideBand',
      led: [
        'Look through the passage: In place and clean: a dry valve, its spring upright',
        'Noise at the probe: heard, and it stopped',
        'Seal point: 6.2 ± 0.3 kPa, out',
        'Coolant when the noise was heard: 74 ± 1.3 degC',
      ],
      rest: sensors,
    });
  });

  it('seals, too close to call: the seal point of the last ramp', () => {
    const onceMore: readonly Row[] = [
      ['11', { listen: readRamp('demo-coarse-bus'), begins: 13, stops: 'suggested' }],
      ['11a', { read: { coolantAtMark: '79' } }],
    ];
    const walk = driveRun({
      procedure: compiledValveSeal(),
      half: 'warm',
      gear: { ...fineGear, gauge: gaugeG7, scanTool: scanToolS1 },
      table: [
        ...warmToAir,
        ['5', { read: { manifoldPressure: '94' } }],
        ['6', { read: { boostPressure: '94' } }],
        ...onceMore,
        ...onceMore,
        ...onceMore,
        ['12b', { choose: ['stillQuiet'] }],
        ['15b', { read: { gaugeLeft: '0' } }],
        ...codesClearedAfter,
        ...otherHalfNext,
      ],
    });
    const { finding, led } = evidence(walk);
    expect(finding).toBe('sealsTooClose');
    expect(led).toEqual([
      'Still quiet: It stayed quiet',
      'Noise at the probe: heard, and it stopped',
      expect.stringMatching(/^Seal point: .* kPa, too-close$/),
      'Coolant when the noise was heard: 79 ± 1.3 degC',
    ]);
  });

  it('does not seal: what was seen and heard, and how far it was raised', () => {
    const walk = cold(
      neverStops,
      ['13', { choose: ['airAtValve'] }],
      ...gaugeAtZero,
      ['17b', { choose: ['carboned'], text: 'a crust on the seat' }],
      ...codesClearedAfter,
      ...otherHalfNext,
    );
    expect(evidence(walk)).toEqual({
      finding: 'doesNotSeal',
      led: [
        'Look through the passage: Carbon on it: a crust on the seat',
        'Where the air comes out: Only at the manifold valve',
        'Noise at the probe: heard, and it never stopped',
        'Highest pressure reached: 7.1 ± 0.3 kPa',
      ],
      rest: sensors,
    });
  });

  it('passage not proved open: nothing heard anywhere, and how far it was raised', () => {
    const walk = cold(
      silent,
      ['12c', { choose: ['heardElsewhere'], text: 'nearer to the throttle' }],
      silent,
      ['12c', { choose: ['heardNowhere'] }],
      ...gaugeAtZero,
      ['17b', { choose: ['notSeen'] }],
      ...codesClearedAfter,
    );
    expect(evidence(walk)).toEqual({
      finding: 'passageNotProved',
      led: [
        'Look through the passage: It cannot be seen',
        'Listen at other places: No air is heard anywhere',
        'Noise at the probe: none was heard',
        'Highest pressure reached: 11.8 ± 0.3 kPa',
      ],
      rest: sensors,
    });
  });

  it('inlet-side check valve stays open: the answer to the pulse', () => {
    const walk = cold(
      neverStops,
      ['13', { choose: ['airAtInletVent'] }],
      ['13a', { choose: ['pulseStaysOpen'] }],
      ...gaugeAtZero,
      ...codesClearedAfter,
    );
    expect(evidence(walk)).toEqual({
      finding: 'inletCheckStaysOpen',
      led: [
        'Pulse at the inlet-side valve: Air still comes',
        'Where the air comes out: At the inlet-side vent',
        'Noise at the probe: heard, and it never stopped',
        'Highest pressure reached: 7.1 ± 0.3 kPa',
      ],
      rest: sensors,
    });
  });

  it('route not proved: the routes that were closed, and the seal point', () => {
    const walk = cold(
      neverStops,
      ['13', { choose: ['airAtDipstick'] }],
      ['13c', { read: { gaugeLeft: '0.0' } }],
      ['13g', { choose: ['routesIsolated'] }],
      sealing,
      ...gaugeAtZero,
      ['17b', { commands: [{ do: 'cannot-measure', reason: 'the borescope does not go round the bend' }] }],
      ...codesClearedAfter,
    );
    expect(evidence(walk)).toEqual({
      finding: 'crankcaseRouteNotProved',
      led: [
        'Step 17b, look through the passage: cannot be measured: the borescope does not go round the bend',
        'Turn the crankshaft: No intake valve stands open now',
        'Noise at the probe: heard, and it stopped',
        'Where the air comes out: At the dipstick tube',
        'Seal point: 3.4 ± 0.3 kPa, in',
        'Highest pressure reached: 11.8 ± 0.3 kPa',
      ],
      rest: sensors,
    });
  });

  it('a leak masks the test: the joint of the last round', () => {
    const walk = cold(
      neverStops,
      ['13', { choose: ['airAtJoint'], text: 'hose clamp at the charge cooler' }],
      ['13c', { read: { gaugeLeft: '0.0' } }],
      ['13e', { choose: ['jointMended'], text: 'clamp turned tight' }],
      neverStops,
      ['13', { choose: ['airAtJoint', 'airAtDipstick'], text: 'hose at the charge cooler, split' }],
      ['13c', { read: { gaugeLeft: '0.1' } }],
      ['13e', { choose: ['jointNotMended'], text: 'the hose is not in stock' }],
      ...gaugeAtZero,
      ...codesClearedAfter,
    );
    expect(evidence(walk)).toEqual({
      finding: 'leakMasksTest',
      led: [
        'Mend the joint: Not mended: the hose is not in stock',
        'Where the air comes out: At a joint, at the dipstick tube: hose at the charge cooler, split',
        'Noise at the probe: heard, and it never stopped',
        'Highest pressure reached: 7.1 ± 0.3 kPa',
      ],
      rest: sensors,
    });
  });

  it('a sensor reads off at rest: the sensor that is off first, then the one that is not', () => {
    const walk = driveRun({
      procedure: compiledValveSeal(),
      half: 'cold',
      gear: fineGear,
      table: [...coldToAir, ['5', { read: { manifoldPressure: '94.2' } }], ['6', { read: { boostPressure: '98.1' } }]],
    });
    expect(evidence(walk)).toEqual({
      finding: 'sensorReadsOffAtRest',
      led: ['Boost pressure: 98.1 ± 0.6 kPa, out', 'Manifold pressure: 94.2 ± 0.6 kPa, in'],
      rest: ['sensorGap'],
    });
  });

  it('a sensor reads off under pressure: how it followed, before what the ramp said of the valve', () => {
    const lagging = withChannel(
      readRamp('demo-warm-seals'),
      'boost',
      (boostKpa, gaugeKpa) => boostKpa - 0.2 * gaugeKpa,
    );
    const walk = cold(
      ['11', { listen: lagging, begins: 13, stops: 'suggested' }],
      ['12b', { choose: ['stillQuiet'] }],
      ...gaugeAtZero,
      ...codesClearedAfter,
    );
    const { finding, led, rest } = evidence(walk);
    expect(finding).toBe('sensorReadsOffUnderPressure');
    expect(led).toEqual([
      expect.stringMatching(/^Boost pressure per gauge: 0\.80.*, out$/),
      expect.stringMatching(/^Manifold pressure per gauge: .*, in$/),
      'Still quiet: It stayed quiet',
      'Noise at the probe: heard, and it stopped',
      'Seal point: 3.4 ± 0.3 kPa, in',
    ]);
    expect(rest).toEqual(['worstGap', 'riseRate', 'sensorGap', 'boostPressure', 'manifoldPressure']);
  });

  it('no place found: that nothing was heard to come out, and how far it was raised', () => {
    const walk = cold(neverStops, ['13', { choose: ['airNowhere'] }], ...gaugeAtZero, ...codesClearedAfter);
    expect(evidence(walk)).toEqual({
      finding: 'placeNotFound',
      led: [
        'Where the air comes out: Nowhere to be heard',
        'Noise at the probe: heard, and it never stopped',
        'Highest pressure reached: 7.1 ± 0.3 kPa',
      ],
      rest: sensors,
    });
  });

  it('not completed: where it was stopped, and why', () => {
    const walk = cold(
      [
        '11',
        {
          commands: [
            { do: 'stop', reason: 'the plug moved' },
            { do: 'leave-stop', how: 'not-completed' },
          ],
        },
      ],
      ...gaugeAtZero,
      ['18a', { codes: [{ code: 'P0068', status: 'stored' }] }],
    );
    expect(evidence(walk)).toEqual({
      finding: 'notCompleted',
      led: ['Step 11, raise slowly and listen: stopped: the plug moved'],
      rest: ['sensorGap', 'boostPressure', 'manifoldPressure'],
    });
  });

  it('not completed: the step that could not be measured, before what was heard until then', () => {
    const walk = cold(
      neverStops,
      [
        '13',
        {
          commands: [
            { do: 'acknowledge-caution', caution: 0 },
            { do: 'cannot-measure', reason: 'the compressor runs dry' },
          ],
        },
      ],
      ...gaugeAtZero,
      ['18a', { codes: [{ code: 'P0068', status: 'stored' }] }],
    );
    expect(evidence(walk)).toEqual({
      finding: 'notCompleted',
      led: [
        'Step 13, where the air comes out: cannot be measured: the compressor runs dry',
        'Noise at the probe: heard, and it never stopped',
        'Highest pressure reached: 7.1 ± 0.3 kPa',
      ],
      rest: sensors,
    });
  });
});
