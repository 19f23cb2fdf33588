import { assign, createMachine, initialTransition, transition, type AnyMachineSnapshot } from 'xstate';
import type { ProcedureDocument, Step } from '../../procedures/document';
import type { RunEvent } from '../../procedures/engine';

interface Context {
  /** The newest reading and the one before, in kPa: all that the ways on ask for. */
  readonly value: number;
  readonly before: number;
  readonly claimedSeq: number;
  readonly disturbed: number;
}

/**
 * The same procedure for a general state-machine library (xstate 5): a state for each step, in it one before its claim,
 * one while it is open and one when it is done, with the steps' own ways on. It takes a run's events as they are. It
 * keeps far less than a run does: no texts, uncertainties, judgements, names or list of what was walked.
 */
export function generalMachine({ steps }: ProcedureDocument) {
  return createMachine({
    id: 'run',
    initial: 'start',
    context: { value: 5, before: 5, claimedSeq: 0, disturbed: 0 } satisfies Context,
    types: {} as { context: Context; events: RunEvent },
    states: Object.fromEntries(steps.map((step) => [step.id, stepState(step)])),
    on: Object.fromEntries([['step-redone', { target: '#run.read0.ahead' }]]),
  } as Parameters<typeof createMachine>[0]);
}

function stepState(step: Step): object {
  if (step.kind === 'finding') return {};
  const ways = (step.next ?? []).map(({ to }, index) => ({ target: ahead(to), guard: index === 0 ? isClose : isOut }));
  const record = assign(({ context, event }: Told<'reading-recorded'>) => ({
    value: Number(event.data.figure.text),
    before: context.value,
  }));
  const claim = assign(({ event }: Told<'step-claimed'>) => ({ claimedSeq: event.seq }));
  const disturb = assign(({ context }: Told<'disturbed'>) => ({ disturbed: context.disturbed + 1 }));
  return {
    initial: 'ahead',
    states: {
      ahead: { on: { 'step-claimed': { target: 'open', actions: claim } } },
      open: {
        on: {
          'reading-recorded': { actions: record },
          disturbed: { actions: disturb },
          'step-done': { target: 'done' },
        },
      },
      done: { on: { 'branch-taken': [...ways, { target: ahead(step.otherwise.to) }] } },
    },
  };
}

interface Told<T extends RunEvent['type']> {
  readonly context: Context;
  readonly event: Extract<RunEvent, { readonly type: T }>;
}

const ahead = (step: string): string => (step === 'verdict' ? '#run.notCompleted' : `#run.${step}.ahead`);

/** The band is the reading before, 5 kPa to each side; the gauge's uncertainty is a third of a kPa. */
const isClose = ({ context: { value, before } }: { context: Context }): boolean =>
  Math.abs(Math.abs(value - before) - 5) < 0.3;
const isOut = ({ context: { value, before } }: { context: Context }): boolean =>
  Math.abs(value - before) > 5 && before > 2;

/** Where the events lead. */
export function walkGeneralMachine(
  machine: ReturnType<typeof generalMachine>,
  events: readonly RunEvent[],
): AnyMachineSnapshot {
  let [snapshot] = initialTransition(machine);
  for (const event of events) [snapshot] = transition(machine, snapshot, event);
  return snapshot;
}
