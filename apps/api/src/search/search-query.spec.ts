import { describe, expect, it } from 'vitest';
import { contains, startsWith } from './like-pattern.js';
import { jobOfAddress } from './search-query.js';

describe('what is typed into the search box', () => {
  it('means itself, wildcards of the database too', () => {
    expect(contains('50%_a\\b')).toBe('%50\\%\\_a\\\\b%');
    expect(startsWith('50%')).toBe('50\\%%');
  });

  it.each([
    ['https://shop.example/jobs/0193-abcd-12', '0193-abcd-12'],
    ['/jobs/0193abcd?from=tag', '0193abcd'],
    ['http://shop.example/jobs/0193abcd/', '0193abcd'],
    ['J2026-0001', null],
    ['https://shop.example/portal/0193abcd', null],
    ["/jobs/' OR 1=1 --", null],
    ['/jobs/short', null],
  ])('%j is the address of job %j', (typed, id) => {
    expect(jobOfAddress(typed)).toBe(id);
  });
});
