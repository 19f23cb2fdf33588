import { CannotDo, type Drafting } from './drafting';
import { takeExit } from './go-on';
import type { RunCommand } from './run-command';
import type { RunEventData } from './run-event';
import { exitsOf } from './ways-on';
import { composeWriteUp, writeUpParts } from './write-up';

type Pause = Extract<RunCommand, { do: 'stop' | 'set-aside' | 'not-sure' }>;

/** Stop, set aside, or call the lead: the place is kept. */
export function pause(drafting: Drafting, command: Pause): void {
  const step = drafting.state.current?.id ?? drafting.state.finding ?? '';
  switch (command.do) {
    case 'stop':
      if (drafting.state.status === 'stopped') return;
      drafting.add({ type: 'stopped', data: { step, reason: command.reason.trim() } });
      return listWhatMayBeApart(drafting);
    case 'set-aside':
      if (drafting.state.status !== 'open') throw new CannotDo('not-open', 'The run is not open.');
      return drafting.add({ type: 'set-aside', data: { reason: command.reason.trim() } });
    case 'not-sure': {
      const question = command.question.trim();
      if (question === '') throw new CannotDo('ask', 'Say in a few words what you are not sure of.', 'question');
      drafting.add({ type: 'lead-called', data: { step, question } });
      return listWhatMayBeApart(drafting);
    }
  }
}

/** The current step's action may be done though nobody confirmed it: what it takes apart goes on the open list. */
function listWhatMayBeApart(drafting: Drafting): void {
  const { current, disturbed } = drafting.state;
  const step = current === undefined || current.isDone ? undefined : drafting.procedure.step(current.id);
  for (const { item, label } of step?.disturbs ?? []) {
    if (disturbed.some((open) => open.item === item)) continue;
    drafting.add({ type: 'disturbed', data: { step: step?.id ?? '', item, label } });
  }
}

/** Back to the step after a pause. */
export function leavePause(drafting: Drafting): void {
  const { status } = drafting.state;
  const from = status === 'open' ? 'reload' : status;
  if (from === 'closed' || from === 'signed') throw new CannotDo('closed', 'The run is closed.');
  drafting.add({ type: 'resumed', data: { from } });
}

/** From the make-safe sheet either back to the step, or to the end as not completed, with all put back. */
export function leaveStop(drafting: Drafting, command: Extract<RunCommand, { do: 'leave-stop' }>): void {
  const { status, pause: stop } = drafting.state;
  if (status !== 'stopped') throw new CannotDo('not-stopped', 'The run is not stopped.');
  const said = (command.reason ?? '').trim();
  if (command.how === 'go-back') {
    return drafting.add({ type: 'resumed', data: { from: 'stopped', ...(said === '' ? {} : { reason: said }) } });
  }
  const reason = said === '' ? (stop?.reason ?? '') : said;
  if (reason === '') throw new CannotDo('say-why', 'Say in a few words why the test ends here.', 'reason');
  const id = drafting.state.current?.id ?? drafting.state.finding;
  const step = id === undefined ? undefined : drafting.procedure.step(id);
  const exit =
    step === undefined ? undefined : exitsOf(drafting.procedure, step).find((candidate) => candidate.exit === 'stop');
  if (step === undefined || exit === undefined) throw new CannotDo('no-step', 'There is no step to leave.');
  takeExit(drafting, step, exit, reason);
}

/** Takes a step again: what followed from it is left behind, visible. */
export function redo(drafting: Drafting, { step: id, reason }: Extract<RunCommand, { do: 'redo' }>): void {
  const step = drafting.procedure.step(id);
  if (step === undefined || !drafting.state.walked.some((claim) => claim.step === id)) {
    throw new CannotDo('not-walked', 'Only a step that was walked can be taken again.');
  }
  if (step.kind === 'finding') throw new CannotDo('not-walked', 'A finding is reached, not taken again.');
  drafting.add({ type: 'step-redone', data: { step: id, reason: reason.trim() } });
  drafting.add({ type: 'step-claimed', data: { step: id } });
}

/** Takes another authored exit of the step before; both are kept, with the reason. */
export function overrule(drafting: Drafting, { exit: name, reason }: Extract<RunCommand, { do: 'overrule' }>): void {
  const why = reason.trim();
  if (why === '') throw new CannotDo('say-why', 'Say in a few words why another way is right.', 'reason');
  const { walked, current } = drafting.state;
  const before = [...walked].reverse().find((claim) => claim.way !== undefined && claim.isLeft !== true);
  const hasEntries = Object.values(current?.takes ?? {}).some((takes) => takes.length > 0);
  if (before?.way === undefined || hasEntries) {
    throw new CannotDo('too-late', 'Something is recorded after that decision already. Take its step again instead.');
  }
  const step = drafting.procedure.step(before.step);
  const exit =
    step === undefined ? undefined : exitsOf(drafting.procedure, step).find((candidate) => candidate.exit === name);
  if (step === undefined || exit === undefined || exit.exit === 'stop')
    throw new CannotDo('unknown-exit', 'The author gave that step no such way on.');
  if (exit.exit === before.way.exit) throw new CannotDo('same-way', 'That is the way that was taken.');
  drafting.add({
    type: 'branch-overruled',
    data: { step: step.id, computed: before.way.exit, chosen: exit.exit, reason: why },
  });
  takeExit(drafting, step, exit);
}

/** Keeps the write-up, telling what was composed from what was edited. */
export function keepWriteUp(drafting: Drafting, command: Extract<RunCommand, { do: 'keep-write-up' }>): void {
  if (drafting.state.finding === undefined)
    throw new CannotDo('no-finding', 'The write-up follows from the finding, which is not reached yet.');
  const composed = composeWriteUp(drafting.procedure, drafting.state);
  const kept = {
    concern: command.concern.trim(),
    cause: command.cause.trim(),
    correction: command.correction.trim(),
    customer: command.customer.trim(),
  };
  const empty = writeUpParts.find((part) => kept[part] === '');
  if (empty !== undefined) throw new CannotDo('empty', `Say something under ${empty}.`, empty);
  const edited: RunEventData['write-up-written']['edited'] = writeUpParts.filter(
    (part) => kept[part] !== composed[part].text,
  );
  drafting.add({ type: 'write-up-written', data: { ...kept, edited } });
}

/** Ends the run: only with a finding, and with nothing disturbed. A write-up that nobody kept is kept as composed. */
export function close(drafting: Drafting): void {
  const { finding, disturbed } = drafting.state;
  if (finding === undefined)
    throw new CannotDo('no-finding', 'The run has no finding yet: go on, or stop it as not completed.');
  if (disturbed.length > 0) {
    throw new CannotDo(
      'still-disturbed',
      `Not yet: still to be put back: ${disturbed.map(({ label }) => label).join(', ')}.`,
    );
  }
  if (drafting.state.writeUp === undefined) {
    const { concern, cause, correction, customer } = composeWriteUp(drafting.procedure, drafting.state);
    drafting.add({
      type: 'write-up-written',
      data: {
        concern: concern.text,
        cause: cause.text,
        correction: correction.text,
        customer: customer.text,
        edited: [],
      },
    });
  }
  drafting.add({ type: 'closed', data: { finding } });
}
