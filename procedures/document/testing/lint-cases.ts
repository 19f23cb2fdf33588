import { lintProcedure, type LintOptions, type LintReport } from '../lint';
import type { LintRule } from '../lint/lint-finding';
import type { ProcedureDocument } from '../procedure-document';
import type { Part } from './changed-document';
import { everyKind } from './every-kind';

type Change = readonly [path: string, change: (part: Part) => void];

/** A document that is broken in one place, and what is said of it. */
export interface RefusedCase {
  readonly what: string;
  readonly rule: LintRule;
  readonly message: RegExp;
  readonly changes: readonly Change[];
}

/** A document that comes near to a rule and keeps it. */
export interface PassingCase {
  readonly what: string;
  readonly changes: readonly Change[];
}

/** The path of a step of `everyKind`. */
export function place(id: string): string {
  return `steps/${everyKind.steps.findIndex((step) => step.id === id)}`;
}

export function errorsOf(document: ProcedureDocument, options?: LintOptions): LintReport['errors'] {
  return lintProcedure(document, options).errors;
}

/** A step for a spec's own ways. */
export function action(id: string, to: string, more: object = {}): object {
  const otherwise = { to, because: 'it is done' };
  return { id, number: id, kind: 'action', title: 'Do it', action: 'Do it.', otherwise, ...more };
}

/** Puts steps behind the start card. */
export function insert(...steps: readonly object[]): (list: Part) => void {
  return (list) => {
    (list as unknown as object[]).splice(1, 0, ...steps);
  };
}
