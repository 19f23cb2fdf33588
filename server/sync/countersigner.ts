import type { EntityManager } from 'typeorm';
import type { Countersigned, ServerKeys } from './server-keys';
import type { CountersignatureDto } from './sync.dto';
import { Countersignature } from './sync.entity';

/** The server's word, with its own clock, on how far it holds a branch. */
export class Countersigner {
  constructor(
    private readonly keys: ServerKeys,
    private readonly clock: () => Date,
  ) {}

  async sign(manager: EntityManager, head: Omit<Countersigned, 'at'>): Promise<void> {
    const at = this.clock().getTime();
    const { keyId, signature } = await this.keys.sign(manager, { ...head, at });
    await manager.insert(Countersignature, { ...head, at: String(at), signature, keyId });
  }

  /** The word on the branch's head; undefined when there is none. */
  async latest(manager: EntityManager, runId: string, branch: string): Promise<CountersignatureDto | undefined> {
    const found = await manager.findOne(Countersignature, { where: { runId, branch }, order: { seq: 'DESC' } });
    return found === null ? undefined : countersignatureOnTheWire(found);
  }
}

export function countersignatureOnTheWire(row: Countersignature): CountersignatureDto {
  const { branch, seq, head, at, signature, keyId } = row;
  return { branch, seq, head, at: Number(at), signature, key: keyId };
}
