import { Column, Entity, PrimaryColumn } from 'typeorm';

@Entity('claim')
export class Claim {
  @PrimaryColumn('uuid', { name: 'workshop_id' }) workshopId: string;
  @PrimaryColumn('uuid') id: string;
  @Column('integer') version: number;
  @Column('integer') number: number;
  @Column('text') state: 'draft';
  @Column('uuid', { name: 'supplier_id' }) supplierId: string;
  @Column('text') title: string;
  @Column('uuid', { name: 'lot_ids', array: true }) lotIds: string[];
  @Column('text', { array: true }) faults: string[];
  @Column('date', { name: 'from_day', nullable: true }) from: string | null;
  @Column('date', { name: 'to_day', nullable: true }) to: string | null;
  @Column('text', { name: 'leave_out', array: true }) leaveOut: string[];
  @Column('text', { nullable: true }) remarks: string | null;
  @Column('text', { name: 'created_from', nullable: true }) createdFrom: string | null;
  @Column({ type: 'timestamptz', name: 'created_at', insert: false, update: false }) createdAt: Date;
  @Column('timestamptz', { name: 'updated_at' }) updatedAt: Date;
}
