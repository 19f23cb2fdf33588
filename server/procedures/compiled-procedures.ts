import { compileProcedure, type CompiledProcedure, type ProcedureDocument } from '../../procedures/document';

/** Parsing all expressions of a procedure costs far more than a replay: a version, which never changes, is kept compiled. */
export class CompiledProcedures {
  private readonly byHash = new Map<string, CompiledProcedure>();

  constructor(private readonly capacity = 200) {}

  /** The compiled form of a published document. Throws `RangeError` when this build can no longer compile it. */
  of(contentHash: string, document: () => ProcedureDocument): CompiledProcedure {
    const known = this.byHash.get(contentHash);
    if (known !== undefined) return known;
    const compiled = compileProcedure(document());
    if (!compiled.ok) throw new RangeError(`The published document ${contentHash} does not compile any more.`);
    if (this.byHash.size >= this.capacity) this.forgetOldest();
    this.byHash.set(contentHash, compiled.procedure);
    return compiled.procedure;
  }

  private forgetOldest(): void {
    const [oldest] = this.byHash.keys();
    if (oldest !== undefined) this.byHash.delete(oldest);
  }
}
