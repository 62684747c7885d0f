import { describe, expect, it } from 'vitest';
import { csvAddress, filterOf, isFiltered, paramsOf } from './floor-filter.js';

const of = (address: string) => filterOf(new URLSearchParams(address));

describe('the filter of the floor in its address', () => {
  it('reads step, state, late, text, order and page', () => {
    expect(of('step=rewind&state=on-hold&late=yes&q=dairy&sort=customer&order=desc&page=2')).toEqual({ step: 'rewind', state: 'on-hold', late: 'yes', q: 'dairy', sort: 'customer', order: 'desc', page: 2 });
  });

  it('still opens when an old link asks for what there is not', () => {
    expect(of('step=polishing&state=lost&late=maybe&sort=colour&page=-3&q=%20')).toEqual({});
  });

  it('gives one list one address, whatever order it was asked in', () => {
    expect(paramsOf(of('q=dairy&step=rewind'))).toBe(paramsOf(of('step=rewind&q=dairy')));
  });

  it('exports the whole list and not the page', () => {
    expect(csvAddress(of('late=yes&page=3'))).toBe('/api/jobs.csv?late=yes');
    expect(csvAddress({})).toBe('/api/jobs.csv');
  });

  it('knows a filter from a sort', () => {
    expect(isFiltered(of('sort=customer&page=2'))).toBe(false);
    expect(isFiltered(of('q=dairy'))).toBe(true);
  });
});
