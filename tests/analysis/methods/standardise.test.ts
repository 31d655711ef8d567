import { describe, expect, it } from 'vitest';
import { standardise } from '#analysis/methods/standardise.ts';
import type { Standardised } from '#analysis/methods/standardise.ts';
import { ucbAdmissions } from '#tests/published/ucb-admissions.ts';

const berkeley = ucbAdmissions.map((table) => ({
  n1: table.exposedFound + table.exposedClear, events1: table.exposedFound,
  n0: table.unexposedFound + table.unexposedClear, events0: table.unexposedFound,
}));

describe('standardise', () => {
  // Bickel, Hammel & O'Connell 1975; rates weighted by all applicants of a department, recomputed with R.
  it('turns the Berkeley gap of 14 points round', () => {
    const answer = standardise(Object.freeze(berkeley)) as Standardised;
    expect(answer.one.share).toBeCloseTo(0.3873186, 7);
    expect(answer.other.share).toBeCloseTo(0.4299554, 7);
    expect(answer.neverMet).toEqual([]);
  });

  it('is the plain rate with its Wilson interval when there is one stratum', () => {
    const answer = standardise([{ n1: 10, events1: 3, n0: 20, events0: 0 }]) as Standardised;
    expect(answer.one.share).toBe(0.3);
    expect(answer.other.upper).toBeCloseTo(0.16113, 5);
  });

  it('names where the groups never met, and leaves it out', () => {
    const answer = standardise([...berkeley, { n1: 7, events1: 7, n0: 0, events0: 0 }]) as Standardised;
    expect(answer.neverMet).toEqual([6]);
    expect(answer.one).toEqual((standardise(berkeley) as Standardised).one);
  });

  it('says so when they met nowhere', () => {
    expect(standardise([{ n1: 3, events1: 1, n0: 0, events0: 0 }, { n1: 0, events1: 0, n0: 4, events0: 1 }])).toEqual({ kind: 'never-met', neverMet: [0, 1] });
    expect(standardise([])).toEqual({ kind: 'never-met', neverMet: [] });
  });
});
