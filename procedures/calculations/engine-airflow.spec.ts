import * as fc from 'fast-check';
import { speedDensityAirflow, volumetricEfficiency } from './engine-airflow';

const engine = fc.record({
  displacementL: fc.double({ min: 0.01, max: 100, noNaN: true }),
  rpm: fc.double({ min: 1, max: 30_000, noNaN: true }),
  manifoldKpa: fc.double({ min: 0.1, max: 1000, noNaN: true }),
  intakeC: fc.double({ min: -100, max: 1000, noNaN: true }),
});
const heron = { displacementL: 1.6, rpm: 900, manifoldKpa: 35, intakeC: 30 };

describe('speedDensityAirflow', () => {
  it('fills one litre at the density of the standard atmosphere every two turns', () => {
    // 1.225 g/L (ISO 2533), 60 cycles a second at 7200 rpm.
    const flow = speedDensityAirflow({
      displacementL: 1,
      rpm: 7200,
      manifoldKpa: 101.325,
      intakeC: 15,
      volumetricEfficiency: 1,
    });
    expect(flow).toBeCloseTo(73.5, 4);
  });

  it('is undone by volumetricEfficiency', () => {
    fc.assert(
      fc.property(engine, fc.double({ min: 0, max: 3, noNaN: true }), (state, efficiency) => {
        const airflowGps = speedDensityAirflow({ ...state, volumetricEfficiency: efficiency });
        expect(Math.abs(volumetricEfficiency({ ...state, airflowGps }) - efficiency)).toBeLessThanOrEqual(1e-12);
      }),
    );
  });

  it('refuses a percentage, an engine at rest and a volume in cubic centimetres', () => {
    expect(() => speedDensityAirflow({ ...heron, volumetricEfficiency: 85 })).toThrow(
      'volumetricEfficiency is 85; allowed: 0 to 3',
    );
    expect(() => volumetricEfficiency({ ...heron, rpm: 0, airflowGps: 3 })).toThrow('rpm is 0; allowed: 1 to 30000');
    expect(() => volumetricEfficiency({ ...heron, displacementL: 1598, airflowGps: 3 })).toThrow(
      'displacementL is 1598; allowed: 0.01 to 100',
    );
    expect(() => volumetricEfficiency({ ...heron, airflowGps: -1 })).toThrow('airflowGps is -1');
    expect(() => speedDensityAirflow({ ...heron, intakeC: NaN, volumetricEfficiency: 1 })).toThrow('intakeC is NaN');
  });
});
