import { Column, Entity, PrimaryColumn } from 'typeorm';

@Entity('workshop')
export class Workshop {
  @PrimaryColumn('uuid') id: string;
  @Column('integer') version: number;
  @Column('text') name: string;
  @Column('text', { name: 'time_zone' }) timeZone: string;
  @Column('text') currency: string;
  @Column('text', { name: 'batch_prefix' }) batchPrefix: string;
  @Column('integer', { name: 'first_price_minor', nullable: true }) firstPriceMinor: number | null;
  @Column('integer', { name: 'second_price_minor', nullable: true }) secondPriceMinor: number | null;
  @Column({ type: 'timestamptz', name: 'created_at', insert: false, update: false }) createdAt: Date;
  @Column('timestamptz', { name: 'updated_at' }) updatedAt: Date;
}
