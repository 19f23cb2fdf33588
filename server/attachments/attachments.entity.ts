import { Column, Entity, PrimaryColumn } from 'typeorm';

/** Bytes under their own hash, as they were made on the device. Append-only. */
@Entity('attachment')
export class Attachment {
  @PrimaryColumn({ name: 'sha256', type: 'text' })
  declare sha256: string;

  @Column({ name: 'bytes', type: 'bytea' })
  declare bytes: Buffer;

  @Column({ name: 'received_at', type: 'timestamptz' })
  declare receivedAt: Date;
}
