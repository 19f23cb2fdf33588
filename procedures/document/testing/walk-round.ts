import type { ProcedureDocument } from '../procedure-document';
import { walkRoundFindings } from './walk-round-findings';
import { walkRoundSteps } from './walk-round-steps';

/**
 * A procedure for tests that has a step of every kind that the crankcase valve seal has not, and every field that a
 * step can have; it calls the plug hold test. It is sound, and its figures are nobody's.
 */
export const walkRound: ProcedureDocument = {
  format: 1,
  id: 'intake-walk-round',
  title: 'Intake walk-round',
  purpose: 'Shows whether the intake tract keeps what is put on it, with evidence that somebody else can look at.',
  system: 'Intake air',
  appliesTo: { codes: ['P0068'], symptoms: ['whistle at idle'], engine: ['turbocharged petrol engine'] },
  expectedMinutes: 20,
  useLevel: 'every-step',
  gear: [
    {
      role: 'gauge',
      kind: 'pressure-gauge',
      label: 'Test gauge',
      shows: { unit: 'kPa', low: 0, high: 60, resolution: 0.1 },
    },
    { role: 'thermometer', kind: 'thermometer', label: 'Thermometer', optional: true },
  ],
  inputs: [],
  pictures: ['air-path'],
  references: ['The maker’s service information for the intake'],
  deference: 'The maker’s service information comes first.',
  start: {
    prerequisites: ['The engine is off.', 'The key is out.'],
    stopActions: ['Close the supply.', 'Open the vent.'],
    people: 'One, and somebody to look a second time.',
    throughout: [{ word: 'warning', text: 'Stored pressure can throw off a plug. Keep out of line with it.' }],
  },
  limits: [
    {
      id: 'ceiling',
      holds: 'gauge <= 34.5 kPa',
      of: ['gauge', 'heldFrom', 'heldTo'],
      says: 'The gauge is over 34.5 kPa.',
      then: 'Close the supply and open the vent.',
    },
  ],
  stop: {
    makeSafe: ['Close the supply.', 'Open the vent.'],
    exit: { to: 'restore', because: 'the test was stopped', verdict: 'notCompleted' },
  },
  steps: [...walkRoundSteps, ...walkRoundFindings],
};
