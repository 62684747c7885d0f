import { describe, expect, it } from 'vitest';
import { readHistoryLines } from './history-lines.js';

const read = (text: string) => readHistoryLines(text, '2026-06-15');
const problems = (text: string) => {
  const found = read(text);
  return found.ok ? [] : found.problems;
};

describe('figures of an older book, typed or pasted', () => {
  it.each([
    ['2026-01-12 -2.2', -0.022],
    ['2026-01-12\t-2,2', -0.022],
    ['2026-1-9;0,4 %', 0.004],
    ['2026-01-12 −3.1', -0.031],
    ['2026-01-12, 61.2%', 0.612],
  ])('%j is read', (line, change) => {
    const found = read(line);
    if (!found.ok) throw new Error(found.problems.join(' '));
    expect(found.input.rows[0]!.change).toBeCloseTo(change, 9);
    expect(found.input.rows[0]!.day).toMatch(/^2026-01-\d\d$/);
  });
  it('two columns of a spreadsheet, with an empty line at the end', () => {
    const found = read('2026-01-12\t-2.2\r\n2026-01-16\t0.4\r\n');
    expect(found.ok && found.input.rows.map((r) => r.day)).toEqual(['2026-01-12', '2026-01-16']);
  });
  it.each([
    ['-2.2', 'Line 1: a day like 2026-01-31'],
    ['2026-02-30 1', 'Line 1: 2026-02-30 is no day'],
    ['2026-01-12 much', 'Line 1: much is no figure'],
    ['2026-06-16 1', 'Line 1: this day is still to come'],
    ['2026-01-12 2000', 'Line 1: between'],
    ['', 'Enter at least one line'],
  ])('%j is refused by its line', (text, words) => {
    expect(problems(text)[0]).toContain(words);
  });
  it('every wrong line is named, and nothing is half taken', () => {
    expect(problems('2026-01-12 1\nx\n2026-01-13 2\ny')).toEqual([expect.stringContaining('Line 2'), expect.stringContaining('Line 4')]);
  });
});
