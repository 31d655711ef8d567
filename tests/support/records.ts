import { v7 as uuidv7 } from 'uuid';
import type { Person, World } from './world.ts';

/** Adds a material; gives its id. */
export async function aMaterial(person: Person, over: object = {}): Promise<string> {
  const id = uuidv7();
  await person.post('/api/materials', { id, kind: 'fragrance', name: 'Harbour Fog', ...over }).expect(201);
  return id;
}

/** Adds a lot of a material; gives its id. */
export async function aLot(person: Person, over: { materialId?: string; code?: string; [field: string]: unknown } = {}): Promise<string> {
  const id = uuidv7();
  await person.post('/api/lots', { id, materialId: over.materialId ?? (await aMaterial(person)), code: `HF-${id.slice(-4)}`, ...over }).expect(201);
  return id;
}

/** Wish for a batch with the fewest words. */
export function aBatchWish(over: object = {}) {
  return { id: uuidv7(), madeOn: '2026-03-14', method: 'cold', ...over };
}

/** Logs a batch; gives its id. */
export async function aBatch(person: Person, over: object = {}): Promise<string> {
  const wish = aBatchWish(over);
  await person.post('/api/batches', wish).expect(201);
  return wish.id;
}

/** What a look answered, written straight into the tables: a number is the severity found, 0 is clear. */
export async function aLook(world: World, batchId: string, answers: Record<string, number>, inspectedAt = '2026-03-20T09:00:00Z'): Promise<void> {
  const inspectionId = uuidv7();
  await world.sql(`insert into inspection (workshop_id, id, batch_id, stage, inspected_at) values ($1, $2, $3, 'cut', $4)`, [world.workshopId, inspectionId, batchId, inspectedAt]);
  for (const [fault, severity] of Object.entries(answers)) {
    if (severity > 0) {
      await world.sql('insert into finding (workshop_id, id, inspection_id, batch_id, fault, severity) values ($1, $2, $3, $4, $5, $6)', [world.workshopId, uuidv7(), inspectionId, batchId, fault, severity]);
    }
    await world.sql('insert into checklist_answer (workshop_id, id, inspection_id, batch_id, fault, answer) values ($1, $2, $3, $4, $5, $6)', [world.workshopId, uuidv7(), inspectionId, batchId, fault, severity > 0 ? 'found' : 'clear']);
  }
}
