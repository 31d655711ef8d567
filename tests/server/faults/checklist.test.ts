import { describe, expect, it } from 'vitest';
import { faultCatalogue } from '#server/features/faults/catalogue.ts';
import { answerable, appliesTo, checklistFor } from '#server/features/faults/checklist.ts';
import { STAGES, type Stage } from '#shared/words/stages.ts';

const mustAt = (fault: Parameters<typeof answerable>[0]): Stage[] => STAGES.filter((stage) => answerable(fault, stage) === 'must');

describe('inspection checklist', () => {
  it('asks for each fault at the stages the workshop agreed on', () => {
    expect(mustAt('soda-ash')).toEqual(['unmould', 'cut', 'cure-w1', 'cure-w2', 'release']);
    expect(mustAt('glycerin-rivers')).toEqual(['cut']);
    expect(mustAt('ricing')).toEqual(['pour', 'cut']);
    expect(mustAt('separation')).toEqual(['pour', 'unmould', 'cut']);
    expect(mustAt('lye-heavy')).toEqual(['cut', 'cure-w1', 'cure-w4', 'release', 'in-use']);
    expect(mustAt('soft-sticky')).toEqual(['unmould', 'cut', 'cure-w2', 'cure-w4', 'release']);
    expect(mustAt('orange-spots')).toEqual(['cure-w4', 'cure-w6', 'release', 'in-use']);
    expect(mustAt('scent-fade')).toEqual(['cure-w4', 'cure-w6', 'release', 'in-use']);
    expect(mustAt('wrap-marks')).toEqual(['release', 'in-use']);
    expect(mustAt('foreign-matter')).toEqual(['cut', 'release', 'in-use']);
    expect(mustAt('stuck-in-mould')).toEqual(['unmould']);
  });

  it('never lets a fault be answered before it can be seen', () => {
    for (const fault of faultCatalogue) {
      const first = STAGES.indexOf(fault.firstSeen);
      expect(answerable(fault.slug, fault.firstSeen), fault.slug).not.toBe('cannot');
      for (const stage of STAGES.slice(0, first)) expect(answerable(fault.slug, stage), `${fault.slug} at ${stage}`).toBe('cannot');
    }
  });

  it('counts at each stage what must be answered in a cold batch', () => {
    const musts = STAGES.map((stage) => checklistFor(stage, 'cold').filter((line) => line.answer === 'must').length);
    expect(musts).toEqual([6, 6, 20, 6, 7, 11, 3, 15, 7]);
  });

  it('leaves false trace out of hot batches and every batter fault out of a rebatch', () => {
    expect(checklistFor('pour', 'hot').map((line) => line.fault)).not.toContain('false-trace');
    expect(checklistFor('pour', 'hot').map((line) => line.fault)).toContain('volcano');
    expect(checklistFor('pour', 'rebatch').map((line) => line.fault)).toEqual(['separation', 'volcano', 'foreign-matter']);
    expect(appliesTo('ricing', 'hot-fluid')).toBe(true);
  });
});
