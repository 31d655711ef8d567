import { v7 as uuidv7 } from 'uuid';
import { randomFrom } from '#analysis/maths/random.ts';
import type { World } from './world.ts';

export interface PlantedHistory {
  badLot: string;
  goodLots: string[];
  /** Makes nearly all batches of the bad lot, and is innocent. */
  unlucky: string;
  other: string;
}

/**
 * A workshop with one bad scent lot in cold batches, most of them by one maker who does nothing wrong: 120 cold
 * and 36 hot batches. The bad lot moved fast in 9 of 12 cold batches and in none of 6 hot ones.
 */
export async function plantedHistory(world: World): Promise<PlantedHistory> {
  const random = randomFrom(77);
  const ws = world.workshopId;
  const [material, badLot, unlucky, other] = [uuidv7(), uuidv7(), (await world.member('maker')).memberId, (await world.member('maker')).memberId];
  const goodLots = [uuidv7(), uuidv7(), uuidv7(), uuidv7()];
  await world.sql(`insert into material (workshop_id, id, kind, name) values ($1, $2, 'fragrance', 'Harbour Fog')`, [ws, material]);
  for (const [i, id] of [badLot, ...goodLots].entries()) {
    await world.sql('insert into lot (workshop_id, id, material_id, code, vanillin_fraction) values ($1, $2, $3, $4, 0)', [ws, id, material, `HF-${100 + i}`]);
  }
  const batches = Array.from({ length: 156 }, (_, i) => {
    const hot = i >= 120;
    const isBad = hot ? i < 126 : i < 12;
    return {
      id: uuidv7(), code: `P-${String(i).padStart(3, '0')}`, method: hot ? 'hot' : 'cold', day: i,
      lot: isBad ? badLot : goodLots[i % 4], maker: (isBad && !hot ? i % 6 !== 0 : random.next() < 0.45) ? unlucky : other,
      water: hot ? 2.5 + random.next() * 0.1 : 1.7 + random.next() * 0.6, fast: isBad && !hot && i % 4 !== 3 ? 2 : !hot && !isBad && random.next() < 0.05 ? 1 : 0,
    };
  });
  await world.sql(
    `insert into batch (workshop_id, id, code, made_on, method, state, maker_id, water_to_lye, fragrance_fraction)
     select $1, id, code, date '2025-01-06' + day, method, 'closed', maker, water, 0.03 from jsonb_to_recordset($2::jsonb) as r (id uuid, code text, day int, method text, maker uuid, water float)`,
    [ws, JSON.stringify(batches)]);
  await world.sql(
    `insert into batch_ingredient (workshop_id, id, batch_id, material_id, lot_id, share_of_oils_fraction, position)
     select $1, gen_random_uuid(), id, $3, lot, 0.03, 0 from jsonb_to_recordset($2::jsonb) as r (id uuid, lot uuid)`, [ws, JSON.stringify(batches), material]);
  await world.sql(
    `update batch_outcome o set outcomes = jsonb_build_object('acceleration', fast), found = case when fast > 0 then array['acceleration'] else '{}' end, checked = array['acceleration'], worst = fast
     from jsonb_to_recordset($1::jsonb) as r (id uuid, fast int) where o.batch_id = r.id`, [JSON.stringify(batches)]);
  return { badLot, goodLots, unlucky, other };
}
