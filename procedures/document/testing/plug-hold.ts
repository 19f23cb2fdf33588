import type { FindingStep, ProcedureDocument } from '../procedure-document';

const source = 'common practice, no source';

function finding(
  words: Pick<FindingStep, 'id' | 'number' | 'title' | 'result' | 'verdict'>,
  more: Partial<FindingStep> = {},
): FindingStep {
  return {
    kind: 'finding',
    action: 'Read the finding.',
    cause: [{ text: 'The plug stood at {plugPressure}.' }],
    correction: [{ text: 'None at the plug.' }],
    customer: [{ text: 'The plug was tested.' }],
    ...words,
    ...more,
  };
}

/** A short procedure that another one calls: does the plug itself hold? Its figures are nobody's. */
export const plugHold: ProcedureDocument = {
  format: 1,
  id: 'plug-hold',
  title: 'Plug hold test',
  purpose: 'Shows that the plug in the inlet duct holds, before anything is concluded from the engine behind it.',
  system: 'Test gear',
  appliesTo: { codes: [], symptoms: ['plug creeps out'], engine: ['petrol engine'] },
  expectedMinutes: 4,
  useLevel: 'every-step',
  gear: [
    {
      role: 'gauge',
      kind: 'pressure-gauge',
      label: 'Test gauge',
      shows: { unit: 'kPa', low: 0, high: 60, resolution: 0.1 },
    },
  ],
  inputs: [
    {
      name: 'least',
      label: 'Least that the plug must hold',
      unit: 'kPa',
      sense: 'gauge',
      from: 'default',
      default: '2.0',
      source,
    },
  ],
  pictures: ['air-path'],
  references: [],
  deference: 'The maker’s service information comes first.',
  start: {
    prerequisites: ['The engine is off.'],
    stopActions: ['Close the supply.'],
    people: 'One.',
    throughout: [
      { word: 'warning', text: 'Pressure can throw off a plug. Keep your face and hands out of line with it.' },
    ],
  },
  limits: [
    {
      id: 'plug-ceiling',
      holds: 'gauge <= 20 kPa',
      of: ['gauge', 'plugPressure'],
      says: 'The gauge is over 20 kPa.',
      then: 'Close the supply and open the vent.',
    },
  ],
  stop: {
    makeSafe: ['Close the supply.', 'Open the vent.'],
    exit: { to: 'back', because: 'the test was stopped', verdict: 'plugUnfinished' },
  },
  steps: [
    {
      id: 'start',
      number: '1',
      kind: 'start',
      title: 'Start card',
      action: 'Get ready for the plug hold test.',
      otherwise: { to: 'vent', because: 'all is ready' },
    },
    {
      id: 'vent',
      number: '2',
      kind: 'action',
      title: 'Vent shut',
      action: 'Shut the vent of the regulator.',
      disturbs: [{ item: 'vent', label: 'vent', restore: 'Open the vent of the regulator.' }],
      otherwise: { to: 'press', because: 'the vent is shut' },
    },
    {
      id: 'press',
      number: '3',
      kind: 'reading',
      title: 'Plug pressure',
      action: 'Read what the gauge comes to rest at.',
      picture: { sheet: 'air-path', marks: ['plug', 'supply'] },
      reads: [
        {
          name: 'plugPressure',
          label: 'Pressure at the plug',
          unit: 'kPa',
          sense: 'gauge',
          gear: 'gauge',
          plausible: { low: 0, high: 60 },
        },
      ],
      next: [
        { when: 'plugPressure < least', to: 'back', because: '{plugPressure} is below {least}', verdict: 'plugLeaks' },
      ],
      otherwise: { to: 'back', because: '{plugPressure} is held', verdict: 'plugHolds' },
      cannotMeasure: { to: 'back', because: 'the gauge shows nothing', verdict: 'plugUnfinished' },
    },
    {
      id: 'back',
      number: '4',
      kind: 'restore',
      title: 'Vent open again',
      action: 'Put back what was disturbed for the plug.',
      otherwise: { to: 'verdict', because: 'the vent is open again' },
    },
    finding({
      id: 'plugHolds',
      number: '5',
      title: 'The plug holds',
      result: 'in',
      verdict: 'The plug holds {plugPressure}.',
    }),
    finding({
      id: 'plugLeaks',
      number: '6',
      title: 'The plug leaks',
      result: 'out',
      verdict: 'The plug leaks: it stood at {plugPressure}.',
    }),
    finding(
      {
        id: 'plugUnfinished',
        number: '7',
        title: 'Plug not tested',
        result: 'not-judged',
        verdict: 'The plug was not tested.',
      },
      { cause: [] },
    ),
  ],
};
