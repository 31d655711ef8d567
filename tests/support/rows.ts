import { v7 as uuidv7 } from 'uuid';
import type { World } from './world.ts';

/** A batch written straight into its table, for tests that are about something else. */
export async function aBatchRow(world: World, over: Record<string, unknown> = {}): Promise<string> {
  const row: Record<string, unknown> = { workshop_id: world.workshopId, id: uuidv7(), code: `T-${uuidv7().slice(-6)}`, made_on: '2026-03-02', method: 'cold', state: 'in-mould', bars: 10, ...over };
  const names = Object.keys(row);
  await world.sql(`insert into batch (${names.join(', ')}) values (${names.map((_name, index) => `$${index + 1}`).join(', ')})`, Object.values(row));
  return String(row['id']);
}

/** A photo's row without its picture. */
export async function aPhotoRow(world: World, batchId: string | null): Promise<string> {
  const id = uuidv7();
  await world.sql(
    `insert into photo (workshop_id, id, batch_id, media_type, width, height, bytes, upload_sha256, stored_sha256) values ($1, $2, $3, 'image/jpeg', 40, 30, 900, 'a', 'b')`,
    [world.workshopId, id, batchId],
  );
  return id;
}
