import type { MigrationInterface, QueryRunner } from 'typeorm';

/** Batches, what went in, photos, inspections with their answers, findings and marks. */
export class Batches20261201100300 implements MigrationInterface {
  name = 'Batches20261201100300';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      create table mould (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        version integer not null default 1,
        name text not null,
        oil_mass_g double precision check (oil_mass_g > 0),
        bars integer check (bars between 1 and 500),
        withdrawn_at timestamptz,
        created_from text,
        created_at timestamptz not null default now(),
        updated_at timestamptz not null default now(),
        primary key (workshop_id, id)
      );
      create unique index mould_name on mould (workshop_id, lower(name));

      create table batch (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        version integer not null default 1,
        code text not null,
        made_on date not null,
        poured_at timestamptz,
        method text not null check (method in ('cold', 'cold-oven', 'hot', 'hot-fluid', 'rebatch')),
        state text not null default 'making' check (state in ('planned', 'making', 'in-mould', 'curing', 'cured', 'closed', 'abandoned')),
        formula_id uuid,
        formula_version_id uuid,
        maker_id uuid,
        mould_id uuid,
        bars integer check (bars between 1 and 2000),
        oil_mass_g double precision check (oil_mass_g > 0 and oil_mass_g <= 500000),
        -- The ratio is kept; the concentration follows from it, so the two can never disagree.
        water_to_lye double precision check (water_to_lye between 1.0 and 5.7),
        lye_concentration_fraction double precision generated always as (1 / (1 + water_to_lye)) stored,
        superfat_fraction double precision check (superfat_fraction between -0.02 and 0.30),
        superfat_weighed_fraction double precision check (superfat_weighed_fraction between -0.5 and 0.5),
        oil_temperature_c double precision check (oil_temperature_c between 5 and 120),
        lye_temperature_c double precision check (lye_temperature_c between 5 and 120),
        batter_temperature_c double precision check (batter_temperature_c between 5 and 120),
        scent_temperature_c double precision check (scent_temperature_c between 5 and 120),
        room_temperature_c double precision check (room_temperature_c between -5 and 50),
        humidity_fraction double precision check (humidity_fraction between 0.01 and 1),
        blend_seconds integer check (blend_seconds between 0 and 3600),
        trace_at_scent text check (trace_at_scent in ('emulsion', 'light', 'medium', 'thick', 'seized')),
        trace_at_pour text check (trace_at_pour in ('emulsion', 'light', 'medium', 'thick', 'seized')),
        minutes_to_pour double precision check (minutes_to_pour between 0 and 720),
        cover text check (cover in ('open', 'board', 'board-and-towel', 'oven', 'fridge', 'heat-mat')),
        is_sprayed boolean,
        gel text check (gel in ('none', 'partial', 'full', 'not-seen')),
        cook_temperature_c double precision check (cook_temperature_c between 40 and 130),
        cook_minutes double precision check (cook_minutes between 5 and 720),
        cook_loss_fraction double precision check (cook_loss_fraction between 0 and 0.4),
        mould_hours double precision check (mould_hours between 0.5 and 336),
        cut_hours double precision check (cut_hours between 0.5 and 720),
        unmoulded_on date,
        cut_on date,
        -- Sum of the fragrance lines' loads, share of the oils.
        fragrance_fraction double precision check (fragrance_fraction between 0 and 0.12),
        palette jsonb,
        has_embeds boolean not null default false,
        note text,
        hold_reason text,
        imported_by uuid,
        created_from text,
        created_at timestamptz not null default now(),
        updated_at timestamptz not null default now(),
        primary key (workshop_id, id),
        unique (workshop_id, code),
        foreign key (workshop_id, formula_id) references formula (workshop_id, id),
        foreign key (workshop_id, formula_version_id) references formula_version (workshop_id, id),
        foreign key (workshop_id, maker_id) references member (workshop_id, id),
        foreign key (workshop_id, mould_id) references mould (workshop_id, id)
      );
      create index batch_made_on on batch (workshop_id, made_on desc, id desc);
      create index batch_method on batch (workshop_id, method, made_on desc, id desc);
      create index batch_maker on batch (workshop_id, maker_id, made_on desc, id desc);
      create index batch_state on batch (workshop_id, state, made_on desc, id desc);
      create index batch_formula on batch (workshop_id, formula_id, made_on desc, id desc);

      -- What went in: fats, alkali, liquids, fragrances with their load, colourants, additives; lot where known.
      create table batch_ingredient (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        batch_id uuid not null,
        material_id uuid not null,
        lot_id uuid,
        mass_g double precision check (mass_g >= 0 and mass_g <= 500000),
        share_of_oils_fraction double precision check (share_of_oils_fraction between 0 and 2),
        position integer not null,
        primary key (workshop_id, id),
        foreign key (workshop_id, batch_id) references batch (workshop_id, id),
        foreign key (workshop_id, material_id) references material (workshop_id, id),
        foreign key (workshop_id, lot_id) references lot (workshop_id, id)
      );
      create index batch_ingredient_batch on batch_ingredient (workshop_id, batch_id, position);
      create index batch_ingredient_lot on batch_ingredient (workshop_id, lot_id, batch_id);
      create index batch_ingredient_material on batch_ingredient (workshop_id, material_id, batch_id);

      create table cook_stage (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        batch_id uuid not null,
        stage text not null check (stage in ('trace', 'separating', 'apple-sauce', 'mashed-potato', 'translucent', 'taffy')),
        minutes_from_start double precision not null check (minutes_from_start between 0 and 720),
        primary key (workshop_id, id),
        foreign key (workshop_id, batch_id) references batch (workshop_id, id)
      );
      create index cook_stage_batch on cook_stage (workshop_id, batch_id, minutes_from_start);

      create table inspection (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        version integer not null default 1,
        batch_id uuid not null,
        stage text not null check (stage in ('pour', 'unmould', 'cut', 'cure-w1', 'cure-w2', 'cure-w4', 'cure-w6', 'release', 'in-use')),
        inspected_at timestamptz not null,
        inspector_id uuid,
        bars_looked_at integer check (bars_looked_at between 0 and 2000),
        note text,
        created_from text,
        created_at timestamptz not null default now(),
        updated_at timestamptz not null default now(),
        primary key (workshop_id, id),
        foreign key (workshop_id, batch_id) references batch (workshop_id, id),
        foreign key (workshop_id, inspector_id) references member (workshop_id, id)
      );
      create index inspection_batch on inspection (workshop_id, batch_id, inspected_at);

      create table reading (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        batch_id uuid not null,
        inspection_id uuid,
        kind text not null,
        value double precision not null,
        bar integer,
        read_at timestamptz not null,
        primary key (workshop_id, id),
        foreign key (workshop_id, batch_id) references batch (workshop_id, id),
        foreign key (workshop_id, inspection_id) references inspection (workshop_id, id)
      );
      create index reading_batch on reading (workshop_id, batch_id, read_at);

      create table photo (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        version integer not null default 1,
        batch_id uuid,
        stage text check (stage in ('pour', 'unmould', 'cut', 'cure-w1', 'cure-w2', 'cure-w4', 'cure-w6', 'release', 'in-use')),
        taken_at timestamptz,
        taken_offset_minutes integer,
        camera text,
        file_name text,
        media_type text not null check (media_type in ('image/jpeg', 'image/png')),
        width integer not null,
        height integer not null,
        bytes integer not null,
        upload_sha256 text not null,
        stored_sha256 text not null,
        alt text,
        uploaded_by uuid,
        created_from text,
        created_at timestamptz not null default now(),
        updated_at timestamptz not null default now(),
        primary key (workshop_id, id),
        foreign key (workshop_id, batch_id) references batch (workshop_id, id),
        foreign key (workshop_id, uploaded_by) references member (workshop_id, id)
      );
      create index photo_batch on photo (workshop_id, batch_id, taken_at);

      -- One answer per fault of an inspection's checklist; a found one carries its finding.
      create table checklist_answer (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        inspection_id uuid not null,
        batch_id uuid not null,
        fault text not null,
        answer text not null check (answer in ('found', 'clear', 'not-checked')),
        primary key (workshop_id, id),
        unique (workshop_id, inspection_id, fault),
        foreign key (workshop_id, inspection_id) references inspection (workshop_id, id),
        foreign key (workshop_id, batch_id) references batch (workshop_id, id)
      );
      create index checklist_answer_batch on checklist_answer (workshop_id, batch_id);

      create table finding (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        version integer not null default 1,
        inspection_id uuid not null,
        batch_id uuid not null,
        fault text not null,
        severity smallint not null check (severity between 1 and 3),
        bars integer[],
        bars_affected integer check (bars_affected >= 0),
        bars_looked_at integer check (bars_looked_at >= 0),
        note text,
        withdrawn_at timestamptz,
        created_from text,
        created_at timestamptz not null default now(),
        updated_at timestamptz not null default now(),
        primary key (workshop_id, id),
        foreign key (workshop_id, inspection_id) references inspection (workshop_id, id),
        foreign key (workshop_id, batch_id) references batch (workshop_id, id),
        check (bars_affected <= bars_looked_at)
      );
      create unique index finding_fault on finding (workshop_id, inspection_id, fault) where withdrawn_at is null;
      create index finding_batch on finding (workshop_id, batch_id);

      -- Coordinates 0..1 of the upright picture.
      create table mark (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        finding_id uuid not null,
        photo_id uuid not null,
        shape text not null check (shape in ('point', 'box', 'outline')),
        x double precision not null check (x between 0 and 1),
        y double precision not null check (y between 0 and 1),
        width double precision check (width between 0 and 1),
        height double precision check (height between 0 and 1),
        outline jsonb,
        primary key (workshop_id, id),
        foreign key (workshop_id, finding_id) references finding (workshop_id, id),
        foreign key (workshop_id, photo_id) references photo (workshop_id, id)
      );
      create index mark_photo on mark (workshop_id, photo_id);
      create index mark_finding on mark (workshop_id, finding_id);

      create table disposition (
        workshop_id uuid not null references workshop (id) on delete cascade,
        id uuid not null,
        version integer not null default 1,
        batch_id uuid not null,
        kind text not null check (kind in ('firsts', 'seconds', 'rebatch', 'embeds', 'discarded', 'kept')),
        bars integer not null check (bars >= 0),
        fault text,
        note text,
        created_from text,
        created_at timestamptz not null default now(),
        updated_at timestamptz not null default now(),
        primary key (workshop_id, id),
        foreign key (workshop_id, batch_id) references batch (workshop_id, id)
      );
      create index disposition_batch on disposition (workshop_id, batch_id);

      -- What is known of each fault of a batch over all its inspections: 0 clear, 1..3 the worst severity found.
      -- Kept by trigger, one row a batch, so that log and board read one row a batch.
      create table batch_outcome (
        workshop_id uuid not null references workshop (id) on delete cascade,
        batch_id uuid not null,
        outcomes jsonb not null,
        found text[] not null,
        checked text[] not null,
        worst smallint not null,
        primary key (workshop_id, batch_id),
        foreign key (workshop_id, batch_id) references batch (workshop_id, id)
      );
      create index batch_outcome_found on batch_outcome using gin (found);
      create index batch_outcome_checked on batch_outcome using gin (checked);

      -- Looks up one batch at a time, and is planned anew each time: a join, or a plan kept from an empty
      -- workshop, is quadratic inside a large import, where no statistics are to be had yet.
      create function app.keep_outcomes() returns trigger language plpgsql as $$
      begin
        execute $statement$
        insert into batch_outcome (workshop_id, batch_id, outcomes, found, checked, worst)
        select w, b, coalesce(jsonb_object_agg(fault, worst order by fault) filter (where fault is not null), '{}'),
          coalesce(array_agg(fault order by fault) filter (where worst > 0), '{}'),
          coalesce(array_agg(fault order by fault) filter (where fault is not null), '{}'),
          coalesce(max(worst), 0)
        from (
          select t.workshop_id w, t.batch_id b, a.fault, max(a.severity) worst
          from (select distinct workshop_id, batch_id from touched) t
          left join lateral (
            select c.fault, case when c.answer = 'clear' then 0 else coalesce((
              select f.severity from finding f
              where f.workshop_id = c.workshop_id and f.inspection_id = c.inspection_id and f.fault = c.fault and f.withdrawn_at is null), 1) end severity
            from checklist_answer c
            where c.workshop_id = t.workshop_id and c.batch_id = t.batch_id and c.answer <> 'not-checked' offset 0
          ) a on true
          group by 1, 2, 3
        ) per_fault
        group by w, b
        on conflict (workshop_id, batch_id) do update
          set outcomes = excluded.outcomes, found = excluded.found, checked = excluded.checked, worst = excluded.worst
        $statement$;
        return null;
      end $$;
      create procedure app.keep_outcomes_of(relation regclass) language plpgsql as $$
      begin
        execute format('create trigger outcomes_after_insert after insert on %s referencing new table as touched for each statement execute function app.keep_outcomes()', relation);
        execute format('create trigger outcomes_after_update after update on %s referencing new table as touched for each statement execute function app.keep_outcomes()', relation);
      end $$;
    `);
    await runner.query('call app.keep_outcomes_of($1::regclass)', ['checklist_answer']);
    await runner.query('call app.keep_outcomes_of($1::regclass)', ['finding']);
    for (const table of [
      'mould', 'batch', 'batch_ingredient', 'cook_stage', 'inspection', 'reading', 'photo',
      'checklist_answer', 'finding', 'mark', 'disposition',
    ]) {
      await runner.query('call app.guard_tenant_table($1::regclass)', [table]);
      await runner.query('call app.keep_trail($1::regclass)', [table]);
    }
    await runner.query('call app.guard_tenant_table($1::regclass)', ['batch_outcome']);
    for (const table of ['batch', 'batch_ingredient', 'batch_outcome']) {
      await runner.query('call app.feeds_answers($1::regclass)', [table]);
    }
  }

  async down(): Promise<void> {
    throw new Error('Migrations go forward only');
  }
}
