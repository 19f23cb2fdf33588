import type { ProcedureDocument } from '../document';
import crankcaseValveSealJson from './crankcase-valve-seal.json';

/*
 * The compiler reads JSON with its literals widened (`kind: string`), so the type is stated here; the specs beside
 * each document hold it against the schema, the compiler and the lint.
 */

/** Crankcase valve seal under regulated pressure, one half (cold or warm) a run. */
export const crankcaseValveSeal = crankcaseValveSealJson as unknown as ProcedureDocument;

/** The procedures that come with the product, in the order in which they are listed. */
export const library: readonly ProcedureDocument[] = [crankcaseValveSeal];
