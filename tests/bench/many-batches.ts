import type { World } from '#tests/support/world.ts';

/**
 * Fills a workshop with `n` batches over ten years, each with three lots and its outcomes, by plain SQL and
 * with triggers off: a person's work of decades in half a minute.
 */
export async function manyBatches(world: World, n: number): Promise<void> {
  const ws = world.workshopId;
  const tables = ['batch', 'batch_ingredient', 'disposition'];
  for (const table of tables) await world.sql(`alter table ${table} disable trigger user`);
  await world.sql(`update workshop set first_price_minor = 750, second_price_minor = 400 where id = $1`, [ws]);
  await world.sql(`insert into material (workshop_id, id, kind, name) select $1, gen_random_uuid(), case when m <= 10 then 'fragrance' else 'fat' end, 'Material ' || m from generate_series(1, 20) m`, [ws]);
  await world.sql(`insert into lot (workshop_id, id, material_id, code) select $1, gen_random_uuid(), m.id, 'L-' || row_number() over () from material m, generate_series(1, 20)`, [ws]);
  await world.sql(`insert into formula (workshop_id, id, name) select $1, gen_random_uuid(), 'Formula ' || f from generate_series(1, 12) f`, [ws]);
  await world.sql(
    `insert into batch (workshop_id, id, code, made_on, method, state, formula_id, maker_id, bars, water_to_lye, oil_temperature_c, superfat_fraction, fragrance_fraction, note)
     select $1, gen_random_uuid(), 'T-' || lpad(n::text, 6, '0'), date '2016-01-01' + n * 3650 / $2, (array['cold', 'cold', 'cold-oven', 'hot', 'hot-fluid'])[1 + n % 5],
       (array['curing', 'closed', 'closed', 'cured'])[1 + n % 4], f.ids[1 + n % 12], $3, 12, case when n % 10 > 0 then round((1.5 + random() * 1.5)::numeric, 2) end,
       case when n % 7 > 0 then round((30 + random() * 50)::numeric) end, 0.05, round((random() * 0.05)::numeric, 3), 'Note of batch ' || n
     from generate_series(1, $2::int) n, (select array_agg(id) ids from formula) f`, [ws, n, world.owner.memberId]);
  await world.sql(
    `insert into batch_ingredient (workshop_id, id, batch_id, material_id, lot_id, mass_g, position)
     select $1, gen_random_uuid(), b.id, (l.materials)[k.i], (l.lots)[k.i], 100, p
     from batch b, generate_series(0, 2) p, lateral (select 1 + (abs(hashtext(b.id::text || p)) % 400) i) k,
       (select array_agg(id) lots, array_agg(material_id) materials from lot) l`, [ws]);
  // Each of 30 faults answered for four of five batches; the first ones found more often, the last nearly never.
  await world.sql(
    `insert into batch_outcome (workshop_id, batch_id, outcomes, found, checked, worst)
     select $1, b.id, jsonb_object_agg(a.fault, a.severity), coalesce(array_agg(a.fault) filter (where a.severity > 0), '{}'), array_agg(a.fault), max(a.severity)
     from batch b, lateral (
       select 'fault-' || k fault, case when random() < 0.25 / k ^ 1.5 then 1 + floor(random() * 3)::int else 0 end severity
       from generate_series(1, 30) k where (hashtext(b.id::text) + k) % 5 <> 0) a
     group by b.id`, [ws]);
  await world.sql(
    `insert into disposition (workshop_id, id, batch_id, kind, bars)
     select $1, gen_random_uuid(), b.id, k.kind, k.bars from batch b, (values ('firsts', 8), ('seconds', 3), ('kept', 1)) k (kind, bars)`, [ws]);
  for (const table of tables) await world.sql(`alter table ${table} enable trigger user`);
  for (const table of [...tables, 'batch_outcome', 'lot', 'material']) await world.sql(`analyze ${table}`);
}
