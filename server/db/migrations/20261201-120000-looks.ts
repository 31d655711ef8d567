import type { MigrationInterface, QueryRunner } from 'typeorm';

/** The latest looks at a stage, which say what faults are likely there. */
export class Looks20261201120000 implements MigrationInterface {
  name = 'Looks20261201120000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query('create index inspection_stage on inspection (workshop_id, stage, inspected_at desc)');
    await runner.query('create index checklist_answer_inspection on checklist_answer (workshop_id, inspection_id, fault, answer)');
  }

  async down(): Promise<void> {
    throw new Error('Migrations go forward only');
  }
}
