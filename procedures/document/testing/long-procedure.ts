import type { FindingStep, ProcedureDocument, Step } from '../procedure-document';
import { everyKind } from './every-kind';
import { everyKindFindings } from './every-kind-findings';

/** A sound invented procedure of any length: readings with loops, disturbed parts, and findings named along the way. */
export function longProcedure(readings: number, findings: number): ProcedureDocument {
  const named = (index: number): string => `finding${index % findings}`;
  const steps = Array.from({ length: readings }, (_, index) => readingStep(index, readings, named(index)));
  return {
    ...everyKind,
    id: 'long-procedure',
    pair: false,
    steps: [
      { ...start, otherwise: { to: 'read0', because: 'all is ready' } },
      ...steps,
      {
        id: 'restore',
        number: 'R',
        kind: 'restore',
        title: 'Put everything back',
        action: 'Put back what was disturbed.',
        otherwise: { to: 'verdict', because: 'everything is back' },
      },
      ...Array.from({ length: findings }, (_, index) => findingStep(index)),
      ...everyKindFindings.filter(({ id }) => id === 'notCompleted'),
    ],
    limits: [],
  };
}

const start = { id: 'start', number: '0', kind: 'start', title: 'Start card', action: 'Get ready.' } as const;

function readingStep(index: number, readings: number, verdict: string): Step {
  const name = `pressure${index}`;
  const isLast = index + 1 === readings;
  const before = index === 0 ? 'sealHigh' : `pressure${index - 1}`;
  return {
    id: `read${index}`,
    number: String(index + 1),
    kind: 'reading',
    title: 'Read',
    action: 'Read the gauge.',
    ...(index % 7 === 3
      ? { disturbs: [{ item: `part-${index}`, label: `part ${index}`, restore: 'Put it back.' }] }
      : {}),
    reads: [
      {
        name,
        label: 'Gauge',
        unit: 'kPa',
        sense: 'gauge',
        gear: 'gauge',
        plausible: { low: 0, high: 60 },
        band: { low: `${before} - 5 kPa`, high: `${before} + 5 kPa`, source: 'invented' },
      },
    ],
    next: [
      {
        when: `tooClose(${name})`,
        to: `read${index}`,
        because: 'again',
        atMost: 2,
        thenceforth: { to: 'restore', because: 'enough', verdict },
      },
      {
        when: `outOfBand(${name}) and ${before} > 2 kPa`,
        to: isLast ? 'restore' : `read${index + 1}`,
        because: 'it is off',
        verdict,
      },
    ],
    otherwise: isLast
      ? { to: 'restore', because: 'that was all', verdict }
      : { to: `read${index + 1}`, because: 'it is in band' },
    cannotMeasure: { to: 'restore', because: 'it cannot be measured', verdict: 'notCompleted' },
  };
}

function findingStep(index: number): FindingStep {
  return {
    id: `finding${index}`,
    number: `G${index}`,
    kind: 'finding',
    title: 'Found',
    action: 'It was found.',
    result: 'out',
    verdict: 'It was found.',
    cause: [],
    correction: [],
    customer: [],
  };
}
