import type { Exit, ProcedureDocument, Step } from '../../../procedures/document';

export const because = 'so it is';

/** The way that every stop and every step that cannot be done takes. */
export const stopped: Exit = { to: 'restore', because, verdict: 'notCompleted' };

/** A document around random steps: start card, limit, restoring and three findings. Figures invented. */
export function documentOf(steps: readonly Step[], limited: readonly string[]): ProcedureDocument {
  const first = steps[0]?.id ?? 'restore';
  const finding = (id: string, number: string): Step => ({
    id,
    number,
    kind: 'finding',
    title: id,
    action: 'Read the finding.',
    result: 'in',
    verdict: `It is ${id}.`,
    cause: [{ text: 'Seen.' }],
    correction: [{ text: 'None.' }],
    customer: [{ text: 'Seen.' }],
  });
  return {
    format: 1,
    id: 'random-procedure',
    title: 'Random',
    purpose: 'To be walked.',
    system: 'intake',
    appliesTo: { codes: [], symptoms: ['whistle'], engine: ['petrol engine'] },
    expectedMinutes: 5,
    useLevel: 'every-step',
    gear: [
      {
        role: 'gauge',
        kind: 'pressure-gauge',
        label: 'Test gauge',
        shows: { unit: 'kPa', low: 0, high: 60, resolution: 0.1 },
      },
      { role: 'probe', kind: 'listening-probe', label: 'Probe' },
    ],
    inputs: [
      { name: 'elevation', label: 'Elevation of the site', unit: 'm', from: 'site.elevation', source: 'the site' },
    ],
    pictures: ['air-path'],
    references: [],
    deference: 'The maker comes first.',
    start: {
      prerequisites: ['Engine off.'],
      stopActions: ['Close the supply.'],
      people: 'One.',
      throughout: [{ word: 'warning', text: 'Stored pressure.' }],
    },
    limits: [
      {
        id: 'ceiling',
        holds: 'gauge <= 34.5 kPa',
        of: ['gauge', ...limited.filter((name) => /^[rwhe]\d/.test(name))],
        says: 'More than 34.5 kPa.',
        then: 'Close the supply.',
      },
    ],
    stop: { makeSafe: ['Close the supply.'], exit: stopped },
    steps: [
      {
        id: 'start',
        number: '1',
        kind: 'start',
        title: 'Start',
        action: 'Get ready.',
        otherwise: { to: first, because, verdict: 'first' },
      },
      ...steps,
      {
        id: 'restore',
        number: '90',
        kind: 'restore',
        title: 'Restore',
        action: 'Put it back.',
        otherwise: { to: 'verdict', because },
      },
      finding('first', '91'),
      finding('second', '92'),
      finding('notCompleted', '93'),
    ],
  };
}
