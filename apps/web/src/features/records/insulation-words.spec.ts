import type { TestJudgement } from '@libs/machine-tests';
import { describe, expect, it } from 'vitest';
import { bothRulesWords, testVoltsAsked, usualSurgePeakV } from './insulation-words.js';
import { figureOf, limitWords } from './judged-words.js';

describe('an insulation reading carried to 40 °C', () => {
  it('is shown by both rules, which differ much', () => {
    // 100 MΩ at 25 °C: 0.5^1.5 = 0.3536 by halving, exp(−1245·(1/298 − 1/313)) = 0.8186 by the rule of IEEE 43-2013
    expect(bothRulesWords({ resistanceOhm: 100e6, windingTemperatureC: 25 }, 'si')).toBe('This reading at 40 °C: 35.4 MΩ by halving, 81.9 MΩ by the thermosetting rule.');
  });

  it('says where a rule does not hold, and nothing before there is a reading', () => {
    expect(bothRulesWords({ resistanceOhm: 100e6, windingTemperatureC: 5 }, 'si')).toContain('outside its range by the thermosetting rule'); // it holds from 10 °C
    expect(bothRulesWords({ resistanceOhm: Number.NaN, windingTemperatureC: 25 }, 'si')).toBeNull();
  });
});

describe('the volts that are asked', () => {
  it('are those of IEEE 43’s table, with the least of them to take', () => {
    expect(testVoltsAsked(400, 'si')).toEqual({ leastV: 500, words: 'IEEE 43: 500.0 V DC at these rated volts.' });
    expect(testVoltsAsked(6600, 'si')).toMatchObject({ leastV: 2500, words: expect.stringContaining('2500.0 V to 5000.0 V') as string });
    expect(testVoltsAsked(Number.NaN, 'si')).toBeNull();
  });

  it('of a surge test are twice the rated volts and a thousand, random-wound below a thousand volts only (common practice)', () => {
    expect(usualSurgePeakV({ windingKind: 'random-wound', ratedVoltageV: 400 })).toBe(1800);
    expect(usualSurgePeakV({ windingKind: 'random-wound', ratedVoltageV: 1000 })).toBeNull();
    expect(usualSurgePeakV({ windingKind: 'form-wound', ratedVoltageV: 690 })).toBeNull();
    expect(usualSurgePeakV({ windingKind: 'random-wound', ratedVoltageV: Number.NaN })).toBeNull();
  });
});

describe('a limit in words', () => {
  const judged = (change: Partial<TestJudgement>): TestJudgement => ({ test: 'vibration', measured: 0.0014, unit: 'm/s', limit: 0.0028, verdict: 'conforms', source: 'IEC 60034-14:2003', standing: 'S', words: '', ...change });
  it('says which side of it is the right one', () => {
    expect(limitWords(judged({}), 'si')).toBe('at most 2.80 mm/s');
    expect(limitWords(judged({ test: 'insulation-resistance', unit: 'Ω', limit: 5e6 }), 'si')).toBe('at least 5.00 MΩ');
    expect(limitWords(judged({ test: 'high-potential', unit: 'V', limit: 1800 }), 'si')).toBe('asked 1800.0 V');
    expect(limitWords(judged({ test: 'direction', unit: '', limit: null }), 'si')).toBe('');
  });
  it('is in the units of what was judged', () => {
    expect(figureOf({ test: 'polarization-index', unit: '1' }, 2, 'si')).toBe('2.00');
    expect(figureOf({ test: 'winding-resistance-balance', unit: '1' }, 0.03, 'si')).toBe('3.0 %');
    expect(figureOf({ test: 'bearing-rise', unit: 'K' }, 40, 'si')).toBe('40.0 K');
  });
});
