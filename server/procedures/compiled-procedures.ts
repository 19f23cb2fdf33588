import {
  compileProcedure,
  type CompiledProcedure,
  type ProcedureDocument,
  type ProcedureLibrary,
} from '../../procedures/document';

/** Parsing all expressions of a procedure costs far more than a replay: a version, which never changes, is kept compiled. */
export class CompiledProcedures {
  private readonly byHash = new Map<string, CompiledProcedure>();

  constructor(private readonly capacity = 200) {}

  /** The compiled form of a published document; undefined while it is not kept. */
  known(contentHash: string): CompiledProcedure | undefined {
    return this.byHash.get(contentHash);
  }

  /**
   * Compiles a published document with the versions that it calls, and keeps it. Throws `RangeError` when this build can
   * no longer compile it, or a called version is not here.
   */
  keep(contentHash: string, document: ProcedureDocument, library: ProcedureLibrary): CompiledProcedure {
    const compiled = compileProcedure(document, library);
    if (!compiled.ok) {
      const why = compiled.problems[0]?.message ?? '';
      throw new RangeError(`The published document ${contentHash} does not compile any more: ${why}`);
    }
    if (this.byHash.size >= this.capacity) this.forgetOldest();
    this.byHash.set(contentHash, compiled.procedure);
    return compiled.procedure;
  }

  private forgetOldest(): void {
    const [oldest] = this.byHash.keys();
    if (oldest !== undefined) this.byHash.delete(oldest);
  }
}
