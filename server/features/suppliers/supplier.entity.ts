import { Column, Entity, PrimaryColumn } from 'typeorm';

@Entity('supplier')
export class Supplier {
  @PrimaryColumn('uuid', { name: 'workshop_id' }) workshopId: string;
  @PrimaryColumn('uuid') id: string;
  @Column('integer') version: number;
  @Column('text') name: string;
  @Column('text', { name: 'contact_name', nullable: true }) contactName: string | null;
  @Column('text', { nullable: true }) email: string | null;
  @Column('text', { nullable: true }) phone: string | null;
  @Column('text', { nullable: true }) note: string | null;
  @Column('timestamptz', { name: 'withdrawn_at', nullable: true }) withdrawnAt: Date | null;
  @Column('text', { name: 'created_from', nullable: true }) createdFrom: string | null;
  @Column({ type: 'timestamptz', name: 'created_at', insert: false, update: false }) createdAt: Date;
  @Column('timestamptz', { name: 'updated_at' }) updatedAt: Date;
}
