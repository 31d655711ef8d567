import { Column, Entity, PrimaryColumn } from 'typeorm';
import type { LotStanding } from '#shared/words/lot-words.ts';

@Entity('lot_standing_change')
export class LotStandingChangeRow {
  @PrimaryColumn('uuid', { name: 'workshop_id' }) workshopId: string;
  @PrimaryColumn('uuid') id: string;
  @Column('uuid', { name: 'lot_id' }) lotId: string;
  @Column('text') before: LotStanding;
  @Column('text') after: LotStanding;
  @Column('text') reason: string;
  @Column('uuid', { name: 'member_id', nullable: true }) memberId: string | null;
  @Column('timestamptz', { name: 'changed_at' }) changedAt: Date;
}
