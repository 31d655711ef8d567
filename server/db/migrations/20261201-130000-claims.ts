import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Claims against suppliers, as drafts. */
export class Claims20261201130000 implements MigrationInterface {
  name = 'Claims20261201130000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      create table claim (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        version integer not null default 1,
        number integer not null,
        state text not null default 'draft' check (state in ('draft')),
        supplier_id uuid not null,
        title text not null,
        lot_ids uuid[] not null,
        faults text[] not null,
        from_day date,
        to_day date,
        leave_out text[] not null default '{}',
        remarks text,
        created_from text,
        created_at timestamptz not null default now(),
        updated_at timestamptz not null default now(),
        primary key (workshop_id, id),
        unique (workshop_id, number),
        foreign key (workshop_id, supplier_id) references supplier (workshop_id, id)
      );
    `);
    await runner.query('call app.guard_tenant_table($1::regclass)', ['claim']);
    await runner.query('call app.keep_trail($1::regclass)', ['claim']);
  }

  async down(): Promise<void> {
    throw new Error('Migrations go forward only');
  }
}
