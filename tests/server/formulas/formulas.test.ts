import { v7 as uuidv7 } from 'uuid';
import { describe, expect, it } from 'vitest';
import { appForFile } from '#tests/support/app.ts';
import { aWorkshop, type Person } from '#tests/support/world.ts';

const app = appForFile();

async function aFormula(owner: Person, name = 'Everyday'): Promise<{ id: string; materialId: string }> {
  const [id, materialId] = [uuidv7(), uuidv7()];
  await owner.post('/api/materials', { id: materialId, kind: 'fat', name: 'Olive oil', saponificationKohMgPerG: 190 }).expect(201);
  await owner.post('/api/formulas', { id, name, superfatFraction: 0.05, lines: [{ id: uuidv7(), materialId, shareOfOilsFraction: 1 }] }).expect(201);
  return { id, materialId };
}

describe('formulas', () => {
  it('show their quantities to owners and makers, and never to inspectors and viewers', async () => {
    const world = await aWorkshop(app());
    const { id } = await aFormula(world.owner);
    for (const role of ['owner', 'maker'] as const) {
      const person = role === 'owner' ? world.owner : await world.member(role);
      const { body } = await person.get(`/api/formulas/${id}`).expect(200);
      expect(body.versions[0].lines).toMatchObject([{ materialName: 'Olive oil', shareOfOilsFraction: 1 }]);
    }
    for (const role of ['inspector', 'viewer'] as const) {
      const person = await world.member(role);
      for (const answer of [await person.get(`/api/formulas/${id}`), await person.get('/api/formulas')]) {
        expect(answer.status).toBe(200);
        expect(answer.text).not.toMatch(/shareOfOils|superfat|Olive/);
      }
    }
  });

  it('have a name that is used once, whatever its case', async () => {
    const { owner } = await aWorkshop(app());
    await aFormula(owner, 'Kitchen');
    await owner.post('/api/formulas', { id: uuidv7(), name: 'kitchen' }).expect(409);
  });

  it('name the line whose material is unknown', async () => {
    const { owner } = await aWorkshop(app());
    const { body } = await owner.post('/api/formulas', { id: uuidv7(), name: 'Odd', lines: [{ id: uuidv7(), materialId: uuidv7(), shareOfOilsFraction: 1 }] }).expect(422);
    expect(body.errors[0].pointer).toBe('#/lines/0/materialId');
  });

  it('are renamed by those who may, against the version they saw', async () => {
    const world = await aWorkshop(app());
    const { id } = await aFormula(world.owner);
    await (await world.member('inspector')).patch(`/api/formulas/${id}`, { name: 'X' }, 1).expect(403);
    await world.owner.patch(`/api/formulas/${id}`, { name: 'Everyday white' }, 1).expect(200);
    await world.owner.patch(`/api/formulas/${id}`, { name: 'Y' }, 1).expect(412);
    const other = await aWorkshop(app());
    await other.owner.patch(`/api/formulas/${id}`, { name: 'Z' }, 2).expect(404);
  });
});
