import { describe, expect, it } from 'vitest';
import { comesAfter, isSameQuantity, onThePath } from '#analysis/causes/what-comes-first.ts';
import { gradeOf, moreNeeded } from '#analysis/causes/grade.ts';
import type { Evidence } from '#analysis/causes/grade.ts';

describe('what comes first', () => {
  it('lets only earlier moments be causes', () => {
    expect(comesAfter('cut', 'ricing', 'pour')).toBe(true);
    expect(comesAfter('pour', 'ricing', 'pour')).toBe(false);
    expect(comesAfter('cut', 'drag-marks', 'cut')).toBe(false);
    expect(comesAfter('cure', 'orange-spots', 'cure-w4')).toBe(false);
  });

  it('knows that a loaf cracks after it was covered, though both are of the day of the pour', () => {
    expect(comesAfter('mould', 'overheating-crack', 'pour')).toBe(false);
    expect(comesAfter('mould', 'ricing', 'pour')).toBe(true);
  });

  it('knows what lies between', () => {
    expect(onThePath('gel', 'roomTemperatureC', 'soda-ash')).toBe(true);
    expect(onThePath('trace', 'fragranceLot', 'air-pockets')).toBe(true);
    expect(onThePath('oilTemperatureC', 'methodFamily', 'air-pockets')).toBe(true);
    expect(onThePath('maker', 'waterToLye', 'soda-ash')).toBe(false);
  });

  it('takes water ratio and lye concentration for one quantity', () => {
    expect(isSameQuantity('lyeConcentration', 'waterToLye')).toBe(true);
    expect(isSameQuantity('oilTemperatureC', 'lyeTemperatureC')).toBe(false);
  });
});

describe('gradeOf', () => {
  const strong: Evidence = {
    q: 0.01, p: 0.001, isNumber: false, harmOnly: false,
    overRange: { estimate: Math.log(4), lower: Math.log(1.6), upper: Math.log(11) },
    perSpread: { estimate: Math.log(4), lower: Math.log(1.6), upper: Math.log(11) },
    exposedN: 12, exposedEvents: 6, events: 20, survivesAnyBatch: () => true, noStratumPointsBack: () => true,
  };

  it('settles only when every check holds, and falls by one grade for one that does not', () => {
    expect(gradeOf(strong)).toBe('settled');
    expect(gradeOf({ ...strong, q: 0.08 })).toBe('likely');
    expect(gradeOf({ ...strong, survivesAnyBatch: () => false })).toBe('likely');
    expect(gradeOf({ ...strong, exposedEvents: 2 })).toBe('likely');
    expect(gradeOf({ ...strong, survivesAnyBatch: () => false, noStratumPointsBack: () => false })).toBe('hint');
    expect(gradeOf({ ...strong, q: 0.15 })).toBe('hint');
    expect(gradeOf({ ...strong, q: 0.6, p: 0.04 })).toBe('hint');
    expect(gradeOf({ ...strong, q: 0.6, p: 0.2 })).toBe('too-few');
  });

  it('says no difference only when the interval is narrow enough', () => {
    const none = { estimate: 0.05, lower: Math.log(0.6), upper: Math.log(1.8) };
    expect(gradeOf({ ...strong, q: 0.9, p: 0.8, overRange: none, perSpread: none })).toBe('no-difference');
    expect(gradeOf({ ...strong, q: 0.9, p: 0.8, isNumber: true, overRange: none, perSpread: none })).toBe('too-few');
    expect(gradeOf({ ...strong, q: 0.9, p: 0.8, perSpread: { ...none, upper: null } })).toBe('too-few');
  });

  it('never praises a lot', () => {
    const fewer = { estimate: -1.5, lower: -2.5, upper: -0.5 };
    expect(gradeOf({ ...strong, harmOnly: true, overRange: fewer, perSpread: fewer })).toBe('too-few');
    expect(gradeOf({ ...strong, overRange: fewer, perSpread: fewer })).toBe('settled');
  });
});

describe('moreNeeded', () => {
  it('says about how many more it takes to see twice the base rate', () => {
    // 0.05 against 0.10 at 80 %: 434.432 a group (R power.prop.test), less the 100 there are.
    expect(moreNeeded(50, 50, 0, 5)).toBeGreaterThan(600);
    expect(moreNeeded(20, 20, 1, 3)).toBe(869 - 40);
  });

  it('gives no figure where a group is absent or there are enough', () => {
    expect(moreNeeded(0, 40, 4, 4)).toBeNull();
    expect(moreNeeded(5000, 5000, 1000, 2000)).toBeNull();
  });
});
