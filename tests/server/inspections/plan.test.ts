import { describe, expect, it } from 'vitest';
import { inspectionPlan } from '#server/features/inspections/plan.ts';

const cold = { method: 'cold', madeOn: '2026-01-15', linoleicRich: false } as const;
const dues = (plan: ReturnType<typeof inspectionPlan>) => plan.map((look) => `${look.stage} ${look.dueOn}`);

describe('inspection plan', () => {
  it('plans a cold batch from its pour to its release', () => {
    expect(dues(inspectionPlan({ ...cold, unmouldedOn: '2026-01-16', cutOn: '2026-01-16' }))).toEqual([
      'pour 2026-01-15', 'unmould 2026-01-16', 'cut 2026-01-16', 'cure-w1 2026-01-22', 'cure-w2 2026-01-29',
      'cure-w4 2026-02-12', 'cure-w6 2026-02-26', 'release 2026-02-26',
    ]);
  });

  it('gives cure checks two days either way and five days of grace', () => {
    const week4 = inspectionPlan(cold).find((look) => look.week === 4);
    expect(week4).toMatchObject({ from: '2026-02-10', to: '2026-02-14', overdueAfter: '2026-02-17' });
  });

  it('skips week 6 for a hot batch unless its oils spoil soon', () => {
    const hot = { ...cold, method: 'hot' } as const;
    expect(inspectionPlan(hot).some((look) => look.stage === 'cure-w6')).toBe(false);
    expect(inspectionPlan({ ...hot, linoleicRich: true }).some((look) => look.stage === 'cure-w6')).toBe(true);
  });

  it('never lets a cold batch go before 28 days or a hot one before 7', () => {
    expect(inspectionPlan(cold).at(-1)?.from).toBe('2026-02-12');
    expect(inspectionPlan({ ...cold, method: 'hot-fluid' }).at(-1)?.from).toBe('2026-01-22');
    expect(inspectionPlan({ ...cold, cureWeeks: 10 }).at(-1)).toMatchObject({ from: '2026-03-26', dueOn: '2026-03-26' });
  });

  it('marks the days of an uncut loaf as expected only', () => {
    const plan = inspectionPlan(cold);
    expect(plan.filter((look) => look.expected).map((look) => look.stage)).toEqual(['unmould', 'cut']);
    expect(inspectionPlan({ ...cold, cutOn: '2026-01-15' }).filter((look) => look.expected)).toEqual([]);
  });
});
