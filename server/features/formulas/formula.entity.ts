import { Column, Entity, PrimaryColumn } from 'typeorm';

@Entity('formula')
export class Formula {
  @PrimaryColumn('uuid', { name: 'workshop_id' }) workshopId: string;
  @PrimaryColumn('uuid') id: string;
  @Column('integer') version: number;
  @Column('text') name: string;
  @Column('text', { nullable: true }) note: string | null;
  @Column('timestamptz', { name: 'withdrawn_at', nullable: true }) withdrawnAt: Date | null;
  @Column('text', { name: 'created_from', nullable: true }) createdFrom: string | null;
  @Column({ type: 'timestamptz', name: 'created_at', insert: false, update: false }) createdAt: Date;
  @Column('timestamptz', { name: 'updated_at' }) updatedAt: Date;
}

/** One state of a formula; frozen once a batch used it. */
@Entity('formula_version')
export class FormulaVersion {
  @PrimaryColumn('uuid', { name: 'workshop_id' }) workshopId: string;
  @PrimaryColumn('uuid') id: string;
  @Column('uuid', { name: 'formula_id' }) formulaId: string;
  @Column('integer') number: number;
  @Column('double precision', { name: 'superfat_fraction', nullable: true }) superfatFraction: number | null;
  @Column('timestamptz', { name: 'frozen_at', nullable: true }) frozenAt: Date | null;
}

@Entity('formula_line')
export class FormulaLine {
  @PrimaryColumn('uuid', { name: 'workshop_id' }) workshopId: string;
  @PrimaryColumn('uuid') id: string;
  @Column('uuid', { name: 'formula_version_id' }) formulaVersionId: string;
  @Column('uuid', { name: 'material_id' }) materialId: string;
  @Column('double precision', { name: 'share_of_oils_fraction' }) shareOfOilsFraction: number;
  @Column('integer') position: number;
}
