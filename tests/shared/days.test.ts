import { describe, expect, it, test } from 'vitest';
import { addDays, dayFromNumber, dayNumber, daysBetween, weekday } from '#shared/units/days.ts';

describe('days', () => {
  test.each([
    ['1970-01-01', 0], ['1969-12-31', -1], ['2000-02-29', 11016], ['2024-09-02', 19968], ['2026-08-31', 20696],
  ])('counts %s as day %i', (day, number) => {
    expect(dayNumber(day)).toBe(number);
    expect(dayFromNumber(number)).toBe(day);
  });

  it('agrees with the platform calendar on every day of eight centuries', () => {
    for (let n = -150_000; n < 150_000; n += 1) {
      const day = dayFromNumber(n);
      if (day !== new Date(n * 86_400_000).toISOString().slice(0, 10) || dayNumber(day) !== n) throw new Error(day);
    }
  });

  it('steps over the end of February in a leap year and in a common one', () => {
    expect(addDays('2024-02-28', 1)).toBe('2024-02-29');
    expect(addDays('2025-02-28', 1)).toBe('2025-03-01');
    expect(daysBetween('2024-09-02', '2026-08-31')).toBe(728);
  });

  it('knows a Monday', () => {
    expect(weekday('2024-09-02')).toBe(1);
    expect(weekday('2026-08-30')).toBe(7);
  });

  it('refuses a day that does not exist', () => {
    expect(() => dayNumber('2025-02-29')).toThrow(/no day/);
    expect(() => dayNumber('1 May')).toThrow(/YYYY-MM-DD/);
  });
});
