import { describe, expect, it } from 'vitest';
import type { FaultView } from '#shared/faults.ts';
import { barsOf, lookedAt } from '#src/features/batches/looked-at.ts';

const aFault = (slug: string, over: Partial<FaultView> = {}): FaultView => ({
  slug, name: slug, otherNames: [], kind: 'cosmetic', family: 'surface', methodFamilies: ['cold', 'hot'], firstSeen: 'cut', definition: '', criteria: ['a', 'b', 'c'], extentUnit: 'bars',
  lookAlikes: [], prevention: '', disposition: '', checklist: [{ stage: 'cut', answer: 'must' }], ...over,
});
const catalogue = [
  aFault('ricing'), aFault('soda-ash'), aFault('lye-pockets', { kind: 'safety', family: 'safety' }), aFault('partial-gel-ring', { methodFamilies: ['cold'] }),
  aFault('scent-fade', { checklist: [{ stage: 'cure-w4', answer: 'must' }] }), aFault('warping', { checklist: [{ stage: 'cut', answer: 'may' }] }),
];

describe('lookedAt', () => {
  it('draws a gap for what had to be answered at the stages done, and only for that', () => {
    const { pieces, label } = lookedAt({ found: [{ fault: 'ricing', severity: 2 }], clear: ['soda-ash'], state: 'curing', family: 'hot' }, catalogue);
    expect(pieces).toEqual([{ kind: 'found', severity: 2 }, { kind: 'clear' }, { kind: 'not-checked' }]);
    expect(label).toBe('1 found, 1 clear, 1 not looked at');
  });

  it('asks for more of a cold batch and of one that is older', () => {
    expect(lookedAt({ found: [], clear: [], state: 'curing', family: 'cold' }, catalogue).pieces).toHaveLength(4);
    expect(lookedAt({ found: [], clear: [], state: 'cured', family: 'cold' }, catalogue).pieces).toHaveLength(5);
    expect(lookedAt({ found: [], clear: [], state: 'making', family: 'cold' }, catalogue).pieces).toEqual([]);
  });

  it('draws a found safety fault as one', () => {
    expect(lookedAt({ found: [{ fault: 'lye-pockets', severity: 1 }], clear: [], state: 'planned', family: 'cold' }, catalogue).pieces).toEqual([{ kind: 'safety' }]);
  });
});

describe('barsOf', () => {
  it('cuts the batch into its bars, those not gone yet on the rack', () => {
    const { pieces, label } = barsOf({ bars: 6, dispositions: [{ kind: 'seconds', bars: 2 }, { kind: 'firsts', bars: 1 }, { kind: 'firsts', bars: 1 }] });
    expect(pieces.map(({ kind }) => kind)).toEqual(['firsts', 'firsts', 'seconds', 'seconds', 'rack', 'rack']);
    expect(label).toBe('2 firsts, 2 seconds, 2 on the rack');
  });

  it('says so when the bars were never counted', () => {
    expect(barsOf({ bars: null, dispositions: [] })).toEqual({ pieces: [], label: 'bars not counted yet' });
  });
});
