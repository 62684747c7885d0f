import { Column, Entity, PrimaryColumn } from 'typeorm';

/** The shop’s profile, supplies, cables and ovens, each under its own name. */
@Entity('settings')
export class Setting {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'simple-json' })
  value: unknown;

  @Column({ type: 'integer' })
  version: number;
}
