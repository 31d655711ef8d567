import { Column, Entity, PrimaryColumn } from 'typeorm';
import type { ImportMapping, ImportReport } from '#shared/imports.ts';

@Entity('import')
export class Import {
  @PrimaryColumn('uuid', { name: 'workshop_id' }) workshopId: string;
  @PrimaryColumn('uuid') id: string;
  @Column('integer') version: number;
  @Column('text', { name: 'file_name' }) fileName: string;
  @Column('text') state: 'uploaded' | 'checked' | 'committed';
  @Column('text') encoding: string;
  @Column('text') delimiter: string;
  @Column('text', { select: false }) content: string;
  @Column('jsonb') heads: string[];
  @Column('jsonb') samples: string[][];
  @Column('integer', { name: 'row_count' }) rowCount: number;
  @Column('jsonb') mapping: ImportMapping;
  @Column('jsonb', { nullable: true }) report: ImportReport | null;
  @Column('timestamptz', { name: 'committed_at', nullable: true }) committedAt: Date | null;
  @Column('integer', { name: 'batches_made', nullable: true }) batchesMade: number | null;
  @Column('text', { name: 'created_from', nullable: true }) createdFrom: string | null;
  @Column({ type: 'timestamptz', name: 'created_at', insert: false, update: false }) createdAt: Date;
  @Column('timestamptz', { name: 'updated_at' }) updatedAt: Date;
}
