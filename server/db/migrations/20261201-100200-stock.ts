import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Suppliers, materials, lots, formulas. */
export class Stock20261201100200 implements MigrationInterface {
  name = 'Stock20261201100200';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      create table supplier (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        version integer not null default 1,
        name text not null,
        contact_name text,
        email text,
        phone text,
        note text,
        withdrawn_at timestamptz,
        created_from text,
        created_at timestamptz not null default now(),
        updated_at timestamptz not null default now(),
        primary key (workshop_id, id)
      );

      create table material (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        version integer not null default 1,
        kind text not null check (kind in ('fat', 'alkali', 'liquid', 'fragrance', 'colourant', 'additive', 'packaging')),
        name text not null,
        inci_name text,
        -- Fats: mg KOH per g, and what the formula class of a claim is made from.
        saponification_koh_mg_per_g double precision check (saponification_koh_mg_per_g between 50 and 300),
        is_hard_fat boolean not null default false,
        is_lauric boolean not null default false,
        is_animal boolean not null default false,
        is_linoleic_rich boolean not null default false,
        alkali text check (alkali in ('naoh', 'koh')),
        is_essential_oil boolean not null default false,
        is_white_pigment boolean not null default false,
        note text,
        withdrawn_at timestamptz,
        created_from text,
        created_at timestamptz not null default now(),
        updated_at timestamptz not null default now(),
        primary key (workshop_id, id)
      );
      create index material_kind on material (workshop_id, kind, name);

      create table lot (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        version integer not null default 1,
        material_id uuid not null,
        supplier_id uuid,
        code text not null,
        supplier_product_name text,
        supplier_product_number text,
        ordered_on date,
        received_on date,
        opened_on date,
        finished_on date,
        best_before_on date,
        quantity_g double precision check (quantity_g >= 0),
        quantity_left_g double precision check (quantity_left_g >= 0),
        price_minor_per_kg integer check (price_minor_per_kg >= 0),
        purity_fraction double precision check (purity_fraction between 0.7 and 1),
        certificate_max_fraction double precision check (certificate_max_fraction between 0 and 1),
        certificate_edition text,
        certificate_on date,
        flash_point_c double precision,
        vanillin_fraction double precision check (vanillin_fraction between 0 and 1),
        intended_use_note text,
        storage text,
        standing text not null default 'in-use' check (standing in ('in-use', 'hot-process-only', 'on-hold', 'returned', 'used-up')),
        note text,
        created_from text,
        created_at timestamptz not null default now(),
        updated_at timestamptz not null default now(),
        primary key (workshop_id, id),
        foreign key (workshop_id, material_id) references material (workshop_id, id),
        foreign key (workshop_id, supplier_id) references supplier (workshop_id, id),
        unique (workshop_id, material_id, code)
      );
      create index lot_code on lot (workshop_id, code);
      create index lot_supplier on lot (workshop_id, supplier_id);

      create table lot_standing_change (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        lot_id uuid not null,
        before text not null,
        after text not null,
        reason text not null,
        member_id uuid,
        changed_at timestamptz not null default now(),
        primary key (workshop_id, id),
        foreign key (workshop_id, lot_id) references lot (workshop_id, id),
        foreign key (workshop_id, member_id) references member (workshop_id, id)
      );
      create index lot_standing_change_lot on lot_standing_change (workshop_id, lot_id, changed_at);

      create table formula (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        version integer not null default 1,
        name text not null,
        note text,
        withdrawn_at timestamptz,
        created_from text,
        created_at timestamptz not null default now(),
        updated_at timestamptz not null default now(),
        primary key (workshop_id, id)
      );
      create unique index formula_name on formula (workshop_id, lower(name));

      create table formula_version (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        formula_id uuid not null,
        number integer not null,
        superfat_fraction double precision,
        note text,
        frozen_at timestamptz,
        created_at timestamptz not null default now(),
        primary key (workshop_id, id),
        foreign key (workshop_id, formula_id) references formula (workshop_id, id),
        unique (workshop_id, formula_id, number)
      );

      -- One line of a formula version: its share of the oils, as a fraction.
      create table formula_line (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        formula_version_id uuid not null,
        material_id uuid not null,
        share_of_oils_fraction double precision not null check (share_of_oils_fraction >= 0),
        position integer not null,
        primary key (workshop_id, id),
        foreign key (workshop_id, formula_version_id) references formula_version (workshop_id, id),
        foreign key (workshop_id, material_id) references material (workshop_id, id)
      );
      create index formula_line_version on formula_line (workshop_id, formula_version_id, position);
    `);
    for (const table of ['supplier', 'material', 'lot', 'lot_standing_change', 'formula', 'formula_version', 'formula_line']) {
      await runner.query('call app.guard_tenant_table($1::regclass)', [table]);
      await runner.query('call app.keep_trail($1::regclass)', [table]);
    }
    await runner.query('call app.feeds_answers($1::regclass)', ['lot']);
  }

  async down(): Promise<void> {
    throw new Error('Migrations go forward only');
  }
}
