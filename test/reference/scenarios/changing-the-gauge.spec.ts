import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear, gaugeG12, gaugeG7 } from '../../support/ossenholt-gear';
import { readRamp } from '../../support/ramp-file';
import { driveRun, type Row } from '../../support/run-driver';
import { codesClearedAfter, coldToAir, gaugeAtZero, otherHalfNext, sensorsInBand } from '../../support/valve-seal-rows';

/** The same ramp at the same marks: only the gauge that it was read with differs. */
describe('the gauge decides what can be judged', () => {
  const procedure = compiledValveSeal();
  const ramp: Row = ['11', { listen: readRamp('demo-warm-seals'), begins: 13, stops: 54.4 }];
  const quiet: Row = ['12b', { choose: ['stillQuiet'] }];
  const closing: readonly Row[] = [...gaugeAtZero, ...codesClearedAfter, ...otherHalfNext];

  const fine = driveRun({
    procedure,
    half: 'cold',
    gear: { ...fineGear, gauge: gaugeG12 },
    table: [...coldToAir, ...sensorsInBand, ramp, quiet, ...closing],
  });
  const coarse = driveRun({
    procedure,
    half: 'cold',
    gear: { ...fineGear, gauge: gaugeG7 },
    table: [...coldToAir, ...sensorsInBand, ramp, ramp, ramp, quiet, ...closing],
  });

  it('calls the seal point in band with 0.1 kPa steps and too close with 1 kPa steps', () => {
    expect(fine.state.values['sealPoint']?.judgement?.result).toBe('in');
    expect(coarse.state.values['sealPoint']?.judgement?.result).toBe('too-close');
    expect(fine.state.finding).toBe('seals');
    expect(coarse.state.finding).toBe('sealsTooClose');
  });

  it('changes the uncertainty and hardly the figure', () => {
    const sharp = fine.state.values['sealPoint']!;
    const blunt = coarse.state.values['sealPoint']!;
    // JCGM 100:2008, 4.3.7: the gauge's accuracy alone, rectangular, k = 2, is 2 x 1.5 / sqrt(3) = 1.73 kPa.
    expect(blunt.uncertainty / 1000).toBeGreaterThan(1.73);
    expect(sharp.uncertainty / 1000).toBeLessThan(1);
    expect(Math.abs(blunt.value - sharp.value)).toBeLessThanOrEqual(sharp.uncertainty);
  });

  it('leaves the sensors as they were', () => {
    expect(coarse.state.values['manifoldPressure']?.judgement).toEqual(
      fine.state.values['manifoldPressure']?.judgement,
    );
  });
});
