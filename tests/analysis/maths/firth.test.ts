import { describe, expect, it } from 'vitest';
import { firthFit } from '#analysis/maths/firth.ts';
import { profileInterval, ratioTest } from '#analysis/maths/profile.ts';
import { EH, HG, NV, PI } from '#tests/published/endometrial.ts';
import { distress, temperatureF } from '#tests/published/shuttle.ts';
import { designOf } from './design.ts';

describe('firthFit', () => {
  // Dalal, Fowlkes & Hoadley 1989; penalised values recomputed with R brglm2. Seven decimals: as printed.
  it('agrees with the O-ring data', () => {
    const fit = firthFit(designOf(distress, [temperatureF]))!;
    expect(fit.converged).toBe(true);
    expect(fit.beta[0]).toBeCloseTo(11.9495151, 6);
    expect(fit.beta[1]).toBeCloseTo(-0.1860419, 7);
    expect(1 / (1 + Math.exp(-(fit.beta[0]! + fit.beta[1]! * 31)))).toBeCloseTo(0.9979384, 7);
  });

  // Firth 1993: for one 2×2 table the penalty adds ½ to each cell.
  it('adds half a batch to each cell of a table with none found', () => {
    const design = { groups: 2, terms: 2, x: Float64Array.of(1, 1, 1, 0), weight: Float64Array.of(8, 20), found: Float64Array.of(3, 0), offset: new Float64Array(2) };
    const fit = firthFit(design)!;
    expect(fit.beta[1]).toBeCloseTo(Math.log(3.5 / 5.5) - Math.log(0.5 / 20.5), 9);
    expect(fit.beta[1]).toBeCloseTo(3.2615869, 7);
    const test = ratioTest(design, fit, 1)!;
    expect(test.statistic).toBeCloseTo(6.8063262, 6);
    expect(test.twoSided).toBeCloseTo(0.0090835, 7);
    expect(test.oneSidedMore).toBeCloseTo(0.0090835 / 2, 7);
  });

  // Heinze & Schemper 2002, separation by NV; values recomputed with R brglm2. Six decimals: both sides stop at a tolerance of 1e-8.
  describe('on the endometrial data', () => {
    const design = designOf(HG, [NV, PI, EH]);
    const fit = firthFit(design)!;

    it('stays finite where the ordinary estimate is infinite', () => {
      expect(fit.converged).toBe(true);
      for (const [j, value] of [3.7745597, 2.9292729, -0.0347518, -2.6041639].entries()) expect(fit.beta[j]).toBeCloseTo(value, 6);
      expect(fit.penalisedLogLikelihood).toBeCloseTo(-24.0372678, 6);
    });

    it('tests by the penalised likelihood ratio', () => {
      expect(ratioTest(design, fit, 1)!.statistic).toBeCloseTo(6.7984572, 5);
      expect(ratioTest(design, fit, 3)!.statistic).toBeCloseTo(17.7593175, 5);
    });

    it.each([[1, 0.6097244, 7.8546317], [2, -0.1244587, 0.0404555], [3, -4.3651832, -1.2327211]])(
      'gives the profile interval of term %i', (term, lower, upper) => {
        const interval = profileInterval(design, fit, term);
        expect(interval.lower).toBeCloseTo(lower, 5);
        expect(interval.upper).toBeCloseTo(upper, 5);
      });
  });

  it('gives the same answer for batches one by one and as weighted groups', () => {
    const single = firthFit(designOf([1, 1, 0, 0, 0, 1, 0, 0], [[1, 1, 1, 1, 0, 0, 0, 0]]))!;
    const grouped = firthFit({ groups: 2, terms: 2, x: Float64Array.of(1, 1, 1, 0), weight: Float64Array.of(4, 4), found: Float64Array.of(2, 1), offset: new Float64Array(2) })!;
    expect(grouped.beta[1]).toBeCloseTo(single.beta[1]!, 10);
  });

  it('takes the offset as known: shifting it only shifts the intercept', () => {
    const design = designOf(distress, [temperatureF]);
    const plain = firthFit(design)!;
    const shifted = firthFit({ ...design, offset: new Float64Array(design.groups).fill(1.5) })!;
    expect(shifted.beta[0]).toBeCloseTo(plain.beta[0]! - 1.5, 6);
    expect(shifted.beta[1]).toBeCloseTo(plain.beta[1]!, 8);
  });

  it('mirrors itself when found and clear swap places', () => {
    const plain = firthFit(designOf(HG, [NV, PI, EH]))!;
    const mirrored = firthFit(designOf(HG.map((y) => 1 - y), [NV, PI, EH]))!;
    for (let j = 0; j < 4; j++) expect(mirrored.beta[j]).toBeCloseTo(-plain.beta[j]!, 6);
  });

  it('says that there is no single answer when columns repeat one another', () => {
    expect(firthFit(designOf(HG, [NV, NV]))).toBeNull();
  });

  it('reports that it did not get there instead of hiding it', () => {
    expect(firthFit(designOf(HG, [NV, PI, EH]), { maxIterations: 1 })!.converged).toBe(false);
  });
});
