import { createHash } from 'node:crypto';
import type { DataSource } from 'typeorm';
import { Invalid, NotFound } from '../http/problem';
import { Attachment } from './attachments.entity';

/** Evidence as bytes, named by their hash: the same bytes again change nothing. */
export class AttachmentsService {
  constructor(
    private readonly database: DataSource,
    private readonly clock: () => Date,
  ) {}

  /** Whether the bytes are new. Throws `Invalid` when they are not what the address says. */
  async keep(sha256: string, bytes: Buffer): Promise<boolean> {
    if (createHash('sha256').update(bytes).digest('hex') !== sha256) {
      throw new Invalid('The bytes are not those that the address names: their SHA-256 is another.', []);
    }
    const kept: unknown[] = await this.database.query(
      'INSERT INTO attachment (sha256, bytes, received_at) VALUES ($1, $2, $3) ON CONFLICT DO NOTHING RETURNING sha256',
      [sha256, bytes, this.clock()],
    );
    return kept.length > 0;
  }

  /** Throws `NotFound`. */
  async bytes(sha256: string): Promise<Buffer> {
    const found = await this.database.getRepository(Attachment).findOneBy({ sha256 });
    if (found === null) throw new NotFound('There are no such bytes here.');
    return found.bytes;
  }
}
