import fc from 'fast-check';
import { lintProcedure } from '../lint';
import type { Exit, ProcedureDocument, Step } from '../procedure-document';
import { everyKind } from '../testing/every-kind';
import { everyKindFindings } from '../testing/every-kind-findings';

/*
 * The ways that the lint shows, against an exhaustive search through small documents made at random: every walk of so
 * many steps with so many stops, shortest first. The one condition may hold or fail everywhere, so that each branch is
 * open.
 */
const findings = ['seals', 'doesNotSeal', 'notCompleted'];
const inner = ['a', 'b', 'c', 'd', 'e'];

const target = fc.constantFrom(...inner, ...findings, 'verdict');
const exit: fc.Arbitrary<Exit> = fc
  .record({ to: target, verdict: fc.option(fc.constantFrom(...findings), { nil: undefined, freq: 2 }) })
  .map(({ to, verdict }) => exitTo(to, 'so it is', verdict));
function exitTo(to: string, because: string, verdict: string | undefined): Exit {
  return { to, because, ...(verdict === undefined ? {} : { verdict }) };
}
const action = (id: string): fc.Arbitrary<Step> =>
  fc.record({ otherwise: exit, exits: fc.array(exit, { maxLength: 2 }) }).map(({ otherwise, exits }) => ({
    ...{ id, number: id, kind: 'action', title: 'Do it', action: 'Do it.', otherwise },
    next: exits.map((one) => ({ ...one, when: 'measured(elevation)' })),
  }));
const documents: fc.Arbitrary<ProcedureDocument> = fc
  .record({
    steps: fc.tuple(...inner.map(action)),
    stop: fc.constantFrom(...inner),
    stopVerdict: fc.option(fc.constantFrom(...findings), { nil: undefined }),
    first: fc.constantFrom(...inner),
  })
  .map(({ steps, stop, stopVerdict, first }) => ({
    ...everyKind,
    pair: false,
    limits: [],
    stop: { ...everyKind.stop, exit: exitTo(stop, 'it was stopped', stopVerdict) },
    steps: [
      {
        ...{ id: 'start', number: '1', kind: 'start', title: 'Start', action: 'Get ready.' },
        otherwise: { to: 'choose', because: 'all is ready' },
      },
      {
        ...{ id: 'choose', number: '2', kind: 'choice', title: 'Choose', action: 'Say what is so.' },
        ...{ name: 'chosen', options: [{ name: 'yes', label: 'Yes' }] },
        otherwise: { to: first, because: 'it was said' },
        cannotMeasure: { to: first, because: 'nobody knows' },
      },
      ...steps,
      ...everyKindFindings.filter(({ id }) => findings.includes(id)),
    ] as readonly Step[],
  }));

interface State {
  readonly step: string;
  readonly verdict: string | undefined;
}

const keyOf = ({ step, verdict }: State): string => `${step} ${verdict}`;

/** Where an exit leads; nowhere, if no finding was named for `verdict`. */
function after({ verdict }: State, { to, verdict: named }: Exit): State | undefined {
  const heading = named ?? verdict;
  const step = to === 'verdict' ? heading : to;
  return step === undefined ? undefined : { step, verdict: heading };
}

function exitsFrom(document: ProcedureDocument, { step: id }: State, isStop: boolean): readonly Exit[] {
  const step = document.steps.find((candidate) => candidate.id === id);
  if (step === undefined || step.kind === 'finding') return [];
  if (isStop) return [document.stop.exit];
  return [...(step.next ?? []), step.otherwise, ...('cannotMeasure' in step ? [step.cannotMeasure] : [])];
}

/** All states at the end of all walks from a set of states, by one exit each. */
function oneOn(document: ProcedureDocument, states: readonly State[], isStop: boolean): readonly State[] {
  const next = states.flatMap((state) => exitsFrom(document, state, isStop).flatMap((way) => after(state, way) ?? []));
  return [...new Map(next.map((state) => [keyOf(state), state])).values()];
}

/** The least number of steps to each finding, of walks with as few stops as it takes. */
function leastSteps(document: ProcedureDocument): ReadonlyMap<string, number> {
  const least = new Map<string, number>();
  const longest = 30;
  // By number of stops, then of steps: where all walks of that kind end.
  let walks: readonly (readonly State[])[] = [[{ step: 'start', verdict: undefined }]];
  for (let stops = 0; stops <= 2; stops += 1) {
    const ends: (readonly State[])[] = [];
    for (let steps = 0; steps < longest; steps += 1) {
      const here = [...(walks[steps] ?? []), ...oneOn(document, ends[steps - 1] ?? [], false)];
      ends.push([...new Map(here.map((state) => [keyOf(state), state])).values()]);
    }
    const isNew = new Set(findings.filter((finding) => !least.has(finding)));
    ends.forEach((states, steps) => {
      for (const { step } of states) if (isNew.has(step) && !least.has(step)) least.set(step, steps + 1);
    });
    walks = [[], ...ends.map((states) => oneOn(document, states, true))];
  }
  return least;
}

/** Whether a run can walk these steps in this order, by its own exits and stops. */
function isWalk(document: ProcedureDocument, [first, ...steps]: readonly string[]): boolean {
  let states: readonly State[] = [{ step: first ?? '', verdict: undefined }];
  for (const step of steps) {
    const next = [...oneOn(document, states, false), ...oneOn(document, states, true)];
    states = next.filter((state) => state.step === step);
  }
  return first === 'start' && states.length > 0;
}

it('are ways, and none is shorter, in 500 random documents', () => {
  let shown = 0;
  let missing = 0;
  fc.assert(
    fc.property(documents, (document) => {
      const { waysToFindings, errors } = lintProcedure(document);
      expect(errors.filter(({ rule }) => rule === 'schema')).toEqual([]);
      const least = leastSteps(document);
      for (const finding of findings) {
        const way = waysToFindings[finding];
        expect([finding, way?.length]).toEqual([finding, least.get(finding)]);
        if (way === undefined) {
          missing += 1;
          continue;
        }
        shown += 1;
        expect([way, way.at(-1), isWalk(document, way)]).toEqual([way, finding, true]);
      }
    }),
    { seed: 77_001, numRuns: 500 },
  );
  expect(shown).toBeGreaterThan(500);
  expect(missing).toBeGreaterThan(20);
});

it('take the early stop where a late one is nearer to the finding in steps of its own', () => {
  const going = (id: string, otherwise: Exit, next: object = {}): Step =>
    ({ id, number: id, kind: 'action', title: 'Do it', action: 'Do it.', otherwise, ...next }) as Step;
  const to = (step: string, verdict?: string): Exit => exitTo(step, 'so it is', verdict);
  const document: ProcedureDocument = {
    ...everyKind,
    pair: false,
    limits: [],
    stop: { ...everyKind.stop, exit: to('s') },
    steps: [
      { ...going('start', to('a')), kind: 'start' } as Step,
      // Round and round, with no finding but by a stop.
      going('a', to('b')),
      going('b', to('c', 'doesNotSeal')),
      going('c', to('a')),
      going('s', to('t'), { next: [{ ...to('u'), when: 'doesNotSeal' }] }),
      going('t', to('t2')),
      going('t2', to('u', 'doesNotSeal')),
      going('u', to('verdict')),
      ...everyKindFindings.filter(({ id }) => id === 'doesNotSeal'),
    ],
  };
  expect(lintProcedure(document).waysToFindings['doesNotSeal']).toEqual(['start', 's', 't', 't2', 'u', 'doesNotSeal']);
});
