import { describe, expect, it } from 'vitest';
import { breslowDay } from '#analysis/tables/breslow-day.ts';
import { exactStrata, mantelHaenszel } from '#analysis/tables/mantel-haenszel.ts';
import type { StratifiedAnswer } from '#analysis/tables/mantel-haenszel.ts';
import { batchesNeeded } from '#analysis/tables/sample-size.ts';
import { ucbAdmissions } from '#tests/published/ucb-admissions.ts';

const answer = mantelHaenszel(Object.freeze([...ucbAdmissions])) as StratifiedAnswer;

// Bickel, Hammel & O'Connell 1975; values recomputed with R mantelhaen.test. Digits: as printed.
describe('mantelHaenszel on the Berkeley admissions', () => {
  it('takes away the crude ratio of 1.84', () => {
    const whole = ucbAdmissions.reduce((sum, t) => ({
      exposedFound: sum.exposedFound + t.exposedFound, exposedClear: sum.exposedClear + t.exposedClear,
      unexposedFound: sum.unexposedFound + t.unexposedFound, unexposedClear: sum.unexposedClear + t.unexposedClear,
    }));
    expect((mantelHaenszel([whole]) as StratifiedAnswer).oddsRatio.estimate).toBeCloseTo(1.84108, 5);
    expect(answer.oddsRatio.estimate).toBeCloseTo(0.9046968, 7);
    expect(answer.oddsRatio.lower).toBeCloseTo(0.7719074, 7);
    expect(answer.oddsRatio.upper).toBeCloseTo(1.0603298, 7);
  });

  it('tests with and without correction', () => {
    expect(answer.chisquareCorrected).toBeCloseTo(1.426946, 6);
    expect(answer.pCorrected).toBeCloseTo(0.2322635, 7);
    expect(answer.chisquare).toBeCloseTo(1.524607, 6);
    expect(answer.p).toBeCloseTo(0.2169237, 7);
  });

  it('gives the risk ratio, and the difference with Sato\'s error', () => {
    expect(answer.riskRatio).toBeCloseTo(0.944905, 6);
    expect(answer.riskDifference.difference).toBeCloseTo(-0.0184252, 7);
    expect(answer.riskDifference.standardError).toBeCloseTo(0.01482539, 8);
  });

  it('has an exact counterpart', () => {
    const exact = exactStrata(ucbAdmissions);
    expect(exact.estimate! / 0.9050762).toBeCloseTo(1, 3);
    expect(exact.lower / 0.769714).toBeCloseTo(1, 3);
    expect(exact.upper! / 1.063417).toBeCloseTo(1, 3);
    expect(exact.p).toBeCloseTo(0.2277625, 5);
  });

  it('sees that department A differs', () => {
    const test = breslowDay(ucbAdmissions, answer.oddsRatio.estimate)!;
    expect(test.statistic).toBeCloseTo(18.825514, 4);
    expect(test.corrected).toBeCloseTo(18.825501, 4);
    expect(test.df).toBe(5);
    expect(test.p).toBeCloseTo(0.002071, 6);
  });
});

describe('strata without contrast', () => {
  const hotOnly = { exposedFound: 3, exposedClear: 4, unexposedFound: 0, unexposedClear: 0 };

  it('say so instead of answering NaN', () => {
    expect(mantelHaenszel([])).toEqual({ kind: 'no-variation' });
    expect(mantelHaenszel([hotOnly])).toEqual({ kind: 'no-variation' });
    expect(breslowDay([hotOnly, hotOnly], 1)).toBeNull();
  });

  it('change nothing beside strata with contrast', () => {
    expect(mantelHaenszel([...ucbAdmissions, hotOnly])).toEqual(answer);
  });
});

describe('batchesNeeded', () => {
  // R power.prop.test, n in each group. Three decimals: R's root search.
  it.each([[0.5, 0.75, 0.9, 76.70693], [0.1, 0.3, 0.8, 61.598804], [0.05, 0.1, 0.8, 434.432]])(
    'agrees for %d against %d at power %d', (rate0, rate1, power, each) => {
      expect(batchesNeeded(rate0, rate1, power) / 2).toBeCloseTo(each, 2);
    });

  it('asks for more where the exposed are few', () => {
    expect(batchesNeeded(0.1, 0.2, 0.8, 0.05)).toBeGreaterThan(2 * batchesNeeded(0.1, 0.2, 0.8));
  });

  it('refuses equal rates and shares of 0 or 1', () => {
    expect(() => batchesNeeded(0.1, 0.1, 0.8)).toThrow(/must differ/);
    expect(() => batchesNeeded(0.1, 0.2, 0.8, 0)).toThrow(/exposedShare/);
  });
});
