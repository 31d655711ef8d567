import { v7 as uuidv7 } from 'uuid';
import { aPhoto } from './pictures.ts';
import type { World } from './world.ts';

/** One record of each kind in a workshop, by the name of the path parameter that leads to it. */
export async function recordsOfEachKind({ workshopId, owner, sql }: World): Promise<Record<string, string>> {
  const ids = Object.fromEntries(
    ['supplierId', 'materialId', 'lotId', 'formulaId', 'batchId', 'inspectionId', 'findingId', 'photoId', 'importId', 'claimId'].map((name) => [name, uuidv7()]),
  ) as Record<string, string>;
  const insert = (table: string, columns: Record<string, unknown>) =>
    sql(`insert into ${table} (workshop_id, ${Object.keys(columns).join(', ')}) values ($1, ${Object.keys(columns).map((_column, index) => `$${index + 2}`).join(', ')})`, [workshopId, ...Object.values(columns)]);
  await insert('supplier', { id: ids['supplierId'], name: 'Wall Test Supplies' });
  await insert('material', { id: ids['materialId'], kind: 'fragrance', name: 'Wall Test Scent' });
  await insert('lot', { id: ids['lotId'], material_id: ids['materialId'], supplier_id: ids['supplierId'], code: 'WT-1' });
  await insert('formula', { id: ids['formulaId'], name: 'Wall Test' });
  await insert('batch', { id: ids['batchId'], code: 'WT-0001', made_on: '2026-01-05', method: 'cold', state: 'curing', bars: 12 });
  await insert('inspection', { id: ids['inspectionId'], batch_id: ids['batchId'], stage: 'cut', inspected_at: '2026-01-07T09:00:00Z' });
  await insert('checklist_answer', { id: uuidv7(), inspection_id: ids['inspectionId'], batch_id: ids['batchId'], fault: 'soda-ash', answer: 'found' });
  await insert('finding', { id: ids['findingId'], inspection_id: ids['inspectionId'], batch_id: ids['batchId'], fault: 'soda-ash', severity: 1 });
  await insert('import', { id: ids['importId'], file_name: 'x.csv', state: 'uploaded', encoding: 'UTF-8', delimiter: ',', content: 'batch_code,made_on,method\r\nX,2026-01-01,cold', heads: JSON.stringify(['batch_code', 'made_on', 'method']), samples: '[[],[],[]]', row_count: 1, mapping: JSON.stringify({ targets: ['batch_code', 'made_on', 'method'], units: { temperature: 'celsius', share: 'percent', day: 'year-month-day', decimal: 'point' }, create: { lots: true, formulas: true, people: true, moulds: true, colourants: true } }) });
  await aPhoto(owner, { ids: ids['photoId'] ?? '', batchId: ids['batchId'] ?? '' });
  await insert('claim', { id: ids['claimId'], number: 1, supplier_id: ids['supplierId'], title: 'Wall test', lot_ids: `{${ids['lotId']}}`, faults: '{ricing}' });
  return { ...ids, memberId: owner.memberId };
}
