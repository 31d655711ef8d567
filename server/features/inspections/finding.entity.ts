import { Column, Entity, PrimaryColumn } from 'typeorm';

@Entity('finding')
export class Finding {
  @PrimaryColumn('uuid', { name: 'workshop_id' }) workshopId: string;
  @PrimaryColumn('uuid') id: string;
  @Column('integer') version: number;
  @Column('uuid', { name: 'inspection_id' }) inspectionId: string;
  @Column('uuid', { name: 'batch_id' }) batchId: string;
  @Column('text') fault: string;
  @Column('smallint') severity: number;
  @Column('integer', { array: true, nullable: true }) bars: number[] | null;
  @Column('integer', { name: 'bars_affected', nullable: true }) barsAffected: number | null;
  @Column('integer', { name: 'bars_looked_at', nullable: true }) barsLookedAt: number | null;
  @Column('text', { nullable: true }) note: string | null;
  @Column('timestamptz', { name: 'withdrawn_at', nullable: true }) withdrawnAt: Date | null;
  @Column('text', { name: 'created_from', nullable: true }) createdFrom: string | null;
  @Column({ type: 'timestamptz', name: 'created_at', insert: false, update: false }) createdAt: Date;
  @Column('timestamptz', { name: 'updated_at' }) updatedAt: Date;
}
