import { describe, expect, it } from 'vitest';
import { addressOfAsk, askFromAddress, isNarrowed } from '#src/features/batches/filter-address.ts';

const LOT = '0190a0a0-0000-7000-8000-000000000001';
const roundTrip = (text: string) => addressOfAsk(askFromAddress(new URLSearchParams(text))).toString();

describe('the log’s filter in its address', () => {
  it.each([
    'family=cold', 'method=cold%2Chot', `lot=${LOT}`, 'from=2025-03-01&to=2025-04-01', 'fault=soda-ash&answer=clear', 'find=EF-78+02', 'state=curing%2Ccured', 'sort=water&order=asc',
  ])('comes back as it was: %s', (text) => {
    expect(roundTrip(text)).toBe(text);
  });

  it('leaves out what goes without saying', () => {
    expect(roundTrip('sort=made&order=desc&method=&find=')).toBe('');
    expect(addressOfAsk({ method: [], lot: [], sort: 'made' }).toString()).toBe('');
  });

  it('opens an old or mistyped link without the parts that make no sense', () => {
    expect(askFromAddress(new URLSearchParams('method=lukewarm&from=spring&fault=soda-ash&sort=colour&page=7'))).toEqual({ fault: 'soda-ash' });
  });

  it('gives the same address whatever order the parts came in', () => {
    expect(roundTrip('answer=found&fault=ricing&family=hot')).toBe(roundTrip('family=hot&fault=ricing&answer=found'));
  });

  it('calls a filter narrow, an order not', () => {
    expect(isNarrowed({ sort: 'water', order: 'asc' })).toBe(false);
    expect(isNarrowed({ answer: 'found' })).toBe(true);
  });
});
