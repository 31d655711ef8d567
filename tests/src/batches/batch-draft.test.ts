import { describe, expect, it } from 'vitest';
import type { BatchView } from '#shared/batches.ts';
import { NewBatch } from '#shared/batches.ts';
import { changeBetween, draftOf, duplicateOf, emptyDraft, meet } from '#src/features/batches/batch-draft.ts';
import { clockIn, instantAt } from '#src/lib/zoned.ts';

const ID = '0190a0a0-0000-7000-8000-000000000001';
const NEW_ID = '0190a0a0-0000-7000-8000-000000000002';
const LINE = { id: '0190a0a0-0000-7000-8000-000000000003', materialId: ID, lotId: ID, massG: 30, shareOfOilsFraction: 0.03 };

function aView(over: Partial<BatchView> = {}): BatchView {
  const { code: _code, ...fields } = emptyDraft(ID, '2026-03-14');
  return {
    ...fields, version: 3, createdAt: '', updatedAt: '', code: 'QL-0068', family: 'cold', state: 'closed', formulaName: 'Everyday', formulaVersionNumber: 1, makerName: 'Tomasz', mouldName: 'M1',
    lyeConcentrationFraction: 0.3, superfatWeighedFraction: 0.05, fragranceFraction: 0.03, holdReason: null, found: [{ fault: 'ricing', severity: 2 }], clear: ['soda-ash'],
    dispositions: [{ kind: 'firsts', bars: 10, fault: null }], lostMinor: 300, seesQuantities: true, bars: 12, waterToLye: 2.34, oilTemperatureC: 36, cutOn: '2026-03-15', note: 'Spooned in',
    ingredients: [{ ...LINE, materialName: 'Ember Fig', kind: 'fragrance', lotCode: 'EF-7802', lotStanding: 'in-use' }], ...over,
  };
}

describe('the draft of a batch', () => {
  it('starts as a batch that the schema takes', () => {
    expect(NewBatch.safeParse(emptyDraft(ID, '2026-03-14')).success).toBe(true);
  });

  it('holds what is kept, and nothing that is worked out or found', () => {
    const draft = draftOf(aView());
    expect(NewBatch.safeParse(draft).success).toBe(true);
    expect(draft).toMatchObject({ waterToLye: 2.34, bars: 12, ingredients: [LINE] });
    expect(Object.keys(draft)).not.toContain('found');
  });

  it('duplicates all inputs under a new id, without code, days of its own or outcome', () => {
    const draft = duplicateOf(aView(), NEW_ID, '2026-05-01');
    expect(NewBatch.safeParse(draft).success).toBe(true);
    expect(draft).toMatchObject({ id: NEW_ID, madeOn: '2026-05-01', state: 'planned', waterToLye: 2.34, oilTemperatureC: 36, cutOn: null, note: null, ingredients: [{ materialId: ID, lotId: ID, massG: 30 }] });
    expect(draft.code).toBeUndefined();
    expect(draft.ingredients[0]?.id).not.toBe(LINE.id);
  });

  it('sends only what was changed', () => {
    const draft = draftOf(aView());
    expect(changeBetween(draft, { ...draft })).toEqual({});
    expect(changeBetween(draft, { ...draft, bars: 11, ingredients: [] })).toEqual({ bars: 11, ingredients: [] });
  });

  it('tells what only they changed from what both did', () => {
    const start = draftOf(aView());
    const mine = { ...start, bars: 11, oilTemperatureC: 40, gel: 'full' as const };
    const current = draftOf(aView({ bars: 10, humidityFraction: 0.5, gel: 'full' }));
    expect(meet(start, mine, current)).toEqual({ theirs: { humidityFraction: 0.5 }, both: ['bars'] });
  });
});

describe('times on the workshop’s clock', () => {
  it.each([['2026-01-14T09:30', 'Europe/London', '2026-01-14T09:30:00.000Z'], ['2026-07-14T09:30', 'Europe/London', '2026-07-14T08:30:00.000Z'], ['2026-07-14T23:30', 'America/Los_Angeles', '2026-07-15T06:30:00.000Z'], ['2026-03-29T03:30', 'Europe/Berlin', '2026-03-29T01:30:00.000Z']])(
    'takes %s in %s for %s', (clock, zone, instant) => {
      expect(instantAt(clock, zone)).toBe(instant);
      expect(clockIn(instant, zone)).toBe(clock);
    });
});
