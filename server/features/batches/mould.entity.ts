import { Column, Entity, PrimaryColumn } from 'typeorm';

@Entity('mould')
export class MouldRecord {
  @PrimaryColumn('uuid', { name: 'workshop_id' }) workshopId: string;
  @PrimaryColumn('uuid') id: string;
  @Column('integer') version: number;
  @Column('text') name: string;
  @Column('double precision', { name: 'oil_mass_g', nullable: true }) oilMassG: number | null;
  @Column('integer', { nullable: true }) bars: number | null;
  @Column('timestamptz', { name: 'withdrawn_at', nullable: true }) withdrawnAt: Date | null;
  @Column('text', { name: 'created_from', nullable: true }) createdFrom: string | null;
  @Column({ type: 'timestamptz', name: 'created_at', insert: false, update: false }) createdAt: Date;
  @Column('timestamptz', { name: 'updated_at' }) updatedAt: Date;
}
