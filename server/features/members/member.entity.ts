import { Column, Entity, PrimaryColumn } from 'typeorm';
import type { Role } from '#shared/words/roles.ts';

@Entity('member')
export class Member {
  @PrimaryColumn('uuid', { name: 'workshop_id' }) workshopId: string;
  @PrimaryColumn('uuid') id: string;
  @Column('integer') version: number;
  @Column('uuid', { name: 'account_id', nullable: true }) accountId: string | null;
  @Column('text') name: string;
  @Column('text') role: Role;
  @Column('timestamptz', { name: 'ended_at', nullable: true }) endedAt: Date | null;
  @Column('text', { name: 'created_from', nullable: true }) createdFrom: string | null;
  @Column({ type: 'timestamptz', name: 'created_at', insert: false, update: false }) createdAt: Date;
  @Column('timestamptz', { name: 'updated_at' }) updatedAt: Date;
}
