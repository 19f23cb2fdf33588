import { inject, InjectionToken } from '@angular/core';
import type { CalledKey, CompiledProcedure, ProcedureDocument } from '../../../procedures/document';
import { fetchPart } from './fetch-part';
import { OfflineStore } from './offline-store';

/** A procedure calls a version that is not on this tablet: no run of it can be opened here before that has come. */
export class CalledVersionMissing extends Error {
  override readonly name = 'CalledVersionMissing';

  constructor(readonly called: CalledKey) {
    super(
      `It calls ${called.procedure}, version ${called.version}, which is not on this tablet yet. ` +
        'It comes with the next sync.',
    );
  }
}

/**
 * Makes a procedure runnable, with the versions that it calls as they are on this tablet. Throws `CalledVersionMissing`,
 * or an `Error` that names the first problem of a document that has one.
 */
export type ProcedureCompiler = (document: ProcedureDocument) => Promise<CompiledProcedure>;

/** The same for whoever says in words what is not here: that is no fault of the run's. */
export async function compiledOrMissing(
  compile: ProcedureCompiler,
  document: ProcedureDocument,
): Promise<CompiledProcedure | CalledVersionMissing> {
  try {
    return await compile(document);
  } catch (error) {
    if (error instanceof CalledVersionMissing) return error;
    throw error;
  }
}

/** The expression library is the heaviest part of the app, so it comes in a chunk of its own. */
export const procedureCompiler = new InjectionToken<ProcedureCompiler>('procedureCompiler', {
  factory: () => {
    const { procedures } = inject(OfflineStore);
    return async (document) => {
      const part = fetchPart(() => import('../../../procedures/document'));
      const { compileProcedure, gatherCalls, libraryOf } = await part;
      const { found, missing } = await gatherCalls(document, ({ procedure, version }) =>
        procedures.get([procedure, version]),
      );
      if (missing !== undefined) throw new CalledVersionMissing(missing);
      const outcome = compileProcedure(document, libraryOf(found));
      if (outcome.ok) return outcome.procedure;
      const first = outcome.problems[0];
      throw new Error(`${first?.where ?? document.id}: ${first?.message ?? 'the procedure cannot be run'}`);
    };
  },
});
