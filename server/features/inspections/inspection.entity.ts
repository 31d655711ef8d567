import { Column, Entity, PrimaryColumn } from 'typeorm';
import type { Stage } from '#shared/words/stages.ts';

@Entity('inspection')
export class Inspection {
  @PrimaryColumn('uuid', { name: 'workshop_id' }) workshopId: string;
  @PrimaryColumn('uuid') id: string;
  @Column('integer') version: number;
  @Column('uuid', { name: 'batch_id' }) batchId: string;
  @Column('text') stage: Stage;
  @Column('timestamptz', { name: 'inspected_at' }) inspectedAt: Date;
  @Column('uuid', { name: 'inspector_id', nullable: true }) inspectorId: string | null;
  @Column('integer', { name: 'bars_looked_at', nullable: true }) barsLookedAt: number | null;
  @Column('text', { nullable: true }) note: string | null;
  @Column('text', { name: 'created_from', nullable: true }) createdFrom: string | null;
  @Column({ type: 'timestamptz', name: 'created_at', insert: false, update: false }) createdAt: Date;
  @Column('timestamptz', { name: 'updated_at' }) updatedAt: Date;
}
