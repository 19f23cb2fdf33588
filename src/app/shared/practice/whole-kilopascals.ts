import {
  airOfThePlace,
  besideTheWay,
  lists,
  practicePlace,
  seen,
  sensorsAtRest,
  shows,
  shutValve,
} from './practice-bench';
import type { PracticeScenario } from './practice-scenario';

const stored = { code: 'P0236', status: 'stored' } as const;

/** A sound valve seen through a scan tool that shows whole kilopascals and lost three seconds of the log. */
export const wholeKilopascals: PracticeScenario = {
  id: 'whole-kilopascals',
  title: 'Coarse figures and a gap',
  story: 'The lamp came on under load. The good scan tool is out; this one shows whole kilopascals.',
  procedureId: 'crankcase-valve-seal',
  half: 'warm',
  visitId: '0193b0a0-0004-7000-8000-00000000c004',
  visit: {
    repairOrder: 'PRACTICE-4',
    vin: '1ZZBT4CK0LR377041',
    car: 'Merrow Heron, red, 1.6 L turbo petrol',
    odometer: { text: '88412', unit: 'km' },
    concern: 'Lamp came on under load',
    codes: ['P0236'],
  },
  displacementL: '1.6',
  place: practicePlace,
  ramp: { path: 'practice/whole-kilopascals.csv', fileName: 'whole-kilopascals.csv' },
  bench: {
    ...besideTheWay,
    ...shutValve,
    'warm-up': [shows('coolantTemperature', 'Scan tool, coolant', '90', 'degC')],
    'codes-before': [lists(stored)],
    'station-pressure': airOfThePlace,
    ...sensorsAtRest('94', '94'),
    'still-warm': [shows('coolantAtMark', 'Scan tool, coolant', '79', 'degC')],
    'codes-after': [lists(stored)],
    'codes-after-drive': [lists(stored)],
    'clear-codes': [seen('The scan tool says: codes cleared.')],
    'other-half': [seen('The cold half waits for tomorrow morning.')],
  },
  planted: {
    finding: 'seals',
    fault: 'The manifold valve is sound when warm: it shuts at 3.0 kPa above the air of the place.',
    noiseStops: { timeS: 49.136, gaugeKpa: 3.0 },
    lesson: 'The digits that an instrument shows decide what may be said. The gauge had them, the scan tool had not.',
  },
};
