import { describe, expect, it } from 'vitest';
import { isOpenedByAPerson, plainPage } from './plain-page.js';

describe('a paper that cannot be shown, opened in a tab of its own', () => {
  it('is answered with words and a way on, with nothing taken for markup', () => {
    const page = plainPage('There is nothing at <this> address.', 'r-1"');
    expect(page).toContain('<h1>There is nothing at &lt;this&gt; address.</h1>');
    expect(page).toContain('<a href="/">To the start</a>');
    expect(page).toContain('Request number r-1&quot;');
  });

  it('is told from a page that asks for data by what the browser says it is for (W3C Fetch Metadata, Sec-Fetch-Dest)', () => {
    expect(isOpenedByAPerson({ method: 'GET', headers: { 'sec-fetch-dest': 'document' } })).toBe(true);
    expect(isOpenedByAPerson({ method: 'GET', headers: { 'sec-fetch-dest': 'empty' } })).toBe(false);
    expect(isOpenedByAPerson({ method: 'GET', headers: {} })).toBe(false);
    expect(isOpenedByAPerson({ method: 'POST', headers: { 'sec-fetch-dest': 'document' } })).toBe(false);
  });
});
