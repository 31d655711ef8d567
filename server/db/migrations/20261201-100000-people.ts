import type { MigrationInterface, QueryRunner } from 'typeorm';

/** People, sessions and the workshop itself: what must be reachable before a workshop is chosen. */
export class People20261201100000 implements MigrationInterface {
  name = 'People20261201100000';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      create schema app;

      -- Unset or empty is an error on purpose: a query that forgot its workshop must not answer "nothing".
      create function app.workshop_id() returns uuid language sql stable as
        $$ select current_setting('app.workshop_id')::uuid $$;
      create function app.workshop_id_or_null() returns uuid language sql stable as
        $$ select nullif(current_setting('app.workshop_id', true), '')::uuid $$;
      create function app.account_id_or_null() returns uuid language sql stable as
        $$ select nullif(current_setting('app.account_id', true), '')::uuid $$;

      -- Puts the one tenancy policy on a table; called by every migration that makes one.
      create procedure app.guard_tenant_table(relation regclass) language plpgsql as $$
      begin
        execute format('alter table %s enable row level security', relation);
        execute format('alter table %s force row level security', relation);
        execute format('create policy workshop_wall on %s using (workshop_id = app.workshop_id()) with check (workshop_id = app.workshop_id())', relation);
      end $$;

      create table account (
        id uuid primary key,
        email text not null,
        name text not null,
        password_hash text not null,
        temperature_unit text not null default 'celsius' check (temperature_unit in ('celsius', 'fahrenheit')),
        mass_unit text not null default 'gram' check (mass_unit in ('gram', 'ounce')),
        single_keys boolean not null default true,
        created_at timestamptz not null default now(),
        updated_at timestamptz not null default now()
      );
      create unique index account_email on account (lower(email));

      create table workshop (
        id uuid primary key,
        version integer not null default 1,
        name text not null,
        time_zone text not null default 'Europe/London',
        currency text not null default 'EUR',
        batch_prefix text not null default 'B',
        next_batch_number integer not null default 1,
        first_price_minor integer,
        second_price_minor integer,
        is_demo boolean not null default false,
        created_at timestamptz not null default now(),
        updated_at timestamptz not null default now()
      );
      alter table workshop enable row level security;
      alter table workshop force row level security;
      -- A person who is signed in may see the names of the workshops they belong to.
      create policy workshop_wall on workshop using (id = app.workshop_id_or_null())
        with check (id = app.workshop_id_or_null());

      create table member (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        version integer not null default 1,
        account_id uuid references account (id),
        name text not null,
        role text not null check (role in ('owner', 'maker', 'inspector', 'viewer')),
        ended_at timestamptz,
        created_from text,
        created_at timestamptz not null default now(),
        updated_at timestamptz not null default now(),
        primary key (workshop_id, id),
        unique (workshop_id, account_id)
      );
      create index member_account on member (account_id);
      alter table member enable row level security;
      alter table member force row level security;
      -- Sign-in must find a person's memberships before any workshop is set.
      create policy workshop_wall on member
        using (workshop_id = app.workshop_id_or_null() or account_id = app.account_id_or_null())
        with check (workshop_id = app.workshop_id_or_null());
      create policy own_workshops on workshop for select
        using (exists (select 1 from member m where m.workshop_id = workshop.id and m.account_id = app.account_id_or_null() and m.ended_at is null));

      create table web_session (
        sid text primary key,
        sess json not null,
        expire timestamptz not null
      );
      create index web_session_expire on web_session (expire);

      create table one_time_token (
        token_hash text primary key,
        purpose text not null check (purpose in ('reset', 'invitation')),
        account_id uuid references account (id),
        workshop_id uuid references workshop (id) on delete cascade,
        email text not null,
        name text,
        role text check (role in ('owner', 'maker', 'inspector', 'viewer')),
        expires_at timestamptz not null,
        used_at timestamptz,
        created_at timestamptz not null default now()
      );

      create table outbox_mail (
        id uuid primary key,
        workshop_id uuid,
        recipient text not null,
        subject text not null,
        body text not null,
        created_at timestamptz not null default now(),
        sent_at timestamptz
      );
      create index outbox_mail_created on outbox_mail (created_at desc);

      create table throttle (
        key varchar(255) primary key,
        points integer not null default 0,
        expire bigint
      );
    `);
  }

  async down(): Promise<void> {
    throw new Error('Migrations go forward only');
  }
}
