import type { RunState } from './run-state';

/** Why an event cannot be part of the run: structure, never a value. */
export interface Refusal {
  /** The event's place in the sequence, from 1: where it stands, whatever number it carries. */
  readonly seq: number;
  /** Its own id, where it has one that can be read. */
  readonly id?: string;
  readonly code:
    | 'chain'
    | 'not-opened'
    | 'opened-twice'
    | 'other-procedure'
    | 'unknown-step'
    | 'unknown-name'
    | 'unknown-exit'
    | 'not-current'
    | 'not-due'
    | 'alarm'
    | 'not-open'
    | 'not-done'
    | 'not-allowed'
    | 'still-disturbed'
    | 'malformed';
  /** The reason in words: a clause without a full stop. */
  readonly what: string;
}

export type ReplayResult =
  { readonly ok: true; readonly state: RunState } | { readonly ok: false; readonly refusal: Refusal };

/** Carries a refusal out of the fold; it never leaves this folder. */
export class RefusedEvent extends Error {
  constructor(
    readonly code: Refusal['code'],
    message: string,
  ) {
    super(message);
    this.name = 'RefusedEvent';
  }
}
