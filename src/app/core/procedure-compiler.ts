import { InjectionToken } from '@angular/core';
import type { CompiledProcedure, ProcedureDocument } from '../../../procedures/document';

/** Makes a procedure runnable. Throws an `Error` that names the first problem of a document that has one. */
export type ProcedureCompiler = (document: ProcedureDocument) => Promise<CompiledProcedure>;

/** The expression library is the heaviest part of the app, so it comes in a chunk of its own. */
export const procedureCompiler = new InjectionToken<ProcedureCompiler>('procedureCompiler', {
  factory: () => async (document) => {
    const { compileProcedure } = await import('../../../procedures/document');
    const outcome = compileProcedure(document);
    if (outcome.ok) return outcome.procedure;
    const first = outcome.problems[0];
    throw new Error(`${first?.where ?? document.id}: ${first?.message ?? 'the procedure cannot be run'}`);
  },
});
