import {
  convert,
  decayLeakRate,
  describeTroubleCode,
  dryAirDensity,
  expandedUncertainty,
  moistAirDensity,
  orificeMassFlow,
  standardPressure,
  stationPressure,
} from '../../procedures/calculations';
import { flowFunction } from '../../procedures/calculations/orifice';

/** Expects a result within half of the last printed digit, or what else is allowed. */
const expectPrinted = (found: number, printed: number, allowed: number) =>
  expect(Math.abs(found - printed)).toBeLessThanOrEqual(allowed);

describe('standard atmosphere, table of the U.S. Standard Atmosphere 1976 as printed: cut, not rounded, to 1 Pa', () => {
  it.each([
    [-500, 107_477],
    [0, 101_325],
    [500, 95_461],
    [1000, 89_876],
    [1500, 84_559],
    [2000, 79_501],
    [2500, 74_691],
    [3000, 70_121],
    [3500, 65_780],
  ])('%d m: %d Pa', (elevationM, printedPa) => {
    // The row of -500 m lies 1 Pa below the formula.
    const foundPa = standardPressure(elevationM) * 1000;
    expect(foundPa - printedPa).toBeGreaterThanOrEqual(0);
    expect(foundPa - printedPa).toBeLessThan(elevationM === -500 ? 2 : 1);
  });

  it('8000 ft: 1572.1 lbf/ft2; 5000 m: 54 048.3 Pa; 1000 m: 89 876.3 Pa', () => {
    const psi = convert(standardPressure(8000 * 0.3048), 'kPa', 'psi');
    expectPrinted(psi * 144, 1572.1, 0.1);
    expectPrinted(standardPressure(5000) * 1000, 54_048.3, 0.1);
    expectPrinted(standardPressure(1000) * 1000, 89_876.3, 0.05);
  });

  it('in inches of mercury: 31.738 at -500 m, 28.646 at 1200 ft, 24.637 at 5280 ft (ISO 2533:1975)', () => {
    const inHg = (elevationM: number) => convert(standardPressure(elevationM), 'kPa', 'inHg');
    expectPrinted(inHg(-500), 31.738, 0.0005);
    expectPrinted(inHg(365.76), 28.646, 0.0005);
    expectPrinted(inHg(1609.344), 24.637, 0.0005);
  });

  it('falls by 11.6 Pa each metre near 1200 ft (ISO 2533:1975)', () => {
    expectPrinted((standardPressure(365.26) - standardPressure(366.26)) * 1000, 11.6, 0.05);
  });

  it.each([
    [365.76, 0.2],
    [1609.344, 4],
    [2438.4, 9],
    [3500, 16],
  ])('an elevation of %d m taken as geopotential is %d Pa lower (ISO 2533:1975)', (elevationM, lowerPa) => {
    const asGeopotential = standardPressure((6_356_766 * elevationM) / (6_356_766 - elevationM));
    expectPrinted((standardPressure(elevationM) - asGeopotential) * 1000, lowerPa, lowerPa < 1 ? 0.05 : 0.5);
  });
});

describe('station pressure, worked examples of the FAA form as printed', () => {
  it.each([
    [30.2, 5045, 84_977],
    [30.37, 7014, 79_375],
  ])('%d inHg at %d ft: %d Pa, cut to 1 Pa', (settingInHg, elevationFt, printedPa) => {
    const altimeterSettingKpa = convert(settingInHg, 'inHg', 'kPa');
    const foundPa = stationPressure({ altimeterSettingKpa, elevationM: elevationFt * 0.3048 }) * 1000;
    expectPrinted(foundPa, printedPa, 1);
  });
});

describe('units, as NIST SP 811 (2008) B.8 prints them', () => {
  it.each([
    ['psi', 6894.757, 6894.757293168361],
    ['inHg', 3386.389, 3386.388640341],
    ['inH2O', 249.0889, 249.08891],
    ['mmHg', 133.3224, 133.322387415],
  ] as const)('1 %s is %d Pa, exactly %d', (name, printed, exact) => {
    const found = convert(1, name, 'Pa');
    expectPrinted(found, printed, printed > 1000 ? 5e-4 : 5e-5);
    expect(Math.abs(found / exact - 1)).toBeLessThan(1e-15 * 4);
  });
});

describe('density of air', () => {
  it('ANR of ISO 8778 (from memory): CIPM-2007 gives 1.1820 kg/m3, 0.25 % below the 1.185 of the standard', () => {
    const found = moistAirDensity({ pressureKpa: 100, temperatureC: 20, relativeHumidity: 0.65 });
    expectPrinted(found, 1.182, 5e-5);
    expectPrinted(1 - found / 1.185, 0.0025, 5e-5);
  });

  it.each([
    [101.325, 20, 0.5, -0.4],
    [101.325, 20, 0, 0.04],
    [97.35, 25, 0.6, -0.71],
    [95, 35, 0.8, -1.76],
    [100, 5, 0.3, -0.05],
  ])(
    'humidity at %d kPa, %d degC and %d changes it by %d % (CIPM-2007 over the dry ideal gas)',
    (pressureKpa, temperatureC, relativeHumidity, percent) => {
      const moist = moistAirDensity({ pressureKpa, temperatureC, relativeHumidity });
      expectPrinted((moist / dryAirDensity({ pressureKpa, temperatureC }) - 1) * 100, percent, 0.005);
    },
  );
});

describe('leaks', () => {
  it('1 K of cooling at 131 kPa looks like a loss of 0.44 kPa (ideal gas)', () => {
    const cooled = { volumeL: 8, startKpa: 131, endKpa: 131 * (297.15 / 298.15), startC: 25, endC: 24, seconds: 60 };
    expectPrinted(131 - cooled.endKpa, 0.44, 0.005);
    expectPrinted(decayLeakRate(cooled).standardCm3PerMin, 0, 1e-9);
  });

  it('at 5 psi over 97.35 kPa a leak is not choked, and the choked formula reads 12 % high (NACA Report 1135)', () => {
    const upstreamKpa = 97.35 + convert(5, 'psi', 'kPa');
    const { choked } = orificeMassFlow({ diameterMm: 1, upstreamKpa, downstreamKpa: 97.35, upstreamC: 25 });
    expect(choked).toBe(false);
    expectPrinted(97.35 / upstreamKpa, 0.738, 0.0005);
    expectPrinted(flowFunction(1, 0, 1.4) / flowFunction(upstreamKpa, 97.35, 1.4), 1.12, 0.005);
  });
});

describe('uncertainty, as JCGM 100:2008 prints it (from memory)', () => {
  it('4.3.7: half-width 0.40e-6 gives 0.23e-6; 15 uV gives 8.7 uV, with 12 uV of scatter 15 uV', () => {
    expectPrinted(expandedUncertainty({ accuracy: 0.4e-6, k: 1 }), 0.23e-6, 0.005e-6);
    expectPrinted(expandedUncertainty({ accuracy: 15, k: 1 }), 8.7, 0.05);
    expectPrinted(expandedUncertainty({ accuracy: 15, repeatDeviation: 12, k: 1 }), 15, 0.5);
  });

  it('F.2.2.1: a step of 1 kPa is U = 0.58 kPa from the step alone', () => {
    expectPrinted(expandedUncertainty({ resolution: 1 }), 0.58, 0.005);
  });
});

describe('facts of the trade (common practice, no source), in the numbers that the product gives them', () => {
  it('about 97 to 98 kPa at about 1200 ft', () => {
    expectPrinted(standardPressure(365.76), 97.01, 0.005);
    expectPrinted(stationPressure({ altimeterSettingKpa: 102.3, elevationM: 366 }), 97.95, 0.005);
  });

  it('5 psi is 34.5 kPa, about 132 kPa absolute there', () => {
    expectPrinted(convert(5, 'psi', 'kPa'), 34.5, 0.05);
    expectPrinted(97.35 + convert(5, 'psi', 'kPa'), 132, 0.5);
  });

  it('2 to 3 kPa is 0.29 to 0.44 psi or 8.0 to 12.0 inH2O, and a mark of 0.1 psi is 0.69 kPa', () => {
    expectPrinted(convert(2, 'kPa', 'psi'), 0.29, 0.005);
    expectPrinted(convert(3, 'kPa', 'psi'), 0.44, 0.005);
    expectPrinted(convert(2, 'kPa', 'inH2O'), 8, 0.05);
    expectPrinted(convert(3, 'kPa', 'inH2O'), 12, 0.05);
    expectPrinted(convert(0.1, 'psi', 'kPa'), 0.69, 0.005);
  });
});

describe('generic trouble codes about air metering (SAE J2012 / ISO 15031-6, from memory)', () => {
  it.each([
    ['P0068', /manifold.*throttle/i],
    ['P0069', /manifold.*barometric/i],
    ['P0100', /air flow "A" circuit$/],
    ['P0101', /air flow "A" circuit.*range.*performance/],
    ['P0102', /air flow "A" circuit low/],
    ['P0103', /air flow "A" circuit high/],
    ['P0104', /air flow "A" circuit intermittent/],
    ['P0105', /manifold.*barometric.*circuit$/i],
    ['P0106', /manifold.*circuit range.*performance/i],
    ['P0107', /manifold.*circuit low/i],
    ['P0108', /manifold.*circuit high/i],
    ['P0109', /manifold.*circuit intermittent/i],
    ['P0110', /intake air temperature sensor 1/i],
    ['P0111', /intake air temperature sensor 1.*range.*performance/i],
    ['P0112', /intake air temperature sensor 1.*low/i],
    ['P0113', /intake air temperature sensor 1.*high/i],
    ['P0171', /too lean.*bank 1/i],
    ['P0172', /too rich.*bank 1/i],
    ['P0174', /too lean.*bank 2/i],
    ['P0175', /too rich.*bank 2/i],
    ['P0234', /overboost/i],
    ['P0235', /boost sensor "A" circuit$/i],
    ['P0236', /boost sensor "A" circuit range.*performance/i],
    ['P0237', /boost sensor "A" circuit low/i],
    ['P0238', /boost sensor "A" circuit high/i],
    ['P0299', /underboost/i],
    ['P0506', /idle.*lower/i],
    ['P0507', /idle.*higher/i],
    ['P2177', /too lean off idle.*bank 1/i],
    ['P2179', /too lean off idle.*bank 2/i],
    ['P2187', /too lean at idle.*bank 1/i],
    ['P2189', /too lean at idle.*bank 2/i],
    ['P2226', /barometric pressure.*circuit/i],
    ['P2227', /barometric pressure.*range.*performance/i],
    ['P2228', /barometric pressure.*low/i],
    ['P2229', /barometric pressure.*high/i],
    ['P2230', /barometric pressure.*intermittent/i],
    ['P2261', /bypass valve.*mechanical/i],
    ['P2263', /boost.*performance/i],
    ['P2279', /intake air.*leak/i],
    ['P2280', /restriction.*filter/i],
    ['P2281', /leak between.*throttle/i],
    ['P2282', /leak between.*throttle.*intake valves/i],
    ['P04DB', /crankcase ventilation.*disconnected/i],
    ['P052E', /crankcase ventilation.*performance/i],
  ])('%s', (code, words) => {
    expect(describeTroubleCode(code)).toMatch(words);
  });
});
