import type { CompiledProcedure } from '../document';
import { reduceEvent } from './apply-event';
import type { EventDraft, RunEvent } from './run-event';
import type { RunState } from './run-state';

/** Carries the words for a person out of a decision; it never leaves this folder. */
export class CannotDo extends Error {
  constructor(
    readonly code: string,
    message: string,
    readonly field?: string,
    /** The step that has to be taken again first. */
    readonly takeAgain?: string,
  ) {
    super(message);
    this.name = 'CannotDo';
  }
}

/**
 * Collects a decision's events while keeping the state that they lead to, so that each one is decided on what the
 * ones before it made true. The place in the chain is the shell's to give: hashes and ids are blank here.
 */
export class Drafting {
  readonly drafts: EventDraft[] = [];

  constructor(
    readonly procedure: CompiledProcedure,
    private current: RunState,
    /** The device's clock; without one time stands still at the last event. */
    private readonly at: number = current.lastAt,
  ) {}

  get state(): RunState {
    return this.current;
  }

  add(draft: EventDraft): void {
    const seq = this.current.seq + 1;
    const { header, openedBy } = this.current;
    const place = {
      runId: header.runId,
      seq,
      id: '',
      at: this.at,
      elapsed: 0,
      actor: openedBy,
      device: '',
      build: '',
      prev: '',
      hash: '',
    };
    const event = { ...place, schema: 1, ...draft } as RunEvent;
    this.current = { ...reduceEvent(this.procedure, this.current, event), seq };
    this.drafts.push(draft);
  }
}
