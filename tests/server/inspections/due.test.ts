import { describe, expect, it } from 'vitest';
import { dueLooks } from '#server/features/inspections/due.ts';
import { byLikelihood } from '#server/features/inspections/likely.ts';
import { dayIn } from '#shared/units/zones.ts';
import { appForFile } from '#tests/support/app.ts';
import { aFinding, aLook } from '#tests/support/looks.ts';
import { aBatchRow } from '#tests/support/rows.ts';
import { aWorkshop } from '#tests/support/world.ts';

const app = appForFile();
const cold = { method: 'cold', state: 'curing', madeOn: '2026-03-02', unmouldedOn: '2026-03-03', cutOn: '2026-03-03', linoleicRich: false } as const;
const told = (looks: ReturnType<typeof dueLooks>) => looks.map(({ stage, standing, daysLate }) => `${stage} ${standing} ${daysLate}`);

describe('looks that a batch wants', () => {
  it('asks for the cut until five days after it as late, then as overdue, never dropping it', () => {
    const looked = ['pour', 'unmould'] as const;
    expect(told(dueLooks({ ...cold, looked }, '2026-03-03'))).toEqual(['cut due 0', 'cure-w1 coming 0']);
    expect(told(dueLooks({ ...cold, looked }, '2026-03-06'))).toEqual(['cut late 3', 'cure-w1 coming 0']);
    expect(told(dueLooks({ ...cold, looked }, '2026-03-09'))).toEqual(['cut overdue 6', 'cure-w1 due 0', 'cure-w2 coming 0']);
    expect(told(dueLooks({ ...cold, looked }, '2026-04-05'))[0]).toBe('cut overdue 33');
  });

  it('takes off what was looked at, and what a later look has overtaken', () => {
    expect(told(dueLooks({ ...cold, looked: ['cut'] }, '2026-03-09'))).toEqual(['cure-w1 due 0', 'cure-w2 coming 0']);
    expect(told(dueLooks({ ...cold, looked: ['in-use'] }, '2026-03-03'))).toEqual(['pour late 1', 'unmould due 0', 'cut due 0', 'cure-w1 coming 0']);
  });

  it('asks for one cure check at a time: nobody can see week 1 in week 2', () => {
    const looked = ['cut'] as const;
    expect(told(dueLooks({ ...cold, looked }, '2026-03-13'))).toEqual(['cure-w1 late 2', 'cure-w2 coming 0']);
    expect(told(dueLooks({ ...cold, looked }, '2026-03-14'))).toEqual(['cure-w2 due 0', 'cure-w4 coming 0']);
    expect(told(dueLooks({ ...cold, looked }, '2026-05-01'))).toEqual(['cure-w6 overdue 16', 'release overdue 18']);
  });

  it('asks nothing of a batch that is planned, closed or abandoned', () => {
    for (const state of ['planned', 'closed', 'abandoned'] as const) expect(dueLooks({ ...cold, state, looked: [] }, '2026-03-09')).toEqual([]);
  });
});

describe('GET /api/inspections/due', () => {
  it('tells the most urgent first, with the faults that must be answered', async () => {
    const world = await aWorkshop(app());
    await aBatchRow(world, { code: 'T-1', made_on: '2026-03-02', method: 'hot' });
    await aBatchRow(world, { code: 'T-2', made_on: '2026-03-05' });
    await aBatchRow(world, { code: 'T-3', made_on: '2026-03-05', state: 'closed' });
    const { body } = await world.owner.get('/api/inspections/due?on=2026-03-06').expect(200);
    expect(body.items.map((item: Record<string, unknown>) => `${item['batchCode']} ${item['stage']} ${item['standing']}`)).toEqual([
      'T-1 pour late', 'T-1 unmould late', 'T-1 cut late', 'T-2 pour late', 'T-2 unmould due', 'T-2 cut coming', 'T-1 cure-w1 coming', 'T-2 cure-w1 coming',
    ]);
    expect(body.items[3].mustAnswer).toEqual(['ricing', 'acceleration', 'seizing', 'separation', 'false-trace', 'volcano']);
    await world.owner.get('/api/inspections/due?on=tomorrow').expect(422);
  });

  it('goes by the calendar of the workshop, not of the server', async () => {
    expect(dayIn('Pacific/Auckland', new Date('2026-03-03T23:30:00Z'))).toBe('2026-03-04');
    expect(dayIn('America/Los_Angeles', new Date('2026-03-04T05:00:00Z'))).toBe('2026-03-03');
    const world = await aWorkshop(app());
    const zones = ['Pacific/Kiritimati', 'Pacific/Pago_Pago'];
    const days: string[] = [];
    for (const zone of zones) {
      await world.sql('update workshop set time_zone = $2 where id = $1', [world.workshopId, zone]);
      const today = dayIn(zone, new Date());
      const code = `T-${zone}`;
      await aBatchRow(world, { code, made_on: today });
      const { body } = await world.owner.get('/api/inspections/due').expect(200);
      const pour = body.items.find((item: Record<string, unknown>) => item['batchCode'] === code && item['stage'] === 'pour');
      expect(pour).toMatchObject({ standing: 'due', daysLate: 0 });
      days.push(today);
    }
    expect(days[0]).not.toBe(days[1]);
  });

  it('looks in week 6 of a hot batch whose oils spoil soon', async () => {
    const world = await aWorkshop(app());
    const materialId = '01890000-0000-7000-8000-0000000000f1';
    await world.sql(`insert into material (workshop_id, id, kind, name, is_linoleic_rich) values ($1, $2, 'fat', 'Sunflower', true)`, [world.workshopId, materialId]);
    for (const [code, share] of [['T-few', 0.1], ['T-much', 0.3]] as const) {
      const batchId = await aBatchRow(world, { code, method: 'hot', made_on: '2026-03-02', state: 'curing' });
      await world.sql('insert into batch_ingredient (workshop_id, id, batch_id, material_id, share_of_oils_fraction, position) values ($1, $2, $2, $3, $4, 1)', [world.workshopId, batchId, materialId, share]);
      await world.owner.post(`/api/batches/${batchId}/inspections`, aLook({ stage: 'cure-w4', inspectedAt: '2026-03-30T10:00:00Z' })).expect(201);
    }
    const { body } = await world.owner.get('/api/inspections/due?on=2026-04-12').expect(200);
    expect(body.items.filter(({ stage }: { stage: string }) => stage === 'cure-w6').map(({ batchCode }: { batchCode: string }) => batchCode)).toEqual(['T-much']);
  });
});

describe('likely faults', () => {
  const counts = (fault: string, all: [number, number], sameMethod: [number, number] = [0, 0], sameLots: [number, number] = [0, 0]) => {
    const of = ([found, checked]: [number, number]) => ({ found, checked });
    return { fault, all: of(all), sameMethod: of(sameMethod), sameLots: of(sameLots) };
  };

  it('leans lots on method and method on all, and keeps the order of ties', () => {
    const faults = [counts('rare', [0, 100]), counts('usual', [30, 100], [30, 60]), counts('of-the-lot', [5, 100], [5, 60], [5, 5]), counts('never-looked', [0, 0]), counts('once', [1, 1])];
    expect(byLikelihood(faults).map(({ fault }) => fault)).toEqual(['of-the-lot', 'usual', 'once', 'never-looked', 'rare']);
    expect(byLikelihood([counts('a', [0, 0]), counts('b', [0, 0])]).map(({ fault }) => fault)).toEqual(['a', 'b']);
  });

  it('puts what this workshop found at the stage first, and what this batch’s scent lot brought before that', async () => {
    const world = await aWorkshop(app());
    const [materialId, lotId] = ['01890000-0000-7000-8000-0000000000a1', '01890000-0000-7000-8000-0000000000b1'];
    await world.sql(`insert into material (workshop_id, id, kind, name) values ($1, $2, 'fragrance', 'Pine')`, [world.workshopId, materialId]);
    await world.sql(`insert into lot (workshop_id, id, material_id, code) values ($1, $2, $3, 'PN-1')`, [world.workshopId, lotId, materialId]);
    const withLot: string[] = [];
    for (let index = 0; index < 8; index += 1) {
      const batchId = await aBatchRow(world);
      const scented = index < 3;
      if (scented) {
        await world.sql('insert into batch_ingredient (workshop_id, id, batch_id, material_id, lot_id, position) values ($1, $2, $2, $3, $4, 1)', [world.workshopId, batchId, materialId, lotId]);
        withLot.push(batchId);
      }
      const findings = scented ? [aFinding({ fault: 'ricing' })] : [aFinding({ fault: 'soda-ash', severity: 1 })];
      const clear = scented ? [{ fault: 'soda-ash', answer: 'clear' }] : [{ fault: 'ricing', answer: 'clear' }];
      await world.owner.post(`/api/batches/${batchId}/inspections`, aLook({ findings, answers: clear })).expect(201);
    }
    const { body: any } = await world.owner.get('/api/inspections/likely-faults?stage=cut').expect(200);
    expect(any.items.slice(0, 2)).toEqual([{ fault: 'soda-ash', found: 5, checked: 8 }, { fault: 'ricing', found: 3, checked: 8 }]);
    const { body: scented } = await world.owner.get(`/api/inspections/likely-faults?stage=cut&batchId=${withLot[0]}`).expect(200);
    expect(scented.items[0].fault).toBe('ricing');
    expect(scented.items.map(({ fault }: { fault: string }) => fault)).not.toContain('wrap-marks');
    const there = await aWorkshop(app());
    await there.owner.get(`/api/inspections/likely-faults?stage=cut&batchId=${withLot[0]}`).expect(404);
    const { body: empty } = await there.owner.get('/api/inspections/likely-faults?stage=cut').expect(200);
    expect(empty.items.every(({ checked }: { checked: number }) => checked === 0)).toBe(true);
  });
});
