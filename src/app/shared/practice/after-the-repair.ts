import {
  airOfThePlace,
  besideTheWay,
  coldTemperatures,
  lists,
  practicePlace,
  seen,
  sensorsAtRest,
  shutValve,
} from './practice-bench';
import type { PracticeScenario } from './practice-scenario';

const permanent = { code: 'P0068', status: 'permanent' } as const;

/** A stiff replacement valve: it shuts, but late. */
export const afterTheRepair: PracticeScenario = {
  id: 'after-the-repair',
  title: 'It came back after the repair',
  story: 'Another shop put a new valve in last month. The lamp is on again, and it whistles as before.',
  procedureId: 'crankcase-valve-seal',
  half: 'cold',
  visitId: '0193b0a0-0003-7000-8000-00000000c003',
  visit: {
    repairOrder: 'PRACTICE-3',
    vin: '1ZZWE2CK6KR405519',
    car: 'Merrow Wren estate, white, 1.6 L turbo petrol',
    odometer: { text: '143905', unit: 'km' },
    concern: 'Whistles again one month after the crankcase valve was renewed elsewhere',
    codes: ['P0068'],
  },
  displacementL: '1.6',
  place: practicePlace,
  ramp: { path: 'practice/after-the-repair.csv', fileName: 'after-the-repair.csv' },
  bench: {
    ...besideTheWay,
    ...shutValve,
    'cold-enough': coldTemperatures,
    'codes-before': [lists(permanent)],
    'station-pressure': airOfThePlace,
    ...sensorsAtRest('94.0', '93.7'),
    look: [seen('Through the borescope: the valve is in its seat, new and bright, without a trace of carbon.')],
    'codes-after': [lists(permanent)],
    'codes-after-drive': [lists(permanent)],
    'clear-codes': [seen('The scan tool says: codes cleared; the permanent one stays until its own monitor has run.')],
    'other-half': [seen('The warm half is still to come.')],
  },
  planted: {
    finding: 'sealsOutsideBand',
    fault: 'The new valve has too stiff a spring: it shuts only at 6.2 kPa above the air of the place.',
    noiseStops: { timeS: 90.852, gaugeKpa: 6.2 },
    lesson: 'That the noise stops is not enough: the pressure at which it stops has a band of its own.',
  },
};
