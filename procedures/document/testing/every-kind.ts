import type { ProcedureDocument } from '../procedure-document';
import { everyKindFindings } from './every-kind-findings';
import { everyKindMoreSteps } from './every-kind-more-steps';
import { everyKindSteps } from './every-kind-steps';

/**
 * An invented procedure with a step of every kind and every field that a document can have. It is sound: the lint has
 * nothing to say about it, so a spec that breaks one thing sees one finding. Its figures are nobody's.
 */
export const everyKind: ProcedureDocument = {
  format: 1,
  id: 'every-kind',
  title: 'Every kind of step',
  purpose: 'Shows that a valve shuts, with every kind of step that there is.',
  system: 'Crankcase ventilation',
  appliesTo: { codes: ['P0068'], symptoms: ['whistle at idle'], engine: ['turbocharged petrol engine'] },
  expectedMinutes: 25,
  useLevel: 'every-step',
  pair: true,
  gear: [
    {
      role: 'gauge',
      kind: 'pressure-gauge',
      label: 'Test gauge',
      shows: { unit: 'kPa', low: 0, high: 60, resolution: 0.1 },
    },
    {
      role: 'scanTool',
      kind: 'scan-tool',
      label: 'Scan tool',
      shows: { unit: 'kPa', low: 0, high: 250, resolution: 0.1 },
    },
    { role: 'barometer', kind: 'barometer', label: 'Barometer', optional: true },
  ],
  inputs: [
    { name: 'elevation', label: 'Elevation of the site', unit: 'm', from: 'site.elevation', source: 'the site' },
    {
      name: 'sealHigh',
      label: 'Seal point at most',
      unit: 'kPa',
      sense: 'gauge',
      from: 'default',
      default: '5.0',
      source: 'common practice, no source',
    },
  ],
  pictures: ['air-path'],
  references: ['The maker’s service instructions'],
  deference: 'The maker comes first.',
  start: {
    prerequisites: ['Engine off.'],
    stopActions: ['Close the supply.', 'Open the vent.'],
    people: 'One.',
    throughout: [{ word: 'warning', text: 'Stored pressure can throw off a plug.' }],
  },
  limits: [
    {
      id: 'ceiling',
      holds: 'gauge <= 34.5 kPa',
      of: ['gauge', 'manifold', 'gaugeLeft'],
      says: 'More than 34.5 kPa.',
      then: 'Close the supply.',
    },
  ],
  stop: {
    makeSafe: ['Close the supply.', 'Open the vent.'],
    exit: { to: 'restore', because: 'the test was stopped', verdict: 'notCompleted' },
  },
  steps: [...everyKindSteps, ...everyKindFindings, ...everyKindMoreSteps],
};
