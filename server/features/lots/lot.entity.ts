import { Column, Entity, PrimaryColumn } from 'typeorm';
import type { LotStanding } from '#shared/words/lot-words.ts';

@Entity('lot')
export class Lot {
  @PrimaryColumn('uuid', { name: 'workshop_id' }) workshopId: string;
  @PrimaryColumn('uuid') id: string;
  @Column('integer') version: number;
  @Column('uuid', { name: 'material_id' }) materialId: string;
  @Column('uuid', { name: 'supplier_id', nullable: true }) supplierId: string | null;
  @Column('text') code: string;
  @Column('text', { name: 'supplier_product_name', nullable: true }) supplierProductName: string | null;
  @Column('text', { name: 'supplier_product_number', nullable: true }) supplierProductNumber: string | null;
  @Column('date', { name: 'ordered_on', nullable: true }) orderedOn: string | null;
  @Column('date', { name: 'received_on', nullable: true }) receivedOn: string | null;
  @Column('date', { name: 'opened_on', nullable: true }) openedOn: string | null;
  @Column('date', { name: 'finished_on', nullable: true }) finishedOn: string | null;
  @Column('date', { name: 'best_before_on', nullable: true }) bestBeforeOn: string | null;
  @Column('double precision', { name: 'quantity_g', nullable: true }) quantityG: number | null;
  @Column('double precision', { name: 'quantity_left_g', nullable: true }) quantityLeftG: number | null;
  @Column('integer', { name: 'price_minor_per_kg', nullable: true }) priceMinorPerKg: number | null;
  @Column('double precision', { name: 'purity_fraction', nullable: true }) purityFraction: number | null;
  @Column('double precision', { name: 'certificate_max_fraction', nullable: true }) certificateMaxFraction: number | null;
  @Column('text', { name: 'certificate_edition', nullable: true }) certificateEdition: string | null;
  @Column('date', { name: 'certificate_on', nullable: true }) certificateOn: string | null;
  @Column('double precision', { name: 'flash_point_c', nullable: true }) flashPointC: number | null;
  @Column('double precision', { name: 'vanillin_fraction', nullable: true }) vanillinFraction: number | null;
  @Column('text', { name: 'intended_use_note', nullable: true }) intendedUseNote: string | null;
  @Column('text', { nullable: true }) storage: string | null;
  @Column('text') standing: LotStanding;
  @Column('text', { nullable: true }) note: string | null;
  @Column('text', { name: 'created_from', nullable: true }) createdFrom: string | null;
  @Column({ type: 'timestamptz', name: 'created_at', insert: false, update: false }) createdAt: Date;
  @Column('timestamptz', { name: 'updated_at' }) updatedAt: Date;
}
