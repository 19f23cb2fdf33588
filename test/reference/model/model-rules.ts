import {
  readsOf,
  resultsOf,
  takenOf,
  type CallBlock,
  type Exit,
  type ProcedureDocument,
  type ReadQuantity,
  type Step,
} from '../../../procedures/document';
import { begunAt, type ModelState, type ModelValue } from './model-state';
import type { Asked } from './random-procedure';

/** Refused: by which rule, in words, for whoever reads a counterexample. */
export class No extends Error {}

export type NamedExit = Exit & { readonly name: string; readonly when?: string; readonly atMost?: number };

/** What can be asked of a modelled run: its step, what is answered, what holds. */
export class ModelRules {
  state: ModelState;

  constructor(
    protected readonly document: ProcedureDocument,
    protected readonly blocks: readonly CallBlock[],
    protected readonly asked: ReadonlyMap<string, Asked>,
  ) {
    this.state = begunAt(document.steps[0]?.id ?? '');
  }

  step(id: string): Step {
    const step = this.document.steps.find((candidate) => candidate.id === id);
    if (step === undefined) throw new Error(`the model knows no step ${id}`);
    return step;
  }

  get currentStep(): Step | undefined {
    return this.state.current === undefined ? undefined : this.step(this.state.current.step);
  }

  wait(seconds: number): void {
    this.state.seconds += seconds;
  }

  /** What a restore step puts back. */
  dueAt(step: Step): ModelState['disturbed'] {
    const block = this.blockOf(step.id);
    return this.state.disturbed.filter((item) => block === undefined || block.steps.has(item.step));
  }

  cautions(step: Step): number {
    return (step.kind === 'start' ? this.document.start.throughout.length : 0) + (step.cautions?.length ?? 0);
  }

  exitsOf(step: Step): readonly NamedExit[] {
    if (step.kind === 'finding') return [];
    const branches = (step.next ?? []).flatMap(({ thenceforth, ...branch }, index): NamedExit[] => [
      { ...branch, name: `next-${index}` },
      ...(thenceforth === undefined ? [] : [{ ...thenceforth, when: branch.when, name: `thenceforth-${index}` }]),
    ]);
    const honest = 'cannotMeasure' in step ? [{ ...step.cannotMeasure, name: 'cannot-measure' }] : [];
    return [...branches, { ...step.otherwise, name: 'otherwise' }, ...honest];
  }

  protected isAnswered(step: Step): boolean {
    const { state } = this;
    switch (step.kind) {
      case 'start':
      case 'action':
      case 'compute':
      case 'call':
        return true;
      case 'restore':
        return this.dueAt(step).length === 0;
      case 'choice':
      case 'drive':
      case 'codes':
      case 'photo':
        return state.given[step.name] === step.id;
      case 'reading':
      case 'wait':
      case 'hold': {
        const isRead = readsOf(step).every(({ name }) => this.readHere(step, name) !== undefined);
        if (!isRead || (isTimed(step) && state.current?.timer !== 'over')) return false;
        return step.kind !== 'wait' || readsOf(step).every(({ name }) => (this.readHere(step, name)?.kpa ?? 99) <= 30);
      }
      default:
        return false;
    }
  }

  protected readHere(step: Step, name: string): ModelValue | undefined {
    const value = this.state.values[name];
    return value?.step === step.id ? value : undefined;
  }

  protected waits(step: Step): boolean {
    const { current } = this.state;
    const isVerified = step.verify === undefined || current?.isVerified === true;
    return !isVerified || (step.release !== undefined && current?.isReleased !== true);
  }

  protected takeApart(item: string, step: string): void {
    this.state.disturbed = [{ item, step }, ...this.state.disturbed.filter((open) => open.item !== item)];
  }

  /** A reading that lasts five minutes is gone after them, with what was computed from it. */
  protected endStale(): void {
    const { values, seconds } = this.state;
    const lasting = new Set(
      this.document.steps
        .flatMap(readsOf)
        .filter((read: ReadQuantity) => read.validity !== undefined)
        .map(({ name }) => name),
    );
    const ended = new Set<string>();
    for (const [name, value] of Object.entries(values)) {
      if (value.stale !== true && lasting.has(name) && seconds - value.at > 300) ended.add(name);
    }
    for (let size = -1; size !== ended.size;) {
      size = ended.size;
      for (const [name, { from, stale }] of Object.entries(values)) {
        if (stale !== true && from !== undefined && this.restsOn(name, ended)) ended.add(name);
      }
    }
    for (const name of ended) values[name] = { ...values[name], stale: true } as ModelValue;
  }

  protected restsOn(name: string, ended: ReadonlySet<string>): boolean {
    const step = this.step(this.state.values[name]?.step ?? '');
    const result = resultsOf(step).find((candidate) => candidate.name === name);
    const taken = takenOf(step).find((candidate) => candidate.name === name);
    return [...(result?.is.split(' - ') ?? []), ...(taken === undefined ? [] : [taken.from])].some((base) =>
      ended.has(base),
    );
  }

  protected question(when: string): Asked {
    const question = this.asked.get(when);
    if (question === undefined) throw new Error(`the model cannot read ${when}`);
    return question;
  }

  protected holds(question: Asked): boolean {
    const value = this.state.values[question.name];
    const kpa = value === undefined || value.stale === true ? Number.NaN : value.kpa;
    switch (question.ask) {
      case 'truth':
        return this.state.truths[question.name]?.holds ?? this.state.heading === question.name;
      case 'out':
        return value?.stale !== true && value?.result === 'out';
      case 'above':
        return kpa > question.kpa;
      case 'below':
        return kpa < question.kpa;
    }
  }

  protected blockOf(id: string): CallBlock | undefined {
    return this.blocks.find(({ steps }) => steps.has(id));
  }

  protected holdsHere(limit: string): boolean {
    const block = this.blocks.find(({ limits }) => limits.has(limit));
    return block === undefined || block.steps.has(this.state.current?.step ?? '');
  }
}

export function isTimed(step: Step): boolean {
  return step.kind === 'hold' || (step.kind === 'wait' && step.atLeastSeconds !== undefined);
}
