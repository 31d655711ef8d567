import { describe, expect, it } from 'vitest';
import { catalogueFault, faultCatalogue } from '#server/features/faults/catalogue.ts';

const slugs = faultCatalogue.map((fault) => fault.slug as string);

describe('fault catalogue', () => {
  it('holds the 32 faults of a loaf and the three things kept like one', () => {
    expect(slugs).toHaveLength(35);
    expect(new Set(slugs).size).toBe(35);
  });

  it.each(faultCatalogue.map((fault) => [fault.slug, fault] as const))('says all there is to say of %s', (_slug, fault) => {
    expect(fault.slug).toMatch(/^[a-z]+(?:-[a-z]+)*$/);
    expect(fault.name).toMatch(/^[A-Z][a-z ,-]+$/);
    expect(fault.definition.length).toBeGreaterThan(40);
    expect(fault.prevention.length).toBeGreaterThan(20);
    expect(fault.lookAlikes.length).toBeGreaterThan(0);
    expect(fault.suspects.length).toBeGreaterThan(0);
    const grades = Object.keys(fault.severity);
    expect(grades.length).toBeGreaterThan(0);
    expect(Object.keys(fault.usually)).toEqual(grades);
    // The picker shows a criterion on one line of a phone.
    for (const words of Object.values(fault.severity)) expect(words.length).toBeLessThanOrEqual(60);
  });

  it('points look-alikes at faults that exist, never at themselves', () => {
    for (const fault of faultCatalogue) {
      for (const other of fault.lookAlikes) {
        if (other.fault === undefined) continue;
        expect(slugs).toContain(other.fault);
        expect(other.fault).not.toBe(fault.slug);
      }
    }
  });

  it('names each suspect once a fault', () => {
    for (const fault of faultCatalogue) {
      const inputs = fault.suspects.map((suspect) => suspect.input);
      expect(new Set(inputs).size, fault.slug).toBe(inputs.length);
    }
  });

  it('keeps the safety outline for safety faults, and says of each what may hurt', () => {
    for (const fault of faultCatalogue) {
      expect(fault.family === 'safety', fault.slug).toBe(fault.kind === 'safety');
      if (fault.kind === 'safety' || fault.worsensTo === 'safety') expect(fault.mayHurt, fault.slug).toBeDefined();
    }
    expect(faultCatalogue.filter((fault) => fault.kind === 'safety').map((fault) => fault.slug))
      .toEqual(['volcano', 'lye-pockets', 'lye-heavy', 'foreign-matter', 'customer-reaction']);
  });

  it('sends no bar with orange spots or lye pockets out as a first', () => {
    expect(Object.values(catalogueFault('orange-spots').usually)).not.toContain('firsts');
    expect(catalogueFault('lye-pockets').usually).toEqual({ 3: 'hold' });
    expect(catalogueFault('lye-pockets').severity).toEqual({ 3: expect.stringContaining('hold the whole batch') });
  });

  it('suspects water, cover, spray and gel of soda ash, each the right way round', () => {
    const ash = new Map(catalogueFault('soda-ash').suspects.map((suspect) => [suspect.input, suspect.direction]));
    expect([ash.get('waterToLye'), ash.get('cover'), ash.get('spray'), ash.get('gel')]).toEqual(['up', 'down', 'down', 'down']);
  });
});
