import fc from 'fast-check';
import {
  compileProcedure,
  type CallBlock,
  type CompiledProcedure,
  type ProcedureLibrary,
} from '../../../procedures/document';
import { expandCalls } from '../../../procedures/document/call/expand-calls';
import { partTest } from '../../../procedures/document/testing/part-test';
import { validateDocument } from '../../../procedures/document/validate-document';
import { replay, verifyChain, type InstrumentSnapshot, type RunCommand } from '../../../procedures/engine';
import { RunWalk } from '../../../procedures/engine/testing/run-walk';
import { acts, commandOf, type Act } from './acts';
import { randomProcedure, type RandomProcedure } from './random-procedure';
import { RunModel } from './run-model';

const library: ProcedureLibrary = (id, version) => (id === partTest.id && version === 1 ? partTest : undefined);
const gauge: InstrumentSnapshot = {
  id: 'g-12',
  kind: 'pressure-gauge',
  label: 'G-12',
  dueOn: '2027-03-01',
  shows: [{ unit: 'kPa', sense: 'gauge', low: 0, high: 60, resolution: 0.1, accuracy: 0.25 }],
};
const probe: InstrumentSnapshot = { id: 'l-2', kind: 'listening-probe', label: 'L-2', dueOn: '2027-03-01', shows: [] };

function compiled({ document }: RandomProcedure): CompiledProcedure {
  const compilation = compileProcedure(document, library);
  if (!compilation.ok) throw new Error(JSON.stringify(compilation.problems));
  return compilation.procedure;
}

function blocksOf({ document }: RandomProcedure): readonly CallBlock[] {
  const expansion = expandCalls(document, library);
  return expansion.ok ? expansion.blocks : [];
}

const figures = { runs: 0, commands: 0, done: 0, refused: 0, events: 0, findings: 0, closed: 0, stale: 0, alarms: 0 };

/** The model's and the engine's run side by side. */
interface Pair {
  readonly walk: RunWalk;
}

class Do implements fc.Command<RunModel, Pair> {
  constructor(
    private readonly act: Act,
    private readonly pick: number,
    private readonly seconds: number,
  ) {}

  /** What a closed run refuses is tried now and then. */
  check({ state }: Readonly<RunModel>): boolean {
    return state.status !== 'closed' || this.pick % 10 === 0;
  }

  /** Right answers come several in a row, so that a run gets somewhere between what goes wrong in it. */
  run(model: RunModel, { walk }: Pair): void {
    model.wait(this.seconds);
    walk.later(this.seconds / 60);
    const times = this.act === 'answer' ? 1 + (this.pick % 7) : 1;
    for (let time = 0; time < times; time += 1) doBoth(model, walk, commandOf(model, this.act, this.pick + 37 * time));
  }

  toString(): string {
    return `${this.act}(${this.pick}, ${this.seconds} s)`;
  }
}

function doBoth(model: RunModel, walk: RunWalk, command: RunCommand): void {
  const refusal = model.try(command);
  const outcome = walk.ask(command);
  expect({ command, refused: refusal !== undefined, words: outcome.ok ? '' : outcome.message }).toEqual({
    command,
    refused: !outcome.ok,
    words: outcome.ok ? '' : (expect.stringMatching(/[a-z]/) as string),
  });
  figures.commands += 1;
  figures[outcome.ok ? 'done' : 'refused'] += 1;
  if (refusal === 'stale') figures.stale += 1;
  if (outcome.ok) walk.do(command);
  expectSame(model, walk);
  expectInvariants(walk);
}

function expectSame(model: RunModel, { state }: RunWalk): void {
  const expected = model.state;
  expect({
    status: state.status,
    alarm: state.alarm !== undefined,
    at: state.current?.id,
    finding: state.finding,
    heading: state.verdict,
    disturbed: state.disturbed.map(({ item }) => item),
    counts: state.branchCounts,
    walked: state.walked.map(({ step, way }) => [step, way?.exit]),
    truths: Object.fromEntries(Object.entries(state.truths).map(([name, { holds }]) => [name, holds])),
    values: Object.fromEntries(
      Object.values(state.values).map(({ name, value, judgement, stale }) => [
        name,
        [(value / 1000).toFixed(3), judgement?.result, stale !== undefined],
      ]),
    ),
  }).toEqual({
    status: expected.status,
    alarm: expected.hasAlarm,
    at: expected.current?.step,
    finding: expected.finding,
    heading: expected.heading,
    disturbed: expected.disturbed.map(({ item }) => item),
    counts: expected.counts,
    walked: expected.walked.map(({ step, way }) => [step, way]),
    truths: Object.fromEntries(Object.entries(expected.truths).map(([name, { holds }]) => [name, holds])),
    values: Object.fromEntries(
      Object.entries(expected.values).map(([name, { kpa, result, stale }]) => [
        name,
        [kpa.toFixed(3), result, stale === true],
      ]),
    ),
  });
}

/** What holds in every state of every run. */
function expectInvariants({ procedure, state, header }: RunWalk): void {
  if (state.current !== undefined) expect(procedure.step(state.current.id)).toBeDefined();
  if (state.status === 'closed') expect([state.disturbed, state.finding]).toEqual([[], expect.any(String)]);
  if (state.finding !== undefined) expect(procedure.blockOf(state.finding)).toBeUndefined();
  expect(state.header).toEqual(header);
  expect(state.discrepancies).toEqual([]);
  for (const [key, count] of Object.entries(state.branchCounts)) {
    const [step = '', exit = ''] = key.split('/');
    const authored = procedure.step(step);
    const bound = authored?.kind === 'finding' ? undefined : authored?.next?.[Number(exit.slice(5))]?.atMost;
    expect(count).toBeLessThanOrEqual(bound ?? Number.POSITIVE_INFINITY);
  }
}

const command = fc
  .tuple(fc.constantFrom(...acts), fc.nat({ max: 999 }), fc.constantFrom(0, 0, 0, 0, 7, 7, 301))
  .map(([act, pick, seconds]) => new Do(act, pick, seconds));

describe('random procedures, walked by random commands', () => {
  it('are valid documents', () => {
    fc.assert(
      fc.property(randomProcedure, ({ document }) => {
        expect(validateDocument(document)).toEqual({ ok: true, document });
        expect(compileProcedure(document, library)).toMatchObject({ ok: true });
      }),
      { seed: 20261201, numRuns: 100 },
    );
  });

  it('do what an independent reading of the rules says, command by command', () => {
    fc.assert(
      fc.property(
        randomProcedure,
        fc.constantFrom<'real' | 'practice'>('real', 'practice'),
        fc.commands([command], { size: 'max', maxCommands: 120 }),
        (random, kind, commands) => {
          const procedure = compiled(random);
          const walk = new RunWalk(procedure, { kind });
          walk.cautions(1);
          for (const { role, kind: needed } of procedure.document.gear) {
            walk.do({ do: 'choose-gear', role, instrument: needed === 'pressure-gauge' ? gauge : probe });
          }
          const model = new RunModel(procedure.document, blocksOf(random), random.asked);
          model.try({ do: 'acknowledge-caution', caution: 0 });
          fc.modelRun(() => ({ model, real: { walk } }), commands);
          expect(verifyChain(walk.header, walk.events)).toMatchObject({ ok: true });
          expect(replay(procedure, walk.header, walk.events)).toEqual({ ok: true, state: walk.state });
          figures.runs += 1;
          figures.events += walk.events.length;
          figures.findings += walk.state.finding === undefined ? 0 : 1;
          figures.closed += walk.state.status === 'closed' ? 1 : 0;
          figures.alarms += walk.events.filter(({ type }) => type === 'limit-exceeded').length;
        },
      ),
      { seed: 20261201, numRuns: 150 },
    );
    expect(figures.done).toBeGreaterThan(4000);
    expect(figures.refused).toBeGreaterThan(1000);
    expect(figures.closed).toBeGreaterThan(10);
    expect(figures.stale).toBeGreaterThan(5);
    expect(figures.alarms).toBeGreaterThan(50);
  }, 120_000);
});
