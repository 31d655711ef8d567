import request from 'supertest';
import { describe, expect, it } from 'vitest';
import { appForFile } from '#tests/support/app.ts';
import { aWorkshop } from '#tests/support/world.ts';

const app = appForFile();

describe('GET /api/faults', () => {
  it('tells a viewer of each fault what it looks like, how severe it can be and where it can be answered', async () => {
    const world = await aWorkshop(app());
    const { body } = await (await world.member('viewer')).get('/api/faults').expect(200);
    expect(body.items).toHaveLength(35);
    expect(body.items[0]).toMatchObject({ slug: 'soda-ash', name: 'Soda ash', kind: 'cosmetic', firstSeen: 'unmould', extentUnit: 'bars' });
    const pockets = body.items.find(({ slug }: { slug: string }) => slug === 'lye-pockets');
    expect(pockets.criteria).toEqual([null, null, 'Any lye pocket: gloves on, hold the whole batch']);
    expect(pockets.disposition).toBe('Severity 3: hold the batch');
    expect(pockets.checklist).toContainEqual({ stage: 'pour', answer: 'cannot' });
    expect(pockets.checklist).toContainEqual({ stage: 'cut', answer: 'must' });
    const falseTrace = body.items.find(({ slug }: { slug: string }) => slug === 'false-trace');
    expect(falseTrace.methodFamilies).toEqual(['cold']);
  });

  it('is closed to strangers', async () => {
    await request(app().url).get('/api/faults').expect(401);
  });
});
