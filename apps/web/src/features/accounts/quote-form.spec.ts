import { describe, expect, it } from 'vitest';
import { parseDecimal } from './decimal.js';
import { emptyLine, formOf, liveTotals, readFigure, readQuote, usualLastDay, type LineForm, type QuoteForm } from './quote-form.js';

const line = (changes: Partial<LineForm>): LineForm => ({ ...emptyLine('19'), description: 'Rewind', unitPriceMinor: '78', ...changes });
const form = (...lines: LineForm[]): QuoteForm => ({ lines, validUntil: '2026-12-31', note: '' });
const problemsOf = (of: QuoteForm, currency = 'EUR') => readQuote(of, currency).problems.map((p) => p.path);

describe('a quantity as it is typed', () => {
  it('takes a comma and a point alike', () => {
    expect(parseDecimal('1,5', 3)).toEqual({ ok: true, whole: 1500 });
    expect(parseDecimal('1.5', 3)).toEqual({ ok: true, whole: 1500 });
    expect(parseDecimal(' 24 ', 3)).toEqual({ ok: true, whole: 24_000 });
    expect(parseDecimal('0.125', 3)).toEqual({ ok: true, whole: 125 });
  });

  it('does not guess what a sign between thousands means, and refuses words', () => {
    expect(parseDecimal('1.500,5', 3)).toEqual({ ok: false, reason: 'not-a-number' });
    expect(parseDecimal('six', 3)).toEqual({ ok: false, reason: 'not-a-number' });
    expect(parseDecimal('-2', 3)).toEqual({ ok: false, reason: 'not-a-number' });
    expect(parseDecimal('', 3)).toEqual({ ok: false, reason: 'empty' });
  });

  it('lets nothing fall behind the last digit it can keep', () => {
    expect(parseDecimal('0.1234', 3)).toEqual({ ok: false, reason: 'too-many-decimals' });
    expect(parseDecimal('0.1000', 3)).toEqual({ ok: true, whole: 100 });
  });

  it('takes a tax rate with or without its sign', () => {
    expect(readFigure('taxRateBasisPoints', '19 %', 'EUR')).toEqual({ ok: true, value: 1900 });
    expect(readFigure('taxRateBasisPoints', '7,5', 'EUR')).toEqual({ ok: true, value: 750 });
    expect(readFigure('taxRateBasisPoints', '0', 'EUR')).toEqual({ ok: true, value: 0 });
  });
});

describe('the quote as it will be sent', () => {
  it('is in thousandths, minor units and hundredths of a percent', () => {
    const { candidate, problems } = readQuote(form(line({ quantityThousandths: '1,5', unit: 'h', unitPriceMinor: '85,33' })), 'EUR');
    expect(problems).toEqual([]);
    expect(candidate).toMatchObject({ lines: [{ quantityThousandths: 1500, unitPriceMinor: 8533, taxRateBasisPoints: 1900, unit: 'h' }], validUntil: '2026-12-31' });
  });

  it('names each field that stands in its way by the contract’s own name', () => {
    expect(problemsOf({ ...form(line({}), line({ unitPriceMinor: 'a lot', taxRateBasisPoints: '' })), validUntil: null })).toEqual(['lines.1.unitPriceMinor', 'lines.1.taxRateBasisPoints', 'validUntil']);
  });

  it('refuses a negative price', () => {
    expect(problemsOf(form(line({ unitPriceMinor: '-5' })))).toEqual(['lines.0.unitPriceMinor']);
  });

  it('knows currencies with no decimals and with three', () => {
    expect(readQuote(form(line({ unitPriceMinor: '500' })), 'JPY').candidate).toMatchObject({ lines: [{ unitPriceMinor: 500 }] });
    expect(readQuote(form(line({ unitPriceMinor: '5,120' })), 'BHD').candidate).toMatchObject({ lines: [{ unitPriceMinor: 5120 }] });
  });

  it('comes back from the server as the same figures', () => {
    const kept = {
      currency: 'EUR', validUntil: '2026-12-31', note: '',
      lines: [{ kind: 'material' as const, description: 'Winding wire', quantityThousandths: 24_900, unit: 'kg', unitPriceMinor: 123_450, taxRateBasisPoints: 750, netMinor: 3_073_905, taxMinor: 230_543 }],
    };
    const back = formOf(kept);
    expect(back.lines[0]).toMatchObject({ quantityThousandths: '24.9', unitPriceMinor: '1234.50', taxRateBasisPoints: '7.5' });
    expect(readQuote(back, 'EUR').candidate).toMatchObject({ lines: [{ quantityThousandths: 24_900, unitPriceMinor: 123_450, taxRateBasisPoints: 750 }] });
  });

  it('holds for thirty days unless another day is given', () => {
    expect(usualLastDay('2026-12-01')).toBe('2026-12-31');
    expect(usualLastDay('2028-02-28')).toBe('2028-03-29');
  });
});

describe('sums while a quote is typed', () => {
  it('round each line for itself, as the server will', () => {
    // 1.5 h at 85.33 is 127.995, so 128.00; its tax of 19 % is 24.32: common practice, a half away from zero
    expect(liveTotals([line({ quantityThousandths: '1.5', unitPriceMinor: '85.33' })], 'EUR').sums).toMatchObject({ netMinor: 12_800, taxMinor: 2432, grossMinor: 15_232 });
  });

  it('leave a line that is not complete out, and say which', () => {
    const live = liveTotals([line({}), line({ unitPriceMinor: '' }), line({ quantityThousandths: '2' })], 'EUR');
    expect(live.netOfLine).toEqual([7800, null, 15_600]);
    expect(live.leftOut).toEqual([2]);
    expect(live.sums?.netMinor).toBe(23_400);
  });

  it('are not there while no line is complete', () => {
    expect(liveTotals([emptyLine()], 'EUR')).toEqual({ netOfLine: [null], sums: null, leftOut: [1] });
  });

  it('leave out what is too large to reckon exactly', () => {
    expect(liveTotals([line({ quantityThousandths: '999999999', unitPriceMinor: '9999999999' })], 'EUR').sums).toBeNull();
  });
});
