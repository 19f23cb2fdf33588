import { Column, Entity, PrimaryColumn } from 'typeorm';

/** A garage. */
@Entity('site')
export class Site {
  @PrimaryColumn({ name: 'id', type: 'uuid' })
  declare id: string;

  @Column({ name: 'name', type: 'text' })
  declare name: string;

  @Column({ name: 'elevation_m', type: 'double precision' })
  declare elevationM: number;
}
