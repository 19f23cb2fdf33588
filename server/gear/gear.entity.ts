import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import type { InstrumentKind } from '../../procedures/document';
import type { InstrumentRange } from '../../procedures/engine';
import { Site } from '../sites/sites.entity';

/** An instrument on a gear shelf. */
@Entity('instrument')
@Index('instrument_site', ['siteId'])
export class Instrument {
  @PrimaryColumn({ name: 'id', type: 'uuid' })
  declare id: string;

  @ForeignKey(() => Site, { name: 'instrument_site_fk' })
  @Column({ name: 'site_id', type: 'uuid' })
  declare siteId: string;

  @Column({ name: 'kind', type: 'text' })
  declare kind: InstrumentKind;

  /** As it is written on it: `G-12`. */
  @Column({ name: 'label', type: 'text' })
  declare label: string;

  @Column({ name: 'serial', type: 'text' })
  declare serial: string;

  @Column({ name: 'shows', type: 'json' })
  declare shows: readonly InstrumentRange[];

  /** The day until which its check holds. */
  @Column({ name: 'due_on', type: 'date' })
  declare dueOn: string;

  @Column({ name: 'last_checked_on', type: 'date' })
  declare lastCheckedOn: string;

  @Column({ name: 'in_use', type: 'boolean' })
  declare inUse: boolean;
}
