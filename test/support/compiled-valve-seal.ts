import { compileProcedure, type CompiledProcedure } from '../../procedures/document';
import { crankcaseValveSeal } from '../../procedures/library';

/** The library's first procedure, ready to be walked. Throws what is wrong with it. */
export function compiledValveSeal(): CompiledProcedure {
  const compiled = compileProcedure(crankcaseValveSeal);
  if (!compiled.ok) throw new Error(compiled.problems.map(({ where, message }) => `${where}: ${message}`).join('\n'));
  return compiled.procedure;
}
