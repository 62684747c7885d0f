import { QUOTE_STATES, type QuoteState } from '@shared/quotes';
import { describe, expect, it } from 'vitest';
import { isDoneAlready, isExpired, moveRefusal, nextQuoteState, type QuoteAct } from './quote-state.js';

const ACTS: QuoteAct[] = ['change', 'send', 'approve', 'decline', 'revise'];
/** The whole table as the office would write it on a wall: state and act, and where it leads. */
const ALLOWED: Record<string, QuoteState> = {
  'draft change': 'draft',
  'draft send': 'sent',
  'sent approve': 'approved',
  'sent decline': 'declined',
  'sent revise': 'superseded',
  'approved revise': 'superseded',
  'declined revise': 'superseded',
};

describe('the moves of a quote', () => {
  it('exist as written on the wall, and no others', () => {
    const found: Record<string, QuoteState> = {};
    for (const state of QUOTE_STATES) for (const act of ACTS) if (nextQuoteState(state, act)) found[`${state} ${act}`] = nextQuoteState(state, act)!;
    expect(found).toEqual(ALLOWED);
  });

  it('nothing can be done to a superseded quote', () => {
    expect(ACTS.map((act) => nextQuoteState('superseded', act))).toEqual([null, null, null, null, null]);
  });

  it('every refusal says how the quote stands and what to do instead', () => {
    for (const state of QUOTE_STATES) {
      for (const act of ACTS) {
        if (nextQuoteState(state, act)) continue;
        expect(moveRefusal(state, act)).toMatch(/^[A-Z].+: [a-z].+\.$/);
      }
    }
    expect(moveRefusal('superseded', 'approve')).toBe('A newer revision has taken this quote’s place: only the newest can be approved.');
  });

  it('the same answer given twice is told from a wrong one', () => {
    expect(isDoneAlready('approved', 'approve')).toBe(true);
    expect(isDoneAlready('approved', 'decline')).toBe(false);
    expect(isDoneAlready('declined', 'approve')).toBe(false);
    expect(isDoneAlready('superseded', 'approve')).toBe(false);
  });
});

describe('the validity of a quote', () => {
  it('holds through its last day and ends with it', () => {
    expect(isExpired('2026-03-31', '2026-03-30')).toBe(false);
    expect(isExpired('2026-03-31', '2026-03-31')).toBe(false);
    expect(isExpired('2026-03-31', '2026-04-01')).toBe(true);
  });
});
