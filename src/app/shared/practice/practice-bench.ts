import type { TroubleCodeEntry } from '../../../../procedures/engine/showing';
import type { UnitName } from '../../../../procedures/calculations/for-a-run';
import type { BenchEntry } from './practice-scenario';

/** An instrument shows a figure. */
export function shows(name: string, label: string, text: string, unit: UnitName): BenchEntry {
  return { what: 'figure', name, label, text, unit };
}

/** Something is seen or heard. */
export function seen(text: string): BenchEntry {
  return { what: 'seen', text };
}

/** The scan tool lists trouble codes. */
export function lists(...codes: readonly TroubleCodeEntry[]): BenchEntry {
  return { what: 'codes', codes };
}

/** The air of the place is the same in all scenarios: 93.9 kPa at 640 m. */
export const airOfThePlace: readonly BenchEntry[] = [
  shows('altimeterSetting', 'Altimeter setting of the next airfield', '1014', 'hPa'),
  shows('barometerPressure', 'Barometer', '93.9', 'kPa'),
];

export const coldTemperatures: readonly BenchEntry[] = [
  shows('coolantTemperature', 'Scan tool, coolant', '14', 'degC'),
  shows('ambientTemperature', 'Thermometer, air around the car', '13', 'degC'),
];

/** The two sensors, key on and engine off, as the scan tool shows them. */
export function sensorsAtRest(manifold: string, boost: string): Readonly<Record<string, readonly BenchEntry[]>> {
  return {
    'manifold-pressure': [shows('manifoldPressure', 'Scan tool, manifold pressure', manifold, 'kPa')],
    'boost-pressure': [shows('boostPressure', 'Scan tool, boost pressure', boost, 'kPa')],
  };
}

const gaugeBackAtZero: readonly BenchEntry[] = [shows('gaugeLeft', 'Gauge of the supply', '0.0', 'kPa')];

/** Off the plain way the bench has something to show too: whoever takes another turn is not left with guessing. */
export const besideTheWay: Readonly<Record<string, readonly BenchEntry[]>> = {
  'rewarm-zero': gaugeBackAtZero,
  'isolate-zero': gaugeBackAtZero,
  'gauge-zero': gaugeBackAtZero,
  'listen-elsewhere': [seen('Along the manifold and the duct the probe gives no sound.')],
  pulse: [seen('The inlet-side port is quiet before the pulse and after it.')],
  'mend-joint': [seen('Every clamp and joint is tight: there is nothing to mend.')],
  'turn-crankshaft': [seen('The crankshaft turns by hand; no intake valve stands open.')],
  'look-over': [seen('Brakes, steering, tyres, lights and fluids: nothing forbids driving.')],
  'road-test': [seen('Every window of the route was visited.')],
};

/** A valve that has shut: quiet above its seal point, and clean. */
export const shutValve: Readonly<Record<string, readonly BenchEntry[]>> = {
  'still-quiet': [seen('Thirty seconds at 10 kPa, and the probe gives no sound.')],
  'where-it-comes-out': [
    seen('At 10 kPa the probe is quiet at the valve, the dipstick tube, the vent and every joint.'),
  ],
  look: [seen('Through the borescope: the valve is in its seat, without a trace of carbon.')],
};

/** The place of every practice run. */
export const practicePlace = { name: 'Practice bay', elevationM: '640' } as const;
