import { createPublicKey, type KeyObject, verify } from 'node:crypto';
import type { DataSource } from 'typeorm';
import { v7 as uuidv7 } from 'uuid';
import { Invalid } from '../http/problem';
import { Tablet } from './access.entity';

/** The enrolled tablets and what they sign. */
export class Tablets {
  constructor(
    private readonly database: DataSource,
    private readonly clock: () => Date,
  ) {}

  /** Enrols a tablet. Throws `Invalid` for a key that is no point of the curve. */
  async enrol(given: { label: string; publicKey: Tablet['publicKey'] }, enrolledBy: string): Promise<Tablet> {
    const { kty, crv, x, y } = given.publicKey;
    const publicKey = { kty, crv, x, y };
    if (keyOf(publicKey) === undefined) {
      const errors = [{ pointer: '/publicKey', detail: 'This is no public key on the curve P-256.' }];
      throw new Invalid('The key is not valid.', errors);
    }
    const tablet = { id: uuidv7(), label: given.label, publicKey, enrolledBy, enrolledAt: this.clock() };
    await this.database.getRepository(Tablet).insert(tablet);
    return this.database.getRepository(Tablet).create(tablet);
  }

  /** Whether these bytes were signed (ECDSA, SHA-256, IEEE P1363, base64url) by the tablet; undefined: no such tablet. */
  async isSignedBy(tabletId: string, bytes: Buffer, signature: string): Promise<boolean | undefined> {
    const tablet = await this.database.getRepository(Tablet).findOneBy({ id: tabletId });
    if (tablet === null) return undefined;
    const key = keyOf(tablet.publicKey);
    const given = Buffer.from(signature, 'base64url');
    return (
      key !== undefined && given.length === 64 && verify('sha256', bytes, { key, dsaEncoding: 'ieee-p1363' }, given)
    );
  }
}

function keyOf(jwk: Tablet['publicKey']): KeyObject | undefined {
  try {
    return createPublicKey({ key: jwk, format: 'jwk' });
  } catch {
    // Node and OpenSSL refuse, under several codes, what is no point of the curve; nothing else is done here.
    return undefined;
  }
}
