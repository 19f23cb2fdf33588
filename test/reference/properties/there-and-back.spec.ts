import * as fc from 'fast-check';
import {
  decodeTroubleCode,
  elevationOf,
  orificeDiameter,
  orificeMassFlow,
  speedDensityAirflow,
  standardPressure,
  toAbsolute,
  toGauge,
  volumetricEfficiency,
} from '../../../procedures/calculations';
import { between, expectClose, thousands } from './runs';

describe('there and back to 1e-9', () => {
  it('elevationOf of standardPressure, and standardPressure of elevationOf', () => {
    fc.assert(
      fc.property(between(-1000, 11_000), between(22.7, 113.9), (elevationM, pressureKpa) => {
        expectClose(elevationOf(standardPressure(elevationM)), elevationM, 1e-9);
        expectClose(standardPressure(elevationOf(pressureKpa)), pressureKpa, 1e-9);
      }),
      thousands,
    );
  });

  it('toGauge of toAbsolute, and toAbsolute of toGauge', () => {
    fc.assert(
      fc.property(between(20, 115), between(0, 1), between(0, 2000), (stationKpa, share, absoluteKpa) => {
        const gaugeKpa = -stationKpa + share * 2000;
        expectClose(toGauge(toAbsolute(gaugeKpa, stationKpa), stationKpa), gaugeKpa, 1e-9);
        expectClose(toAbsolute(toGauge(absoluteKpa, stationKpa), stationKpa), absoluteKpa, 1e-9);
      }),
      thousands,
    );
  });

  it('orificeDiameter of orificeMassFlow, and orificeMassFlow of orificeDiameter, by bisection too', () => {
    const hole = fc.record({
      upstreamKpa: between(10, 1000),
      upstreamC: between(-40, 200),
      dischargeCoefficient: between(0.3, 1),
      gamma: between(1.2, 1.67),
    });
    fc.assert(
      fc.property(hole, between(0, 0.999999), between(0, 100), (conditions, share, diameterMm) => {
        const at = { ...conditions, downstreamKpa: share * conditions.upstreamKpa };
        const { gps } = orificeMassFlow({ ...at, diameterMm });
        const found = orificeDiameter({ ...at, flowGps: gps });
        expectClose(found, diameterMm, 1e-9);
        expectClose(orificeMassFlow({ ...at, diameterMm: found }).gps, gps, 1e-9);
        // The flow rises with the diameter: halve the bracket until it holds no other number.
        let [low, high] = [0, 200];
        for (let step = 0; step < 60; step++) {
          const middle = (low + high) / 2;
          if (orificeMassFlow({ ...at, diameterMm: middle }).gps < gps) low = middle;
          else high = middle;
        }
        expectClose(found, high, 1e-9);
      }),
      thousands,
    );
  });

  it('volumetricEfficiency of speedDensityAirflow, and speedDensityAirflow of volumetricEfficiency', () => {
    const engine = fc.record({
      displacementL: between(0.5, 8),
      rpm: between(500, 9000),
      manifoldKpa: between(15, 350),
      intakeC: between(-40, 150),
    });
    fc.assert(
      fc.property(engine, between(0, 3), between(0, 1), (state, efficiency, share) => {
        const airflowGps = speedDensityAirflow({ ...state, volumetricEfficiency: efficiency });
        expectClose(volumetricEfficiency({ ...state, airflowGps }), efficiency, 1e-9);
        const measured = share * speedDensityAirflow({ ...state, volumetricEfficiency: 1 });
        const found = volumetricEfficiency({ ...state, airflowGps: measured });
        expectClose(speedDensityAirflow({ ...state, volumetricEfficiency: found }), measured, 1e-9);
      }),
      thousands,
    );
  });

  it('decodeTroubleCode, for every two bytes there are (SAE J2012 / ISO 15031-6, from memory)', () => {
    const codes = new Set<string>();
    for (let bits = 1; bits < 65_536; bits++) {
      const code = decodeTroubleCode(bits >> 8, bits & 255) ?? '';
      const back =
        ('PCBU'.indexOf(code.charAt(0)) << 14) | (Number(code.charAt(1)) << 12) | parseInt(code.slice(2), 16);
      if (back !== bits || !/^[PCBU][0-3][0-9A-F]{3}$/.test(code)) throw new Error(`${bits} is ${code}, back ${back}`);
      codes.add(code);
    }
    expect(codes.size).toBe(65_535);
    expect(decodeTroubleCode(0, 0)).toBeUndefined();
  });
});
