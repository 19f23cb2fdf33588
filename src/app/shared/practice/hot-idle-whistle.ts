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

const stored = { code: 'P0101', status: 'stored', freezeFrame: 'idle, coolant 96 degC' } as const;

/** Nothing is wrong with the valve: the warm half of a car whose fault lies elsewhere. */
export const hotIdleWhistle: PracticeScenario = {
  id: 'hot-idle-whistle',
  title: 'A whistle at idle when hot',
  story: 'It whistles at the lights once it is warm, and the lamp came on twice.',
  procedureId: 'crankcase-valve-seal',
  half: 'warm',
  visitId: '0193b0a0-0001-7000-8000-00000000c001',
  visit: {
    repairOrder: 'PRACTICE-1',
    vin: '1ZZBT4CK7LR310422',
    car: 'Merrow Heron, green, 1.6 L turbo petrol',
    odometer: { text: '61880', unit: 'km' },
    concern: 'Whistles at idle when hot',
    codes: ['P0101'],
  },
  displacementL: '1.6',
  place: practicePlace,
  ramp: { path: 'practice/hot-idle-whistle.csv', fileName: 'hot-idle-whistle.csv' },
  bench: {
    ...besideTheWay,
    ...shutValve,
    'warm-up': [shows('coolantTemperature', 'Scan tool, coolant', '88', 'degC')],
    'codes-before': [lists(stored)],
    'station-pressure': airOfThePlace,
    ...sensorsAtRest('94.0', '93.7'),
    'still-warm': [shows('coolantAtMark', 'Scan tool, coolant', '81', 'degC')],
    'codes-after': [lists(stored)],
    'codes-after-drive': [lists(stored)],
    'clear-codes': [seen('The scan tool says: codes cleared.')],
    'other-half': [seen('The cold half waits for tomorrow morning.')],
  },
  planted: {
    finding: 'seals',
    fault: 'The manifold valve is sound when warm: it shuts at 3.4 kPa above the air of the place.',
    noiseStops: { timeS: 54.424, gaugeKpa: 3.4 },
    lesson: 'A sound valve is a finding too. One warm half clears it warm, and says nothing about cold.',
  },
};
