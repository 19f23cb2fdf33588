import { readsOf, type Step } from '../../../procedures/document';
import type { RunCommand } from '../../../procedures/engine';
import { isTimed, No } from './model-rules';
import type { ModelState } from './model-state';
import { ModelWalk } from './model-walk';

const whileWaiting = ['stop', 'note', 'resume', 'leave-stop', 'set-aside', 'acknowledge-limit'];
const beforeCautions = [
  ...whileWaiting,
  'acknowledge-caution',
  'redo',
  'overrule',
  'cannot-measure',
  'not-applicable',
  'verify',
  'restore',
  'close',
];

/**
 * The rules of a run as the procedure document's description has them, read a second time: small, slow, and without a
 * line of the engine. It says of each command whether it can be done, and what the run is then.
 */
export class RunModel extends ModelWalk {
  /** Does it, or says why not and stays as it was. */
  try(command: RunCommand): string | undefined {
    const before = structuredClone(this.state);
    try {
      this.obey(command);
      return undefined;
    } catch (error) {
      if (!(error instanceof No)) throw error;
      this.state = before;
      return error.message;
    }
  }

  protected obey(command: RunCommand): void {
    const { state } = this;
    if (state.status === 'closed') throw new No('closed');
    if (state.hasAlarm && command.do !== 'acknowledge-limit' && command.do !== 'stop') throw new No('alarm');
    if (state.status !== 'open' && !whileWaiting.includes(command.do)) throw new No('waits');
    const step = this.currentStep;
    const needsCautions = command.do === 'restore' || !beforeCautions.includes(command.do);
    if (step !== undefined && needsCautions && (state.current?.seen.length ?? 0) < this.cautions(step)) {
      throw new No('caution first');
    }
    switch (command.do) {
      case 'stop':
        if (state.status === 'stopped') return;
        state.status = 'stopped';
        for (const { item } of step?.disturbs ?? []) {
          if (!state.disturbed.some((open) => open.item === item)) this.takeApart(item, step?.id ?? '');
        }
        return;
      case 'set-aside':
        if (state.status !== 'open') throw new No('waits already');
        state.status = 'set-aside';
        return;
      case 'resume':
        state.status = 'open';
        return;
      case 'leave-stop': {
        if (state.status !== 'stopped') throw new No('not stopped');
        state.status = 'open';
        if (command.how === 'go-back') return;
        const at = this.step(step?.id ?? state.finding ?? '');
        return this.leaveBy(at, { ...this.document.stop.exit, name: 'stop' });
      }
      case 'acknowledge-limit':
        if (!state.hasAlarm) throw new No('no alarm');
        state.hasAlarm = false;
        return;
      case 'redo':
        return this.redo(command.step);
      case 'overrule':
        return this.overrule(command.exit);
      case 'close':
        if (state.finding === undefined || state.disturbed.length > 0) throw new No('not at its end');
        state.status = 'closed';
        return;
      case 'restore':
        if (!state.disturbed.some(({ item }) => item === command.item)) throw new No('not apart');
        state.disturbed = state.disturbed.filter(({ item }) => item !== command.item);
        if (step?.kind === 'restore' && this.dueAt(step).length === 0) this.complete(step);
        return;
      default:
        if (step === undefined) throw new No('no step');
        return this.inStep(step, command);
    }
  }

  protected inStep(step: Step, command: RunCommand): void {
    const current = this.state.current;
    if (current === undefined) throw new No('no step');
    switch (command.do) {
      case 'acknowledge-caution':
        if (command.caution >= this.cautions(step)) throw new No('no such caution');
        if (!current.seen.includes(command.caution)) current.seen.push(command.caution);
        return;
      case 'confirm':
        if (!this.isAnswered(step)) throw new No('not answered');
        return this.complete(step);
      case 'record':
        return this.record(step, command.name, Number(command.text));
      case 'take-back': {
        const takes = current.takes[command.name] ?? [];
        if (takes.length === 0) throw new No('nothing taken');
        takes.pop();
        return this.measure(step, command.name);
      }
      case 'choose': {
        if (step.kind !== 'choice' && step.kind !== 'drive') throw new No('no choice here');
        if (step.kind === 'choice' && command.options.length !== 1) throw new No('choose one');
        const offered = (step.kind === 'choice' ? step.options : step.windows).map(({ name }) => name);
        if (command.options.some((name) => !offered.includes(name))) throw new No('not offered');
        for (const name of offered) this.state.truths[name] = { holds: command.options.includes(name), step: step.id };
        this.state.given[step.name] = step.id;
        return this.completeUnlessWaiting(step);
      }
      case 'record-codes': {
        if (step.kind !== 'codes') throw new No('no codes here');
        const now = command.codes.map(({ code }) => code);
        const before = this.state.codes[step.comparedWith ?? ''] ?? [];
        const isNew = now.some((code) => !before.includes(code));
        if (step.newCodes !== undefined) this.state.truths[step.newCodes] = { holds: isNew, step: step.id };
        this.state.codes[step.name] = now;
        this.state.given[step.name] = step.id;
        return this.completeUnlessWaiting(step);
      }
      case 'attach-photo':
        if (step.kind !== 'photo') throw new No('no photo here');
        this.state.given[step.name] = step.id;
        return;
      case 'start-timer':
        if (!isTimed(step)) throw new No('no clock here');
        if (step.kind === 'hold' && (step.begins ?? []).some(({ name }) => this.readHere(step, name) === undefined)) {
          throw new No('read first');
        }
        current.timer = 'running';
        return;
      case 'end-timer':
        if (step.kind !== 'hold' && step.kind !== 'wait') throw new No('no clock here');
        if (current.timer === 'none') throw new No('no clock runs');
        current.timer = command.certain ? 'over' : 'unsure';
        return this.completeUnlessWaiting(step);
      case 'cannot-measure': {
        const exit = this.exitsOf(step).find(({ name }) => name === 'cannot-measure');
        if (exit === undefined) throw new No('nothing is measured');
        return this.complete(step, exit);
      }
      case 'not-applicable': {
        if (step.kind === 'start' || step.kind === 'restore' || step.kind === 'call') throw new No('applies always');
        return this.complete(
          step,
          this.exitsOf(step).find(({ name }) => name === 'cannot-measure'),
          true,
        );
      }
      case 'import-series':
        if (step.kind !== 'ramp' && step.kind !== 'listen') throw new No('no series here');
        this.seriesOf(step).isKept = true;
        return;
      case 'mark': {
        if (step.kind !== 'listen') throw new No('no marks here');
        const series = this.seriesOf(step);
        if (command.mark === 'noise-begins') series.begins = true;
        else series.stops = true;
        return;
      }
      case 'finish-listening': {
        if (step.kind !== 'ramp' && step.kind !== 'listen') throw new No('no series here');
        if (this.state.series[step.name]?.isKept !== true) throw new No('no series yet');
        const highest = step.finds.find(({ what }) => what === 'highest-gauge')?.name;
        if (highest !== undefined) this.state.values[highest] = { kpa: 7, step: step.id, at: this.state.seconds };
        return this.complete(step);
      }
      case 'release':
        if (step.release === undefined) throw new No('no release point');
        current.isReleased = true;
        return;
      case 'verify':
        if (step.verify === undefined) throw new No('no second look');
        current.isVerified = true;
        return;
      default:
        throw new Error(`the model does not know ${command.do}`);
    }
  }

  protected record(step: Step, name: string, kpa: number): void {
    const { current, values } = this.state;
    const quantity = readsOf(step).find((read) => read.name === name);
    if (quantity === undefined || current === undefined) throw new No('not read here');
    if (step.kind === 'hold') {
      const isEnd = (step.ends ?? []).includes(quantity);
      if (isEnd && current.timer !== 'over') throw new No('too early');
      if (!isEnd && current.timer !== 'none') throw new No('too late');
    }
    const takes = (current.takes[name] ??= []);
    takes.push(kpa);
    this.endStale();
    if (
      this.document.limits.some(
        (limit) => limit.of.includes(name) && kpa > ceilingOf(limit.holds) && this.holdsHere(limit.id),
      )
    ) {
      takes.pop();
      delete values[name];
      this.state.hasAlarm = true;
      return;
    }
    this.measure(step, name);
    if (this.isAnswered(step)) this.completeUnlessWaiting(step);
  }

  /** A reading has its value when it was taken as often as the author asks: the mean of the last ones. */
  protected measure(step: Step, name: string): void {
    const quantity = readsOf(step).find((read) => read.name === name);
    const takes = this.state.current?.takes[name] ?? [];
    const needed = quantity?.takes ?? 1;
    if (quantity === undefined || takes.length < needed) {
      delete this.state.values[name];
      return;
    }
    const last = takes.slice(-needed);
    const kpa = last.reduce((sum, take) => sum + take, 0) / needed;
    const judged = quantity.band === undefined ? {} : { result: resultOf(kpa) };
    this.state.values[name] = { kpa, step: step.id, at: this.state.seconds, ...judged };
  }

  protected seriesOf({ id, name }: Extract<Step, { kind: 'ramp' | 'listen' }>): ModelState['series'][string] {
    return (this.state.series[name] ??= { step: id, isKept: false, begins: false, stops: false });
  }
}

function ceilingOf(holds: string): number {
  return Number(/<= ([\d.]+) kPa/.exec(holds)?.[1]);
}

/**
 * The band of the random procedures is 5.5 to 20.5 kPa. The gauge is good to 0.25 kPa and shows 0.1 kPa: expanded
 * uncertainty 2 sqrt((0.25 / sqrt 3)^2 + (0.05 / sqrt 3)^2) = 0.294 kPa (JCGM 100:2008, 4.3.7 and 6.2). Random readings
 * keep away from that guard's own edges.
 */
function resultOf(kpa: number): 'in' | 'out' | 'too-close' {
  const guard = 0.294;
  if (kpa < 5.5 - guard || kpa > 20.5 + guard) return 'out';
  return kpa > 5.5 + guard && kpa < 20.5 - guard ? 'in' : 'too-close';
}
