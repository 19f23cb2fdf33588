import * as fc from 'fast-check';
import { criticalPressureRatio, flowFunction, orificeDiameter, orificeMassFlow } from './orifice';

const gamma = fc.double({ min: 1.01, max: 1.7, noNaN: true });
const hole = fc.record({
  upstreamKpa: fc.double({ min: 0.001, max: 10_000, noNaN: true }),
  upstreamC: fc.double({ min: -100, max: 1000, noNaN: true }),
  dischargeCoefficient: fc.double({ min: 0.001, max: 1, noNaN: true }),
  gamma,
});
const share = fc.double({ min: 0, max: 1, noNaN: true });
const room = { downstreamKpa: 97.35, upstreamC: 25 };

describe('orificeMassFlow', () => {
  it('agrees with the form in Mach number (NACA Report 1135), choked and not', () => {
    fc.assert(
      fc.property(gamma, fc.double({ min: 0.001, max: 1, noNaN: true }), (g, mach) => {
        const stagnation = 1 + ((g - 1) / 2) * mach ** 2;
        const ratio = stagnation ** (-g / (g - 1));
        const expected = Math.sqrt(g) * mach * stagnation ** (-(g + 1) / (2 * (g - 1)));
        // A ratio next to 1, as it is given here, has already lost what it lacks of 1 to rounding.
        const lostToRounding = 1e-15 / (1 - ratio ** ((g - 1) / g));
        expect(Math.abs(flowFunction(300, 300 * ratio, g) / expected - 1)).toBeLessThan(1e-12 + lostToRounding);
      }),
      { numRuns: 2000 },
    );
  });

  it('approaches the incompressible sqrt(2 rho dp) as the pressure difference vanishes', () => {
    for (const differenceKpa of [1e-2, 1e-4, 1e-6, 1e-8]) {
      const upstreamKpa = room.downstreamKpa + differenceKpa;
      const kept = upstreamKpa - room.downstreamKpa;
      const density = (upstreamKpa * 1000) / (287.05287 * 298.15);
      const gps = (Math.PI / 4) * 1e-6 * Math.sqrt(2 * density * kept * 1000) * 1000;
      const flow = orificeMassFlow({ ...room, diameterMm: 1, upstreamKpa });
      // The first term that compressibility adds is 3 / (4 gamma) of the relative difference.
      expect(Math.abs(flow.gps / gps - 1)).toBeLessThan(kept / upstreamKpa + 1e-12);
    }
  });

  it('does not change below the critical pressure, and is steady across it', () => {
    const critical = 300 * criticalPressureRatio(1.4);
    const at = (downstreamKpa: number) =>
      orificeMassFlow({ diameterMm: 1, upstreamKpa: 300, upstreamC: 20, downstreamKpa });
    expect(at(0)).toEqual(at(critical));
    expect(at(critical).choked).toBe(true);
    expect(at(critical + 1e-6).choked).toBe(false);
    expect(Math.abs(at(critical + 1e-6).gps / at(critical).gps - 1)).toBeLessThan(1e-9);
  });

  it('falls as the pressure behind it rises', () => {
    fc.assert(
      fc.property(hole, share, share, (conditions, ...shares) => {
        const [low = 0, high = 0] = shares.sort((a, b) => a - b).map((part) => part * conditions.upstreamKpa);
        const at = (downstreamKpa: number) => orificeMassFlow({ ...conditions, diameterMm: 2, downstreamKpa }).gps;
        expect(at(high)).toBeLessThanOrEqual(at(low) * (1 + 1e-12));
      }),
    );
  });

  it('refuses a flow uphill and coefficients that no hole has', () => {
    const flow = { ...room, diameterMm: 1, upstreamKpa: 132 };
    expect(() => orificeMassFlow({ ...flow, downstreamKpa: 133 })).toThrow('downstreamKpa is 133; allowed: 0 to 132');
    expect(() => orificeMassFlow({ ...flow, diameterMm: -1 })).toThrow('diameterMm is -1; allowed: 0 to 1000');
    expect(() => orificeMassFlow({ ...flow, dischargeCoefficient: 1.2 })).toThrow('dischargeCoefficient is 1.2');
    expect(() => orificeMassFlow({ ...flow, gamma: 1 })).toThrow('gamma is 1; allowed: 1.01 to 1.7');
    expect(() => orificeMassFlow({ ...flow, upstreamC: Infinity })).toThrow('upstreamC is Infinity');
  });
});

describe('orificeDiameter', () => {
  it('undoes orificeMassFlow', () => {
    const below = fc.double({ min: 0, max: 1, noNaN: true, maxExcluded: true });
    fc.assert(
      fc.property(hole, below, fc.double({ min: 0, max: 1000, noNaN: true }), (conditions, part, diameterMm) => {
        const at = { ...conditions, downstreamKpa: part * conditions.upstreamKpa };
        fc.pre(at.downstreamKpa < at.upstreamKpa);
        const { gps } = orificeMassFlow({ ...at, diameterMm });
        fc.pre(gps <= 1_000_000);
        expect(Math.abs(orificeDiameter({ ...at, flowGps: gps }) - diameterMm)).toBeLessThanOrEqual(1e-9);
      }),
      { numRuns: 2000 },
    );
  });

  it('refuses a flow between equal pressures', () => {
    const still = { upstreamKpa: 97.35, downstreamKpa: 97.35, upstreamC: 25 };
    expect(() => orificeDiameter({ ...still, flowGps: 1 })).toThrow(
      'downstreamKpa is 97.35; allowed: 0 to below upstreamKpa, 97.35',
    );
    expect(() => orificeDiameter({ ...still, flowGps: -1 })).toThrow('flowGps is -1');
  });
});
