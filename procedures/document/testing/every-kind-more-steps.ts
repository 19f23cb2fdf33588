import type { Step } from '../procedure-document';

const source = 'common practice, no source';

export const everyKindMoreSteps: readonly Step[] = [
  {
    id: 'look',
    number: '14',
    kind: 'photo',
    title: 'Photograph the valve',
    action: 'Photograph the valve.',
    name: 'valvePhoto',
    shows: ['The whole valve, in focus.'],
    otherwise: { to: 'again', because: 'the photo is kept' },
    cannotMeasure: { to: 'again', because: 'it cannot be seen' },
  },
  {
    id: 'again',
    number: '15',
    kind: 'ramp',
    title: 'Raise again',
    action: 'Raise the pressure slowly again.',
    name: 'secondRamp',
    target: 10,
    channels: [
      { name: 'gauge', label: 'Gauge', unit: 'kPa', sense: 'gauge', gear: 'gauge', needed: true },
      { name: 'manifold', label: 'Manifold pressure', unit: 'kPa', sense: 'absolute', needed: true },
    ],
    finds: [
      {
        what: 'manifold-gain',
        name: 'gain',
        label: 'Gain',
        unit: '1',
        band: { low: '0.9', high: '1.1', source },
      },
    ],
    otherwise: { to: 'part', because: 'the ramp is there' },
    cannotMeasure: { to: 'part', because: 'nothing was logged' },
  },
  {
    id: 'part',
    number: '16',
    kind: 'call',
    title: 'Part test',
    action: 'Go through the part test.',
    procedure: 'part-test',
    version: 1,
    takes: [{ from: 'partPressure', name: 'pressureThere', label: 'Pressure there', unit: 'kPa', sense: 'gauge' }],
    finds: [{ finding: 'tight', name: 'itHeld' }],
    next: [{ when: 'itHeld and measured(pressureThere)', to: 'verdict', because: 'it held {pressureThere}' }],
    otherwise: { to: 'verdict', because: 'the part test is done' },
  },
];
