import {
  createCipheriv,
  createDecipheriv,
  createPrivateKey,
  createPublicKey,
  generateKeyPairSync,
  hkdfSync,
  type KeyObject,
  randomBytes,
  sign,
  verify,
} from 'node:crypto';
import type { EntityManager } from 'typeorm';
import { v7 as uuidv7 } from 'uuid';
import { canonicalJson, type RunHeader } from '../../procedures/engine';
import { ServerKey } from './sync.entity';

/** What a countersignature is over. */
export interface Countersigned {
  readonly runId: RunHeader['runId'];
  readonly branch: string;
  readonly seq: number;
  readonly head: string;
  /** Server clock, milliseconds since 1970. */
  readonly at: number;
}

/**
 * The keys (Ed25519, RFC 8032) by which the server countersigns. They live in the database, shared by all instances;
 * the private half is sealed by the token secret, so that a copy of the database alone signs nothing. With another
 * secret a new key is made; the old public half goes on verifying.
 */
export class ServerKeys {
  private readonly sealKey: Buffer;
  private current: { readonly id: string; readonly key: KeyObject } | undefined;

  constructor(
    secret: string,
    private readonly clock: () => Date,
  ) {
    this.sealKey = Buffer.from(hkdfSync('sha256', secret, '', 'bayhand server key', 32));
  }

  async sign(manager: EntityManager, content: Countersigned): Promise<{ keyId: string; signature: string }> {
    this.current ??= (await this.find(manager)) ?? (await this.make(manager));
    const signature = sign(null, bytesOf(content), this.current.key).toString('base64url');
    return { keyId: this.current.id, signature };
  }

  private async find(manager: EntityManager) {
    const keys = await manager.find(ServerKey, { order: { madeAt: 'DESC', id: 'DESC' } });
    for (const { id, sealedPrivateKey } of keys) {
      const opened = this.unseal(sealedPrivateKey);
      if (opened !== undefined) return { id, key: createPrivateKey({ key: opened, format: 'der', type: 'pkcs8' }) };
    }
    return undefined;
  }

  private async make(manager: EntityManager) {
    const { publicKey, privateKey } = generateKeyPairSync('ed25519');
    const id = uuidv7();
    await manager.insert(ServerKey, {
      id,
      publicKey: publicKey.export({ format: 'jwk' }) as unknown as ServerKey['publicKey'],
      sealedPrivateKey: this.seal(privateKey.export({ format: 'der', type: 'pkcs8' })),
      madeAt: this.clock(),
    });
    return { id, key: privateKey };
  }

  /** AES-256-GCM: nonce (12 bytes), tag (16 bytes), content. */
  private seal(content: Buffer): string {
    const nonce = randomBytes(12);
    const cipher = createCipheriv('aes-256-gcm', this.sealKey, nonce);
    const sealed = Buffer.concat([cipher.update(content), cipher.final()]);
    return Buffer.concat([nonce, cipher.getAuthTag(), sealed]).toString('base64url');
  }

  private unseal(text: string): Buffer | undefined {
    const bytes = Buffer.from(text, 'base64url');
    const decipher = createDecipheriv('aes-256-gcm', this.sealKey, bytes.subarray(0, 12), { authTagLength: 16 });
    decipher.setAuthTag(bytes.subarray(12, 28));
    try {
      return Buffer.concat([decipher.update(bytes.subarray(28)), decipher.final()]);
    } catch {
      // The tag does not fit (an error without a code): it was sealed under another secret.
      return undefined;
    }
  }
}

/** Whether a countersignature holds. */
export function isCountersigned(publicKey: ServerKey['publicKey'], content: Countersigned, signature: string): boolean {
  const key = createPublicKey({ key: publicKey, format: 'jwk' });
  return verify(null, bytesOf(content), key, Buffer.from(signature, 'base64url'));
}

function bytesOf({ runId, branch, seq, head, at }: Countersigned): Buffer {
  return Buffer.from(canonicalJson({ runId, branch, seq, head, at }), 'utf8');
}
