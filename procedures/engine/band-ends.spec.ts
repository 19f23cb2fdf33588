import type { InstrumentSnapshot, ReadingPreview } from '.';
import { previewBand, previewReading, readsOf } from '.';
import { RunWalk } from './testing/run-walk';
import { fineGauge, procedure } from './testing/small-walks';

/** At the manifold's reading, with a scan tool whose display has these steps, in this unit. */
function atManifold(resolution: number, unit: 'kPa' | 'hPa' = 'kPa'): RunWalk {
  const scanTool: InstrumentSnapshot = {
    id: 's-3',
    kind: 'scan-tool',
    label: 'S-3',
    dueOn: '2027-03-01',
    shows: [{ unit, sense: 'absolute', low: 0, high: 4000, resolution, accuracy: unit === 'kPa' ? 0.5 : 5 }],
  };
  return new RunWalk(procedure)
    .cautions(1)
    .do(
      { do: 'choose-gear', role: 'gauge', instrument: fineGauge },
      { do: 'choose-gear', role: 'scanTool', instrument: scanTool },
      { do: 'confirm' },
      { do: 'record', name: 'stationPressure', way: 'altimeter-setting', text: '1013.25', unit: 'hPa' },
    )
    .cautions(1);
}

function judged(walk: RunWalk, text: string): Extract<ReadingPreview, { ok: true }>['value'] {
  const preview = previewReading(walk.procedure, walk.state, { name: 'manifoldPressure', text, unit: 'kPa' });
  if (!preview.ok) throw new Error(preview.message);
  return preview.value;
}

/** The band before there is a reading. */
function shownBefore(walk: RunWalk): readonly (string | undefined)[] {
  const step = walk.procedure.step(walk.state.current?.id ?? '');
  const [quantity] = step === undefined ? [] : readsOf(step);
  const band = quantity === undefined ? undefined : previewBand(walk.procedure, walk.state, quantity);
  return [band?.lowText, band?.highText];
}

// The air of the place at 640 m is 93.87 kPa (U.S. Standard Atmosphere 1976, by hand); the band is 2 kPa either side.
describe('the ends of a band that rests on readings', () => {
  it.each([
    [0.1, 'kPa', ['91.9', '95.9']],
    [0.01, 'kPa', ['91.87', '95.87']],
    [1, 'kPa', ['92', '96']],
    [0.5, 'kPa', ['91.9', '95.9']],
    [1, 'hPa', ['91.9', '95.9']],
  ] as const)('have the decimals of a display that goes in steps of %p %s', (resolution, unit, ends) => {
    const walk = atManifold(resolution, unit);
    expect(shownBefore(walk)).toEqual(ends);
    const judgement = judged(walk, '94')?.judgement;
    expect([judgement?.lowText, judgement?.highText]).toEqual(ends);
  });

  it('keep their own decimals where the author gave them outright', () => {
    const walk = atManifold(0.1);
    const listen = walk.procedure.document.steps.find((step) => step.kind === 'listen');
    const sealPoint = listen?.finds.find((found) => 'unit' in found && found.name === 'sealPoint');
    if (sealPoint === undefined || !('unit' in sealPoint)) throw new Error('there is no seal point');
    const coarse = { ...sealPoint, gear: 'gauge' };
    const state = {
      ...walk.state,
      gear: {
        gauge: {
          ...fineGauge,
          seq: 1,
          shows: [{ unit: 'kPa', low: 0, high: 60, resolution: 1, accuracy: 1 } as const],
        },
      },
    };
    const { lowText, highText } = previewBand(walk.procedure, state, coarse) ?? {};
    expect([lowText, highText]).toEqual(['1.5', '5']);
  });

  it('judge by themselves, not by what is shown of them', () => {
    const walk = atManifold(0.1);
    const { high, highText, guard } = judged(walk, '94.2')?.judgement ?? {};
    expect([high, highText]).toEqual([expect.closeTo(95_870, -1), '95.9']);
    // 95.23 is nearer than the guard of 0.653 kPa to 95.87, and would be clear of 95.9.
    expect(guard).toBeCloseTo(653, 0);
    expect([judged(walk, '95.21'), judged(walk, '95.23')].map((value) => value?.judgement?.result)).toEqual([
      'in',
      'too-close',
    ]);
  });
});
