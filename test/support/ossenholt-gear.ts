import type { InstrumentSnapshot } from '../../procedures/engine';

/** The instruments of the invented Ossenholt Garage, as runs of specs choose them. */

/** A fine gauge: 0.1 kPa steps. */
export const gaugeG12: InstrumentSnapshot = {
  id: 'g-12',
  kind: 'pressure-gauge',
  label: 'G-12',
  shows: [{ unit: 'kPa', sense: 'gauge', low: 0, high: 60, resolution: 0.1, accuracy: 0.25 }],
  dueOn: '2027-03-01',
};

/** A coarse gauge: 1 kPa steps. */
export const gaugeG7: InstrumentSnapshot = {
  id: 'g-7',
  kind: 'pressure-gauge',
  label: 'G-7',
  shows: [{ unit: 'kPa', sense: 'gauge', low: 0, high: 100, resolution: 1, accuracy: 1.5 }],
  dueOn: '2027-03-01',
};

export const scanToolS3: InstrumentSnapshot = {
  id: 's-3',
  kind: 'scan-tool',
  label: 'S-3',
  shows: [
    { unit: 'kPa', sense: 'absolute', low: 10, high: 350, resolution: 0.1, accuracy: 0.5 },
    { unit: 'degC', low: -40, high: 150, resolution: 1, accuracy: 1 },
  ],
  dueOn: '2027-03-01',
};

/** A scan tool on a bus that carries one byte a pressure: whole kilopascals. */
export const scanToolS1: InstrumentSnapshot = {
  id: 's-1',
  kind: 'scan-tool',
  label: 'S-1',
  shows: [
    { unit: 'kPa', sense: 'absolute', low: 0, high: 255, resolution: 1, accuracy: 0.5 },
    { unit: 'degC', low: -40, high: 215, resolution: 1, accuracy: 1 },
  ],
  dueOn: '2027-03-01',
};

export const probeL2: InstrumentSnapshot = {
  id: 'l-2',
  kind: 'listening-probe',
  label: 'L-2',
  shows: [],
  dueOn: '2027-03-01',
};

export const barometerB1: InstrumentSnapshot = {
  id: 'b-1',
  kind: 'barometer',
  label: 'B-1',
  shows: [{ unit: 'kPa', sense: 'absolute', low: 80, high: 110, resolution: 0.1, accuracy: 0.15 }],
  dueOn: '2027-03-01',
};

export const thermometerT4: InstrumentSnapshot = {
  id: 't-4',
  kind: 'thermometer',
  label: 'T-4',
  shows: [{ unit: 'degC', low: -30, high: 60, resolution: 1, accuracy: 1 }],
  dueOn: '2027-03-01',
};

/** What a run with fine instruments chooses, by role. */
export const fineGear: Readonly<Record<string, InstrumentSnapshot>> = {
  gauge: gaugeG12,
  scanTool: scanToolS3,
  probe: probeL2,
  barometer: barometerB1,
  thermometer: thermometerT4,
};
