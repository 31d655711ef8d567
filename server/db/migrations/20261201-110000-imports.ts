import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Sheets on their way into the log. */
export class Imports20261201110000 implements MigrationInterface {
  name = 'Imports20261201110000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      create table import (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        version integer not null default 1,
        file_name text not null,
        state text not null check (state in ('uploaded', 'checked', 'committed')),
        encoding text not null,
        delimiter text not null,
        content text not null,
        heads jsonb not null,
        samples jsonb not null,
        row_count integer not null,
        mapping jsonb not null,
        report jsonb,
        committed_at timestamptz,
        batches_made integer,
        created_from text,
        created_at timestamptz not null default now(),
        updated_at timestamptz not null default now(),
        primary key (workshop_id, id)
      );
      -- Apart from its import, so that it can be seen while the import's own transaction is still open.
      create table import_progress (
        workshop_id uuid not null references workshop (id) on delete cascade,
        import_id uuid not null,
        done integer not null,
        of_rows integer not null,
        primary key (workshop_id, import_id)
      );
    `);
    for (const table of ['import', 'import_progress']) await runner.query('call app.guard_tenant_table($1::regclass)', [table]);
    await runner.query('call app.keep_trail($1::regclass)', ['import']);
  }

  async down(): Promise<void> {
    throw new Error('Migrations go forward only');
  }
}
