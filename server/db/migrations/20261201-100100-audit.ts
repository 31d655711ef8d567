import type { MigrationInterface, QueryRunner } from 'typeorm';

/** The append-only trail, written by trigger, and the data revision that answers are cached by. */
export class Audit20261201100100 implements MigrationInterface {
  name = 'Audit20261201100100';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      create table audit_entry (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id bigint generated always as identity,
        at timestamptz not null default clock_timestamp(),
        member_id uuid,
        request_id text,
        deed text not null,
        table_name text not null,
        record_id uuid,
        before jsonb,
        after jsonb,
        primary key (workshop_id, id)
      );
      call app.guard_tenant_table('audit_entry');
      create index audit_entry_record on audit_entry (workshop_id, record_id, id desc);

      create function app.refuse_change() returns trigger language plpgsql as $$
      begin raise exception 'the audit trail is append-only'; end $$;
      create trigger audit_entry_is_append_only before update or delete on audit_entry
        for each row when (pg_trigger_depth() = 0) execute function app.refuse_change();
      create trigger audit_entry_is_never_emptied before truncate on audit_entry
        for each statement execute function app.refuse_change();

      -- One insert a statement, not one a row: an import writes a hundred thousand rows.
      -- Secrets never reach the trail; what did not change is not repeated.
      create function app.write_audit() returns trigger language plpgsql as $$
      declare
        hidden text[] := array['password_hash', 'token_hash', 'created_from', 'content'];
        who uuid := nullif(current_setting('app.member_id', true), '')::uuid;
        request text := nullif(current_setting('app.request_id', true), '');
      begin
        if tg_op = 'INSERT' then
          insert into audit_entry (workshop_id, member_id, request_id, deed, table_name, record_id, after)
          select coalesce(r ->> 'workshop_id', r ->> 'id')::uuid, who, request, 'insert', tg_table_name, (r ->> 'id')::uuid, r - hidden
          from (select to_jsonb(n) r from new_rows n) fresh;
        elsif tg_op = 'UPDATE' then
          insert into audit_entry (workshop_id, member_id, request_id, deed, table_name, record_id, before, after)
          select coalesce(r ->> 'workshop_id', r ->> 'id')::uuid, who, request, 'update', tg_table_name, (r ->> 'id')::uuid, was - hidden, r - hidden
          from (select to_jsonb(o) was, to_jsonb(n) r from old_rows o join new_rows n using (id)) changed
          where was - hidden - array['updated_at'] <> r - hidden - array['updated_at'];
        else
          insert into audit_entry (workshop_id, member_id, request_id, deed, table_name, record_id, before)
          select coalesce(r ->> 'workshop_id', r ->> 'id')::uuid, who, request, 'delete', tg_table_name, (r ->> 'id')::uuid, r - hidden
          from (select to_jsonb(o) r from old_rows o) gone;
        end if;
        return null;
      end $$;

      create procedure app.keep_trail(relation regclass) language plpgsql as $$
      begin
        execute format('create trigger trail_insert after insert on %s referencing new table as new_rows for each statement execute function app.write_audit()', relation);
        execute format('create trigger trail_update after update on %s referencing old table as old_rows new table as new_rows for each statement execute function app.write_audit()', relation);
        execute format('create trigger trail_delete after delete on %s referencing old table as old_rows for each statement execute function app.write_audit()', relation);
      end $$;
      call app.keep_trail('workshop');
      call app.keep_trail('member');

      create table data_revision (
        workshop_id uuid primary key references workshop (id) on delete cascade,
        revision bigint not null default 1
      );
      call app.guard_tenant_table('data_revision');

      -- Deferred to the commit, so that its row lock is the last one taken and held for an instant only.
      create function app.bump_revision() returns trigger language plpgsql as $$
      begin
        if current_setting('app.revision_bumped', true) = pg_current_xact_id()::text then return null; end if;
        perform set_config('app.revision_bumped', pg_current_xact_id()::text, true);
        insert into data_revision (workshop_id) values (app.workshop_id())
          on conflict (workshop_id) do update set revision = data_revision.revision + 1;
        return null;
      end $$;
      create procedure app.feeds_answers(relation regclass) language plpgsql as $$
      begin
        execute format('create constraint trigger revision after insert or update or delete on %s deferrable initially deferred for each row execute function app.bump_revision()', relation);
      end $$;
    `);
  }

  async down(): Promise<void> {
    throw new Error('Migrations go forward only');
  }
}
