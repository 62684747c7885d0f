import { corePairSchema } from '@shared/portal';
import { describe, expect, it } from 'vitest';
import { corePair, type KeptCoreTest } from './core-pair.js';

const test = (kind: KeptCoreTest['kind'], wattsPerKgReferred: number | null, more: Record<string, unknown> = {}, verdict = 'conforms'): KeptCoreTest => ({
  kind,
  verdict,
  readings: { target: { basis: 'standard', fluxDensityT: 1.32 } },
  result: { wattsPerKgReferred, expandedUncertaintyWPerKg: 0.2, increaseEstablished: false, judgements: [], ...more },
});
const compared = { increaseEstablished: true, comparison: { valid: true, increase: 0.186, expandedUncertainty: 0.024 }, judgements: [{ test: 'hot-spot', limit: 10 }, { test: 'increase', limit: 0.2 }] };

describe('the core before and after, as its owner sees it', () => {
  it('shows both figures at their flux, the increase with its uncertainty, and its limit', () => {
    const pair = corePair([test('core-test-before', 3.12), test('core-test-after', 3.7, compared, 'inconclusive')]);
    expect(corePairSchema.parse(pair)).toEqual({
      before: { wattsPerKg: 3.12, expandedUncertainty: 0.2, fluxDensityT: 1.32 },
      after: { wattsPerKg: 3.7, expandedUncertainty: 0.2, fluxDensityT: 1.32 },
      increase: { fraction: 0.186, expandedUncertainty: 0.024, limitFraction: 0.2 },
      verdict: 'inconclusive',
      established: true,
    });
  });

  it('without a test before says that the increase is not established', () => {
    const pair = corePair([test('core-test-after', 4.18)]);
    expect(pair).toMatchObject({ before: null, increase: null, established: false, verdict: 'conforms' });
  });

  it('takes the last valid test before and the last test after', () => {
    const pair = corePair([test('core-test-before', 3.1), test('core-test-before', 3.2), test('core-test-before', 9, {}, 'not-valid'), test('core-test-after', 5, compared, 'does-not-conform'), test('core-test-after', 3.3, compared)]);
    expect(pair).toMatchObject({ before: { wattsPerKg: 3.2 }, after: { wattsPerKg: 3.3 }, verdict: 'conforms' });
  });

  it('shows no figures of a test that is not valid, nor of one that could not tell', () => {
    expect(corePair([test('core-test-before', 9, {}, 'not-valid')])).toMatchObject({ before: null, verdict: 'not-valid' });
    expect(corePair([test('core-test-before', null)])).toMatchObject({ before: null });
    expect(corePair([test('core-test-before', 3), test('core-test-after', 4, { ...compared, comparison: { ...compared.comparison, valid: false } })])).toMatchObject({ increase: null, established: false });
  });

  it('is nothing where no core was tested', () => {
    expect(corePair([])).toBeNull();
  });
});
