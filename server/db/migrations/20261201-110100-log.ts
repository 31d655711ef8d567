import type { MigrationInterface, QueryRunner } from 'typeorm';

/** An outcome row for every batch from its first moment, and an index for each sort of the log. */
export class Log20261201110100 implements MigrationInterface {
  name = 'Log20261201110100';

  async up(runner: QueryRunner): Promise<void> {
    await runner.query(`
      -- -1: nothing answered yet, 0: all that was answered is clear, 1..3: worst severity found.
      create or replace function app.keep_outcomes() returns trigger language plpgsql as $$
      begin
        insert into batch_outcome (workshop_id, batch_id, outcomes, found, checked, worst)
        select w, b, coalesce(jsonb_object_agg(fault, worst order by fault) filter (where fault is not null), '{}'),
          coalesce(array_agg(fault order by fault) filter (where worst > 0), '{}'),
          coalesce(array_agg(fault order by fault) filter (where fault is not null), '{}'),
          coalesce(max(worst) filter (where fault is not null), -1)
        from (
          select t.workshop_id w, t.batch_id b, a.fault,
            max(case when a.answer = 'found' then coalesce(f.severity, 1) else 0 end) worst
          from (select distinct workshop_id, batch_id from touched) t
          left join checklist_answer a on a.workshop_id = t.workshop_id and a.batch_id = t.batch_id and a.answer <> 'not-checked'
          left join finding f on f.workshop_id = a.workshop_id and f.inspection_id = a.inspection_id and f.fault = a.fault and f.withdrawn_at is null
          group by 1, 2, 3
        ) per_fault
        group by w, b
        on conflict (workshop_id, batch_id) do update
          set outcomes = excluded.outcomes, found = excluded.found, checked = excluded.checked, worst = excluded.worst;
        return null;
      end $$;

      create function app.start_outcomes() returns trigger language plpgsql as $$
      begin
        insert into batch_outcome (workshop_id, batch_id, outcomes, found, checked, worst)
        select workshop_id, id, '{}', '{}', '{}', -1 from logged
        on conflict (workshop_id, batch_id) do nothing;
        return null;
      end $$;
      create trigger outcomes_start after insert on batch referencing new table as logged for each statement execute function app.start_outcomes();
    `);
    await runner.query(`
      create index batch_outcome_worst on batch_outcome (workshop_id, worst, batch_id);
      create index batch_water on batch (workshop_id, (coalesce(water_to_lye, '-1'::double precision)), id);
      create index batch_water_rising on batch (workshop_id, (coalesce(water_to_lye, '1000000'::double precision)), id);
      create index batch_oils on batch (workshop_id, (coalesce(oil_temperature_c, '-1'::double precision)), id);
      create index batch_oils_rising on batch (workshop_id, (coalesce(oil_temperature_c, '1000000'::double precision)), id);
      create index batch_load on batch (workshop_id, (coalesce(fragrance_fraction, '-1'::double precision)), id);
      create index batch_load_rising on batch (workshop_id, (coalesce(fragrance_fraction, '1000000'::double precision)), id);
    `);
    await runner.query(`
      do $$
      declare one record;
      begin
        -- The wall stands for the owning role too, so old batches are gone through workshop by workshop.
        alter table workshop no force row level security;
        for one in select id from workshop loop
          perform set_config('app.workshop_id', one.id::text, true);
          insert into batch_outcome (workshop_id, batch_id, outcomes, found, checked, worst)
            select workshop_id, id, '{}', '{}', '{}', -1 from batch on conflict do nothing;
          update batch_outcome set worst = -1 where cardinality(checked) = 0;
        end loop;
        alter table workshop force row level security;
      end $$;
    `);
  }

  async down(): Promise<void> {
    throw new Error('Migrations go forward only');
  }
}
