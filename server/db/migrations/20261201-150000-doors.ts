import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Sessions by person, the trail by member and by table, and mails that are tried again. */
export class Doors20261201150000 implements MigrationInterface {
  name = 'Doors20261201150000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      create index web_session_account on web_session ((sess ->> 'accountId'));
      create index one_time_token_open on one_time_token (purpose, lower(email)) where used_at is null;
      create index audit_entry_member on audit_entry (workshop_id, member_id, id desc);
      create index audit_entry_table on audit_entry (workshop_id, table_name, id desc);

      alter table outbox_mail add column tries integer not null default 0;
      alter table outbox_mail add column next_try_at timestamptz not null default now();
      create index outbox_mail_waiting on outbox_mail (next_try_at) where sent_at is null;
      create index outbox_mail_workshop on outbox_mail (workshop_id, created_at desc);
    `);
  }

  async down(): Promise<void> {
    throw new Error('Migrations go forward only');
  }
}
