import { STEPS } from '@shared/route';
import { describe, expect, it } from 'vitest';
import { coreStripOf, coreWords } from './core-words.js';
import { thingsToDo } from './next-thing.js';
import { happensNow, plainStep } from './plain-words.js';
import { quoteStateWords } from './state-words.js';

const quote = (number: string, validUntil: string) => ({ id: `quote-${number}`, number, revision: 1, jobId: 'job-00001', jobNumber: 'J2026-0001', customerName: 'Senngrund Dairy', state: 'sent' as const, currency: 'EUR', grossMinor: 100, validUntil });
const invoice = (number: string, dueOn: string, overdue = false) => ({ id: `invoice-${number}`, number, jobId: 'job-00001', jobNumber: 'J2026-0001', customerName: 'Senngrund Dairy', state: 'open' as const, currency: 'EUR', grossMinor: 100, balanceMinor: 100, issuedAt: '2026-11-01T08:00:00.000Z', dueOn, overdue });
const numbers = (home: Parameters<typeof thingsToDo>[0]) => thingsToDo(home).map((thing) => (thing.kind === 'quote' ? thing.quote.number : thing.invoice.number));

describe('what the customer is asked to do', () => {
  it('is a late invoice first, then the quote a machine waits for, then invoices by their day', () => {
    expect(numbers({ quotesToAnswer: [quote('Q2', '2026-12-26'), quote('Q1', '2026-12-20')], invoicesToPay: [invoice('R3', '2026-12-30'), invoice('R2', '2026-12-10'), invoice('R1', '2026-11-01', true)] })).toEqual(['R1', 'Q1', 'Q2', 'R2', 'R3']);
  });

  it('is nothing when nothing waits', () => {
    expect(thingsToDo({ quotesToAnswer: [], invoicesToPay: [] })).toEqual([]);
  });
});

describe('what happens to a machine, in the words of its owner', () => {
  it('is said for every step, without the words of the bay', () => {
    for (const step of STEPS) {
      expect(plainStep(step)).not.toBe('');
      expect(happensNow({ step, state: 'open' }, [])).not.toMatch(/strip|burnout|varnish|gate/i);
    }
  });

  it('waits for the customer’s word only while a quote is out', () => {
    const job = { step: 'awaiting-approval' as const, state: 'open' as const };
    expect(happensNow(job, ['sent', 'superseded'])).toContain('as soon as we have your word');
    expect(happensNow(job, ['approved'])).toContain('We have your word');
    expect(happensNow(job, ['declined'])).toContain('prepare your quote');
    expect(happensNow(job, [])).toContain('prepare your quote');
    expect(happensNow(job, 'unknown')).toContain('Open it');
  });

  it('says how a job ended, or that it rests', () => {
    expect(happensNow({ step: 'rewind', state: 'on-hold' }, [])).toContain('rests');
    expect(happensNow({ step: 'rewind', state: 'scrapped' }, [])).toContain('scrapped, as agreed');
    expect(happensNow({ step: 'released', state: 'released' }, [])).toContain('has left our shop');
  });

  it('says of a quote that its last day has passed, and not on that day', () => {
    expect(quoteStateWords({ state: 'sent', validUntil: '2026-12-01' }, '2026-12-01').words).toBe('waits for your answer');
    expect(quoteStateWords({ state: 'sent', validUntil: '2026-12-01' }, '2026-12-02').words).toBe('past its last day');
  });
});

describe('the two core tests in plain words', () => {
  // the 11 kW separator motor of the sample shop: 3.88 W/kg before, 4.00 W/kg after
  const before = { wattsPerKg: 3.88, expandedUncertainty: 0.27, fluxDensityT: 1.32 };
  const after = { wattsPerKg: 4.0, expandedUncertainty: 0.28, fluxDensityT: 1.32 };
  const increase = { fraction: 0.0312, expandedUncertainty: 0.0209, limitFraction: 0.2 };
  const pair = { before, after, increase, verdict: 'conforms', established: true };
  const words = (of: Parameters<typeof coreWords>[0]) => coreWords(of).join(' ');

  it('say how much more the core loses, how sure that is, and what is accepted', () => {
    expect(words(pair)).toBe('After the old winding came out the core loses 3.1 % more than before, give or take 2.1 %. Up to 20 % more is accepted. Your core took no harm.');
  });

  it('say less where it is less, with no minus sign', () => {
    expect(words({ ...pair, increase: { ...increase, fraction: -0.04 } })).toContain('4.0 % less than before');
  });

  it('promise nothing where the increase is not established', () => {
    const text = words({ ...pair, increase: null, established: false, verdict: 'inconclusive' });
    expect(text).toContain('cannot be compared');
    expect(text).not.toContain('took no harm');
  });

  it('say that there is no before test when there is none', () => {
    expect(words({ before: null, after, increase: null, verdict: 'conforms', established: false })).toBe('There is no test from before the old winding came out, so the core was judged by itself. It is within its limit.');
    expect(words({ before, after: null, increase: null, verdict: 'conforms', established: false })).toContain('tested again afterwards');
  });

  it('draw both with the limit over the before test, and nothing where there is no figure', () => {
    const strip = coreStripOf(pair, 'si')!;
    expect(strip.limit?.value).toBeCloseTo(3.88 * 1.2, 10);
    expect(strip.before?.words).toBe('3.88 ± 0.27');
    expect(strip.unit).toBe('W/kg');
    expect(coreStripOf({ before: null, after: null, increase: null, verdict: 'not-valid', established: false }, 'si')).toBeNull();
  });

  it('are drawn in watts per pound for who reads inch-pound', () => {
    // 1 lb = 0.45359237 kg exactly (NIST SP 811, appendix B)
    expect(coreStripOf(pair, 'inch-pound')?.after[0]?.value).toBeCloseTo(4.0 * 0.45359237, 6);
  });
});
