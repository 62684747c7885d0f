import { describe, expect, it } from 'vitest';
import { ovenSentence } from './oven-sentence.js';
import { limitWords, percentWords } from './percent.js';
import { drifting, ovenOf, steady } from './sample-oven.fixture.js';

const spaced = (words: string) => words.replaceAll('\u202f', ' ');

describe('what an oven’s chart says, in one sentence', () => {
  it('spoke before its first core was lost: when, at what, and how long before', () => {
    expect(spaced(ovenSentence(drifting))).toBe('O2 spoke on 24 Sept 2026, at No. 23 (+0.6 %): 4 of 5 beyond 1 sigma, same side. That was 30 days before its first core went over the limit of 20 %: J2026-0004, +61.2 %, on 24 Oct 2026.');
  });
  it('speaks and no core is lost yet: look at the oven now', () => {
    const found = ovenOf(steady.points.map((p) => p.change * 100).concat([6]));
    expect(spaced(ovenSentence(found))).toContain('O2 spoke on 14 Sept 2026, at No. 21 (+6.0 %): one point beyond 3 sigma; a step wider than usual. No core has gone over the limit of 20 % since. Look at the oven now');
  });
  it('spoke with the very core that failed', () => {
    const found = ovenOf(steady.points.map((p) => p.change * 100), [['J2026-0004', 40]]);
    expect(spaced(ovenSentence(found))).toBe('O2 spoke on 14 Sept 2026, with the very core that went over the limit of 20 %: J2026-0004, +40.0 %.');
  });
  it('a core lost within the base period came before the chart could speak', () => {
    const changes = steady.points.map((p) => p.change * 100);
    const found = ovenOf([...changes.slice(0, 10), 30, ...changes.slice(11), -60]);
    expect(spaced(ovenSentence(found))).toContain('Its first core over the limit of 20 % came earlier: No. 11, +30.0 %');
  });
  it('a core lost that the chart did not see is said all the same', () => {
    expect(spaced(ovenSentence({ ...steady, failedAt: 5 }))).toContain('the chart saw no pattern');
  });
  it('a steady oven keeps as it was, with and without jobs since', () => {
    expect(ovenSentence(steady)).toBe('O2 keeps as it was. Its limits come from these 20 jobs; the next ones are held against them.');
    expect(ovenSentence(ovenOf(steady.points.map((p) => p.change * 100).concat([-1, -2])))).toBe('O2 keeps as it was: of 2 jobs since its limits were made none completes a pattern.');
  });
  it('too few jobs: the chart’s own words', () => {
    expect(ovenSentence({ ...steady, chart: { outcome: 'too-few-points', message: 'A chart needs at least 8 points.', basePoints: 3 } })).toBe('A chart needs at least 8 points.');
  });
});

describe('a change in percent', () => {
  it.each([[0.031, '+3.1 %'], [-0.0004, '0.0 %'], [-0.012, '−1.2 %'], [0, '0.0 %']])('%f is written %s', (fraction, words) => {
    expect(spaced(percentWords(fraction))).toBe(words);
  });
  it('a limit has no sign and no needless decimals', () => {
    expect(spaced(limitWords(0.2))).toBe('20 %');
    expect(spaced(limitWords(0.125))).toBe('12.5 %');
  });
});
