import {
  airOfThePlace,
  besideTheWay,
  coldTemperatures,
  lists,
  practicePlace,
  seen,
  sensorsAtRest,
} from './practice-bench';
import type { PracticeScenario } from './practice-scenario';

const stored = { code: 'P0068', status: 'stored', freezeFrame: '2,100 rpm, 78 kPa' } as const;
const pending = { code: 'P0171', status: 'pending' } as const;

/** Carbon holds the valve open while it is cold. */
export const coldMorning: PracticeScenario = {
  id: 'cold-morning',
  title: 'A cold morning, hissing somewhere',
  story: 'On cold mornings it hisses and hesitates; by noon it is gone. There is oil round the air box.',
  procedureId: 'crankcase-valve-seal',
  half: 'cold',
  visitId: '0193b0a0-0002-7000-8000-00000000c002',
  visit: {
    repairOrder: 'PRACTICE-2',
    vin: '1ZZBT4CK1MR118236',
    car: 'Merrow Heron, blue, 1.6 L turbo petrol',
    odometer: { text: '118240', unit: 'km' },
    concern: 'Hisses and hesitates on cold mornings, oil mist at the air box',
    codes: ['P0068'],
  },
  displacementL: '1.6',
  place: practicePlace,
  ramp: { path: 'practice/cold-morning.csv', fileName: 'cold-morning.csv' },
  bench: {
    ...besideTheWay,
    'cold-enough': coldTemperatures,
    'codes-before': [lists(stored, pending)],
    'station-pressure': airOfThePlace,
    ...sensorsAtRest('94.0', '93.7'),
    'still-quiet': [seen('The hiss is there for all of the thirty seconds.')],
    'where-it-comes-out': [
      seen('With the probe at the manifold valve the hiss is loud.'),
      seen('Dipstick tube, inlet-side vent and every joint are quiet.'),
    ],
    look: [
      seen('Through the borescope: the valve is in its seat, and a black, hard crust sits on one side of its plate.'),
    ],
    'codes-after': [lists(stored, pending)],
    'codes-after-drive': [lists(stored, pending)],
    'clear-codes': [seen('The scan tool says: codes cleared.')],
    'other-half': [seen('The warm half is still to come.')],
  },
  planted: {
    finding: 'doesNotSeal',
    fault: 'Carbon on the plate holds the manifold valve open while it is cold: the noise never stops.',
    lesson: 'A noise that never stops names no part. The probe at the valve and the look through the passage do.',
  },
};
