import { Column, Entity, PrimaryColumn } from 'typeorm';
import type { MaterialKind } from '#shared/words/lot-words.ts';

@Entity('material')
export class Material {
  @PrimaryColumn('uuid', { name: 'workshop_id' }) workshopId: string;
  @PrimaryColumn('uuid') id: string;
  @Column('integer') version: number;
  @Column('text') kind: MaterialKind;
  @Column('text') name: string;
  @Column('text', { name: 'inci_name', nullable: true }) inciName: string | null;
  @Column('double precision', { name: 'saponification_koh_mg_per_g', nullable: true }) saponificationKohMgPerG: number | null;
  @Column('boolean', { name: 'is_hard_fat' }) isHardFat: boolean;
  @Column('boolean', { name: 'is_lauric' }) isLauric: boolean;
  @Column('boolean', { name: 'is_animal' }) isAnimal: boolean;
  @Column('boolean', { name: 'is_linoleic_rich' }) isLinoleicRich: boolean;
  @Column('text', { nullable: true }) alkali: 'naoh' | 'koh' | null;
  @Column('boolean', { name: 'is_essential_oil' }) isEssentialOil: boolean;
  @Column('boolean', { name: 'is_white_pigment' }) isWhitePigment: boolean;
  @Column('text', { nullable: true }) note: string | null;
  @Column('timestamptz', { name: 'withdrawn_at', nullable: true }) withdrawnAt: Date | null;
  @Column('text', { name: 'created_from', nullable: true }) createdFrom: string | null;
  @Column({ type: 'timestamptz', name: 'created_at', insert: false, update: false }) createdAt: Date;
  @Column('timestamptz', { name: 'updated_at' }) updatedAt: Date;
}
