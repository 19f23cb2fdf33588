import { applyEvent, type RunState } from '../../procedures/engine';
import { placed, reduceEvent } from '../../procedures/engine/apply-event';
import { brokenLink } from '../../procedures/engine/chain';
import { problemWithShape } from '../../procedures/engine/event-shape';
import { changingInPlace } from '../../procedures/engine/state-changes';
import { atLeast, atMost, type Report } from './budget';
import { generalMachine, walkGeneralMachine } from './general-machine';
import { longRun, type LongRun } from './long-run';
import { measure, timing } from './measure';

/** Steps of the procedure; events of a long run in it, and of one ten times as long. */
const readings = 300;
const fewEvents = 2_000;
const manyEvents = 10 * fewEvents;

/** What `replay` does after the run was opened, but that no hash is computed: the links' hashes are taken as right. */
function replayed({ procedure, events }: LongRun, opened: RunState, count: number): RunState {
  return changingInPlace(() => {
    let state = opened;
    for (let index = 1; index < count; index += 1) {
      const event = events[index]!;
      const odd = problemWithShape(event);
      if (odd !== undefined || event.seq !== state.seq + 1 || event.prev !== state.head) throw new Error(odd);
      state = placed(state, reduceEvent(procedure, state, event), event);
    }
    return state;
  });
}

function checkedLinks({ header, events }: LongRun, count: number): number {
  let broken = 0;
  for (let index = 1; index < count; index += 1) {
    const event = events[index]!;
    if (brokenLink(header, event, index + 1, events[index - 1]!.hash) !== undefined) broken += 1;
  }
  return broken;
}

/** Replay, hashes apart: how it grows, and beside a general state-machine library doing the same moves. */
export function benchReplay(): Report {
  const run = longRun(readings, manyEvents);
  const { procedure, header, events } = run;
  const opened = applyEvent(procedure, header, undefined, events[0]!);
  if (!opened.ok) throw new Error(opened.refusal.what);
  const machine = generalMachine(procedure.document);
  const few = events.slice(0, fewEvents);
  const ours = replayed(run, opened.state, fewEvents).current?.id;
  const theirs = JSON.stringify(walkGeneralMachine(machine, few).value);
  if (ours === undefined || !theirs.startsWith(`{"${ours}":`))
    throw new Error(`not the same moves: ${ours}, ${theirs}`);

  const timings = measure([
    { name: 'replay', units: fewEvents, work: () => replayed(run, opened.state, fewEvents) },
    { name: 'replay, 10x the events', units: manyEvents, work: () => replayed(run, opened.state, manyEvents) },
    { name: "general machine's transitions (xstate)", units: fewEvents, work: () => walkGeneralMachine(machine, few) },
    { name: 'hashes', units: 200, work: () => checkedLinks(run, 200) },
  ]);
  const [small, large] = [timing(timings, 'replay'), timing(timings, 'replay, 10x the events')];
  const general = timing(timings, "general machine's transitions (xstate)");
  return {
    timings,
    budgets: [
      atMost('replay: cost of 10x the events', 11, (10 * large.perUnitNs) / small.perUnitNs),
      atLeast("replay: transitions per second against the general machine's", 10, general.perUnitNs / large.perUnitNs),
    ],
  };
}
