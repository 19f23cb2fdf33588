import { Check, Column, Entity, PrimaryColumn } from 'typeorm';

/** The kinds of things that tablets pull. */
export type ChangedKind = 'site' | 'gear' | 'person' | 'visit' | 'procedure' | 'run';

/** The one counter of all changes that tablets pull. */
@Entity('change_counter')
@Check('change_counter_one_row', 'id = 1')
export class ChangeCounter {
  @PrimaryColumn({ name: 'id', type: 'smallint' })
  declare id: number;

  @Column({ name: 'position', type: 'bigint' })
  declare position: string;
}

/** What changed at each position. */
@Entity('change_log')
export class ChangeLogEntry {
  @PrimaryColumn({ name: 'position', type: 'bigint' })
  declare position: string;

  @Column({ name: 'kind', type: 'text' })
  declare kind: ChangedKind;

  @Column({ name: 'item_id', type: 'text' })
  declare itemId: string;
}

/** Which life of the database this is: a restore begins a new one, so that positions are not mistaken. */
@Entity('epoch')
@Check('epoch_one_row', 'id = 1')
export class Epoch {
  @PrimaryColumn({ name: 'id', type: 'smallint' })
  declare id: number;

  @Column({ name: 'epoch', type: 'text' })
  declare epoch: string;

  @Column({ name: 'begun_at', type: 'timestamptz' })
  declare begunAt: Date;
}
