import { describe, expect, it, test } from 'vitest';
import { batchWarnings, type WarnedBatch, type WarnedLot } from '#shared/batch-warnings.ts';
import { NewBatch } from '#shared/batches.ts';
import { fragranceInBar } from '#shared/fragrance-allowance.ts';
import type { MaterialKind } from '#shared/words/lot-words.ts';

const ID = '0190a0a0-0000-7000-8000-000000000001';
const line = (kind: MaterialKind, over: object = {}) => ({ id: ID, materialId: ID, lotId: null, massG: null, shareOfOilsFraction: null, kind, ...over });
const aBatch = (over: Partial<WarnedBatch> = {}): WarnedBatch => ({ ...NewBatch.parse({ id: ID, madeOn: '2026-03-14', method: 'cold' }), ...over }) as WarnedBatch;
const aLot = (over: Partial<WarnedLot> = {}): WarnedLot => ({
  id: 'scent', code: 'EF-7802', materialName: 'Ember Fig', materialKind: 'fragrance', standing: 'in-use', bestBeforeOn: null, certificateMaxFraction: 0.05, flashPointC: null, ...over,
});
const fields = (over: Partial<WarnedBatch>, lots: WarnedLot[] = []) => batchWarnings(aBatch(over), lots).map(({ pointer }) => pointer);

/** Olive 450, coconut 280, shea 170, castor 100; 5 % superfat, NaOH 98.5 %, ratio 2, 3 % fragrance, 6 g mica. */
const exampleA = (fragranceG: number) => aBatch({
  oilMassG: 1000, waterToLye: 2, superfatFraction: 0.05,
  ingredients: [
    line('fat', { massG: 450 }), line('fat', { massG: 280 }), line('fat', { massG: 170 }), line('fat', { massG: 100 }),
    line('alkali', { massG: 141.677954 }), line('colourant', { massG: 6 }), line('fragrance', { massG: fragranceG, lotId: 'scent' }),
  ],
});

describe('fragranceInBar', () => {
  // Reckoned by hand from the same masses: charged 1461.0339 g, cure loss 11 %, maximum 2.30 %.
  const restG = 1000 + 141.677954 + 283.355908 + 6;

  it('takes the share of the finished bar, not of the oils', () => {
    const { fraction, used, largestG } = fragranceInBar([{ massG: 30, maximum: 0.023 }], restG, 0.89);
    expect(fraction).toBeCloseTo(0.023071, 6);
    expect(used).toBeGreaterThan(1);
    // As printed, to its four decimals.
    expect(Math.abs(largestG - 29.9054)).toBeLessThan(5e-5);
    expect(fragranceInBar([{ massG: largestG, maximum: 0.023 }], restG, 0.89).used).toBeCloseTo(1, 12);
  });

  it('adds up what two lots use of their maxima', () => {
    const { used } = fragranceInBar([{ massG: 18, maximum: 0.024 }, { massG: 12, maximum: 0.055 }], 1177.5 - 30, 1);
    expect(Math.abs(used / 0.8222 - 1)).toBeLessThan(1e-4);
  });

  it('keeps the proportions of a blend when it says the largest amount', () => {
    const scents = [{ massG: 40, maximum: 0.024 }, { massG: 20, maximum: 0.055 }];
    const { largestG } = fragranceInBar(scents, 1400, 0.9);
    const shrunk = scents.map(({ massG, maximum }) => ({ massG: (massG * largestG) / 60, maximum }));
    expect(fragranceInBar(shrunk, 1400, 0.9).used).toBeCloseTo(1, 12);
  });
});

describe('batchWarnings', () => {
  it('says nothing about a batch that is usual, or of which nothing is known', () => {
    expect(fields({})).toEqual([]);
    expect(fields({ oilMassG: 1000, waterToLye: 2, superfatFraction: 0.05, oilTemperatureC: 40, lyeTemperatureC: 35, roomTemperatureC: 20, humidityFraction: 0.5, blendSeconds: 60, mouldHours: 24, cutHours: 30 })).toEqual([]);
  });

  it('finds 3 % of the oils over a certificate of 2.30 % in the finished bar, and says the largest amount', () => {
    const lots = [aLot({ certificateMaxFraction: 0.023 })];
    expect(batchWarnings(exampleA(30), lots)).toEqual([{
      pointer: '#/ingredients/6/massG', detail: 'Over the supplier’s maximum for rinse-off soap on the finished bar (2.31 %, allowed 2.30 %). At most 29.9 g in all.',
    }]);
    expect(batchWarnings(exampleA(29.9), lots)).toEqual([]);
  });

  it('takes a load within the maximum for allowed while lye and water are not weighed, and says so above it', () => {
    const scented = (share: number) => batchWarnings(aBatch({ ingredients: [line('fragrance', { lotId: 'scent', shareOfOilsFraction: share })] }), [aLot({ certificateMaxFraction: 0.023 })]);
    expect(scented(0.023)).toEqual([]);
    expect(scented(0.03)).toMatchObject([{ pointer: '#/ingredients/0/shareOfOilsFraction', detail: expect.stringMatching(/weigh in oils, lye and water/) }]);
  });

  // Both edges pass; beyond them it warns.
  test.each<[keyof WarnedBatch, WarnedBatch['method'], number[], number[]]>([
    ['oilTemperatureC', 'cold', [27, 55], [26.9, 55.1]], ['oilTemperatureC', 'hot', [80, 20], []],
    ['lyeTemperatureC', 'cold-oven', [60], [60.1]], ['blendSeconds', 'cold', [150], [151]], ['blendSeconds', 'hot', [240], []],
    ['minutesToPour', 'cold', [20], [21]], ['roomTemperatureC', 'hot', [15, 28], [14.9, 28.1]], ['humidityFraction', 'cold', [0.65], [0.66]],
    ['mouldHours', 'cold', [12], [11]], ['mouldHours', 'hot', [8], []], ['cutHours', 'cold', [18, 72], [17, 73]], ['cutHours', 'hot-fluid', [12, 36], [11, 37]],
    ['superfatFraction', 'cold', [0.02, 0.1], [0.019, 0.101]], ['oilMassG', 'cold', [200, 30_000], [199, 30_001]],
    ['scentTemperatureC', 'hot', [80], [81]], ['cookTemperatureC', 'hot', [98], [99]], ['cookMinutes', 'hot', [240], [241]], ['cookLossFraction', 'hot', [0.12], [0.13]],
  ])('draws the line of %s in a %s batch', (field, method, fine, odd) => {
    for (const value of fine) expect(fields({ method, [field]: value })).toEqual([]);
    for (const value of odd) expect(fields({ method, [field]: value })).toEqual([`#/${field}`]);
  });

  test.each<[WarnedBatch['method'], number, string | null]>([
    ['cold', 2.75, null], ['cold', 2.65, null], ['cold', 2.8, 'weak'], ['cold', 1.6, 'strong'], ['hot', 3.5, null], ['hot', 3.6, 'weak'], ['hot', 1.8, 'strong'], ['rebatch', 5, null],
  ])('calls lye of a %s batch at ratio %f %s', (method, waterToLye, word) => {
    const said = batchWarnings(aBatch({ method, waterToLye }), []);
    if (word === null && 1 / (1 + waterToLye) >= 0.27) expect(said).toEqual([]);
    else if (word) expect(said).toMatchObject([{ pointer: '#/waterToLye', detail: expect.stringContaining(word) }]);
  });

  it('warns of oils and lye more than 15 degrees apart in the cold family only', () => {
    expect(fields({ oilTemperatureC: 45, lyeTemperatureC: 29 })).toEqual(['#/lyeTemperatureC']);
    expect(fields({ method: 'hot', oilTemperatureC: 75, lyeTemperatureC: 29 })).toEqual([]);
  });

  it('warns of lots that should not go in', () => {
    const held = (over: Partial<WarnedLot>, method: WarnedBatch['method'] = 'cold') =>
      batchWarnings(aBatch({ method, ingredients: [line('fragrance', { lotId: 'scent' })] }), [aLot(over)]).map(({ detail }) => detail);
    expect(held({})).toEqual([]);
    expect(held({ standing: 'on-hold' })[0]).toMatch(/EF-7802 is on hold/);
    expect(held({ standing: 'returned' })[0]).toMatch(/returned/);
    expect(held({ standing: 'hot-process-only' })).toEqual(['EF-7802 is for hot process only']);
    expect(held({ standing: 'hot-process-only' }, 'hot')).toEqual([]);
    expect(held({ bestBeforeOn: '2026-03-13' })).toEqual(['EF-7802 was best before 2026-03-13']);
    expect(held({ bestBeforeOn: '2026-03-14' })).toEqual([]);
    expect(held({ certificateMaxFraction: null })).toEqual(['No certificate on file for this lot: the allowed amount is not known.']);
    expect(held({ certificateMaxFraction: 0 })).toEqual(['The certificate of EF-7802 allows none in rinse-off soap']);
  });

  it('warns of a scent hotter than its flash point, in a cold batch by the batter', () => {
    const lots = [aLot({ flashPointC: 62 })];
    const ingredients = [line('fragrance', { lotId: 'scent' })];
    expect(batchWarnings(aBatch({ method: 'hot', scentTemperatureC: 70, ingredients }), lots)).toEqual([
      { pointer: '#/scentTemperatureC', detail: 'Above this scent’s flash point (62 °C): no flame, good air. Cooler keeps more scent.' },
    ]);
    expect(batchWarnings(aBatch({ batterTemperatureC: 63, ingredients }), lots)).toMatchObject([{ pointer: '#/batterTemperatureC' }]);
    expect(batchWarnings(aBatch({ method: 'hot', scentTemperatureC: 62, ingredients }), lots)).toEqual([]);
  });

  it('warns of shares that do not make the whole, much fragrance, much essential oil, alcohol near an oven', () => {
    const fats = (...shares: number[]) => shares.map((share) => line('fat', { shareOfOilsFraction: share }));
    expect(fields({ ingredients: fats(0.6, 0.395) })).toEqual([]);
    expect(fields({ ingredients: fats(0.6, 0.3) })).toEqual(['#/ingredients']);
    expect(fields({ ingredients: [line('fragrance', { shareOfOilsFraction: 0.051 })] })).toEqual(['#/ingredients/0/shareOfOilsFraction']);
    expect(fields({ ingredients: [line('fragrance', { shareOfOilsFraction: 0.035, isEssentialOil: true })] })).toEqual(['#/ingredients/0/shareOfOilsFraction']);
    expect(fields({ isSprayed: true, method: 'cold-oven' })).toEqual(['#/isSprayed']);
    expect(fields({ isSprayed: true })).toEqual([]);
  });

  it('says temperatures as the person likes them', () => {
    const [warning] = batchWarnings(aBatch({ oilTemperatureC: 60 }), [], { temperature: (celsius) => `${Math.round(celsius * 1.8 + 32)} °F`, mass: String });
    expect(warning?.detail).toBe('Oils for a cold batch are mostly between 81 °F and 131 °F');
  });
});
