import { Column, Entity, PrimaryColumn } from 'typeorm';
import type { MassUnit, TemperatureUnit } from '#shared/session.ts';

@Entity('account')
export class Account {
  @PrimaryColumn('uuid') id: string;
  @Column('text') email: string;
  @Column('text') name: string;
  @Column('text', { name: 'password_hash' }) passwordHash: string;
  @Column('text', { name: 'temperature_unit' }) temperatureUnit: TemperatureUnit;
  @Column('text', { name: 'mass_unit' }) massUnit: MassUnit;
  @Column('boolean', { name: 'single_keys' }) singleKeys: boolean;
  @Column('timestamptz', { name: 'updated_at' }) updatedAt: Date;
}
