import { resultsOf, takenOf, type Step } from '../../../procedures/document';
import { ModelRules, No, type NamedExit } from './model-rules';
import type { ModelValue } from './model-state';

/** How a modelled run goes from step to step, and back. */
export class ModelWalk extends ModelRules {
  protected completeUnlessWaiting(step: Step): void {
    if (!this.waits(step) && this.isAnswered(step)) this.complete(step);
  }

  protected complete(step: Step, forced?: NamedExit, isPassedBy = false): void {
    const { state } = this;
    if (!isPassedBy) for (const { item } of step.disturbs ?? []) this.takeApart(item, step.id);
    if (this.waits(step)) throw new No('waits for somebody');
    this.endStale();
    this.giveResults(step);
    if (forced !== undefined) return this.leaveBy(step, forced);
    const next = step.kind === 'finding' ? [] : (step.next ?? []);
    const conditions = next.map(({ when }) => this.question(when).name);
    const bases = [...resultsOf(step).flatMap(({ is }) => is.split(' - ')), ...takenOf(step).map(({ from }) => from)];
    if ([...conditions, ...bases].some((name) => state.values[name]?.stale === true)) throw new No('stale');
    const exit = this.exitsOf(step).find(({ name, when, atMost }) => {
      if (name === 'otherwise') return true;
      if (when === undefined || !this.holds(this.question(when))) return false;
      return atMost === undefined || (state.counts[`${step.id}/${name}`] ?? 0) < atMost;
    });
    if (exit === undefined) throw new Error(`no way on from ${step.id}`);
    this.leaveBy(step, exit);
  }

  /** What a step gives when it is done: noises, results, and what a call brings back. */
  protected giveResults(step: Step): void {
    const { values, truths, series, seconds } = this.state;
    const fresh = (name: string): ModelValue | undefined => (values[name]?.stale === true ? undefined : values[name]);
    if (step.kind === 'listen') {
      const { begins = false, stops = false } = series[step.name] ?? {};
      for (const { what, name } of step.finds) {
        if (what === 'noise-heard') truths[name] = { holds: begins || stops, step: step.id };
        if (what === 'noise-stopped') truths[name] = { holds: stops, step: step.id };
      }
    }
    if (step.kind === 'call') {
      for (const { name, finding } of step.finds)
        truths[name] = { holds: this.state.heading === finding, step: step.id };
    }
    for (const { name, from } of takenOf(step)) {
      const there = values[from];
      if (there === undefined) continue;
      const { result: _judgedThere, ...value } = there;
      values[name] = { ...value, step: step.id, from };
    }
    for (const { name, is } of resultsOf(step)) {
      const [first = '', second] = is.split(' - ');
      const [a, b] = [fresh(first), second === undefined ? undefined : fresh(second)];
      if (a === undefined || (second !== undefined && b === undefined)) continue;
      values[name] = { kpa: a.kpa - (b?.kpa ?? 0), step: step.id, at: seconds, from: first };
    }
  }

  protected leaveBy(step: Step, exit: NamedExit): void {
    const { state } = this;
    const key = `${step.id}/${exit.name}`;
    if (exit.atMost !== undefined && (state.counts[key] ?? 0) >= exit.atMost) throw new No('bound');
    const before = step.kind === 'call' ? this.headingBefore(step.id) : state.heading;
    const named = exit.verdict ?? before;
    const to = exit.to === 'verdict' ? named : exit.to;
    if (to === undefined) throw new No('no finding to go to');
    const inner = this.step(to).kind === 'finding' ? this.blockOf(to) : undefined;
    state.heading = inner === undefined ? named : to;
    state.finding = undefined;
    if (step.kind === 'call') {
      const called = this.blocks.find(({ call }) => call === step.id);
      for (const counted of Object.keys(state.counts)) {
        if (called?.steps.has(counted.split('/')[0] ?? '') === true) delete state.counts[counted];
      }
    }
    if (exit.name.startsWith('next-')) state.counts[key] = (state.counts[key] ?? 0) + 1;
    const last = state.walked.pop();
    if (last !== undefined) state.walked.push({ ...last, way: exit.name });
    this.claim(inner?.call ?? to);
  }

  protected headingBefore(call: string): string | undefined {
    const block = this.blocks.find((candidate) => candidate.call === call);
    return [...this.state.walked].reverse().find(({ step }) => step === block?.first)?.before;
  }

  protected claim(id: string): void {
    const { state } = this;
    state.walked.push({ step: id, before: state.heading });
    if (this.step(id).kind === 'finding') {
      state.finding = id;
      state.current = undefined;
      return;
    }
    state.current = { step: id, seen: [], takes: {}, timer: 'none', isReleased: false, isVerified: false };
    drop(state.values, (value) => value.step === id);
    drop(state.truths, (truth) => truth.step === id);
    drop(state.given, (step) => step === id);
    drop(state.series, (series) => series.step === id);
    this.endStale();
  }

  protected redo(id: string): void {
    const { state } = this;
    const earlier = [...state.walked].reverse().find(({ step }) => step === id);
    if (earlier === undefined || this.step(id).kind === 'finding') throw new No('never walked');
    const last = state.walked.pop();
    if (last !== undefined) state.walked.push(state.current === undefined ? last : { ...last, isLeft: true });
    state.heading = earlier.before;
    state.finding = undefined;
    this.claim(id);
  }

  protected overrule(name: string): void {
    const { state } = this;
    const at = state.walked.findLastIndex(({ way, isLeft }) => way !== undefined && isLeft !== true);
    const before = state.walked[at];
    const hasEntries = Object.values(state.current?.takes ?? {}).some((takes) => takes.length > 0);
    if (before === undefined || hasEntries) throw new No('too late');
    const step = this.step(before.step);
    const exit = this.exitsOf(step).find((candidate) => candidate.name === name);
    if (exit === undefined || name === before.way) throw new No('no such other way');
    state.walked = state.walked.map((claim, index) => (index > at ? { ...claim, isLeft: true } : claim));
    state.walked.push(before);
    state.heading = before.before;
    this.leaveBy(step, exit);
  }
}

function drop<T>(record: Record<string, T>, isGone: (entry: T) => boolean): void {
  for (const [name, entry] of Object.entries(record)) if (isGone(entry)) delete record[name];
}
