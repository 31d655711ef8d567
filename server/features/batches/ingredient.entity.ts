import { Column, Entity, PrimaryColumn } from 'typeorm';
import type { CookStage } from '#shared/words/batch-words.ts';

/** One thing that went into a batch, in the order of the batch card. */
@Entity('batch_ingredient')
export class BatchIngredient {
  @PrimaryColumn('uuid', { name: 'workshop_id' }) workshopId: string;
  @PrimaryColumn('uuid') id: string;
  @Column('uuid', { name: 'batch_id' }) batchId: string;
  @Column('uuid', { name: 'material_id' }) materialId: string;
  @Column('uuid', { name: 'lot_id', nullable: true }) lotId: string | null;
  @Column('double precision', { name: 'mass_g', nullable: true }) massG: number | null;
  @Column('double precision', { name: 'share_of_oils_fraction', nullable: true }) shareOfOilsFraction: number | null;
  @Column('integer') position: number;
}

/** How the mass looked during a cook, and when. */
@Entity('cook_stage')
export class CookStageRow {
  @PrimaryColumn('uuid', { name: 'workshop_id' }) workshopId: string;
  @PrimaryColumn('uuid') id: string;
  @Column('uuid', { name: 'batch_id' }) batchId: string;
  @Column('text') stage: CookStage;
  @Column('double precision', { name: 'minutes_from_start' }) minutesFromStart: number;
}
