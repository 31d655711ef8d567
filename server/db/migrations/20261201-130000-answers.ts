import type { MigrationInterface, QueryRunner } from 'typeorm';

/** A lot's vanillin is part of what the answers rest on, so a change of a lot counts as a change of the data. */
export class Answers20261201130000 implements MigrationInterface {
  name = 'Answers20261201130000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query('call app.feeds_answers($1::regclass)', ['lot']);
  }

  async down(): Promise<void> {
    throw new Error('Migrations go forward only');
  }
}
