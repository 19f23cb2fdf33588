import type { RunState } from './run-state';

/** Why an event cannot be part of the run: structure, never a value. */
export interface Refusal {
  readonly seq: number;
  readonly code:
    | 'chain'
    | 'not-opened'
    | 'opened-twice'
    | 'other-procedure'
    | 'unknown-step'
    | 'unknown-name'
    | 'unknown-exit'
    | 'not-current'
    | 'not-open'
    | 'not-done'
    | 'still-disturbed'
    | 'malformed';
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
