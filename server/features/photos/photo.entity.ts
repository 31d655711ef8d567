import { Column, Entity, PrimaryColumn } from 'typeorm';
import type { Stage } from '#shared/words/stages.ts';

@Entity('photo')
export class Photo {
  @PrimaryColumn('uuid', { name: 'workshop_id' }) workshopId: string;
  @PrimaryColumn('uuid') id: string;
  @Column('integer') version: number;
  @Column('uuid', { name: 'batch_id', nullable: true }) batchId: string | null;
  @Column('text', { nullable: true }) stage: Stage | null;
  @Column('timestamptz', { name: 'taken_at', nullable: true }) takenAt: Date | null;
  @Column('integer', { name: 'taken_offset_minutes', nullable: true }) takenOffsetMinutes: number | null;
  @Column('text', { nullable: true }) camera: string | null;
  @Column('text', { name: 'file_name', nullable: true }) fileName: string | null;
  @Column('text', { name: 'media_type' }) mediaType: 'image/jpeg' | 'image/png';
  @Column('integer') width: number;
  @Column('integer') height: number;
  @Column('integer') bytes: number;
  @Column('text', { name: 'upload_sha256' }) uploadSha256: string;
  @Column('text', { name: 'stored_sha256' }) storedSha256: string;
  @Column('text', { nullable: true }) alt: string | null;
  @Column('uuid', { name: 'uploaded_by', nullable: true }) uploadedBy: string | null;
  @Column('text', { name: 'created_from', nullable: true }) createdFrom: string | null;
  @Column({ type: 'timestamptz', name: 'created_at', insert: false, update: false }) createdAt: Date;
  @Column('timestamptz', { name: 'updated_at' }) updatedAt: Date;
}
