/** Sets of names as bits of one whole number: a document has many places, and each has a set. */
export class NameBits {
  private readonly places = new Map<string, bigint>();

  constructor(names: Iterable<string>) {
    for (const name of names) if (!this.places.has(name)) this.places.set(name, 1n << BigInt(this.places.size));
  }

  /** The set of the names; one that was not there at the beginning is in no set. */
  of(names: readonly string[]): bigint {
    return names.reduce((set, name) => set | (this.places.get(name) ?? 0n), 0n);
  }

  has(set: bigint, name: string): boolean {
    return (set & (this.places.get(name) ?? 0n)) !== 0n;
  }
}
