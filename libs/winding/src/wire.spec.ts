import { OutOfRangeError } from '@libs/quantities';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CIRCULAR_MIL_M2, METRIC_SIZES_M, METRIC_WIRES, awgDiameter, awgGauge, awgName, conductorArea, copperResistivity, substituteWires } from './index.js';

describe('American wire gauge', () => {
  // GNU units 2.22, wiregauge(n) in mm
  it.each([
    [6, 4.1153781],
    [8, 3.2636432],
    [10, 2.5881867],
    [14, 1.6277266],
    [18, 1.0236873],
    [20, 0.81182097],
    [24, 0.51055923],
    [30, 0.254639],
    [36, 0.127],
  ])('gauge %i is %f mm thick, as GNU units says', (gauge, millimetres) => expect(awgDiameter(gauge) * 1000).toBeCloseTo(millimetres, 6));
  // a public copper table prints these ohms for a thousand feet at 20 °C
  it.each([
    [-3, 0.04901],
    [6, 0.3951],
    [8, 0.6282],
  ])('a thousand feet of gauge %i have %f Ω, as a copper table prints', (gauge, ohm) => {
    const area = conductorArea([{ strands: 1, bareDiameterM: awgDiameter(gauge) }]);
    expect(Number(((copperResistivity(20) * 304.8) / area).toPrecision(4))).toBeCloseTo(ohm, 4);
  });
  it('4/0 has 211 600 circular mils', () => expect(conductorArea([{ strands: 1, bareDiameterM: awgDiameter(-3) }]) / CIRCULAR_MIL_M2).toBeCloseTo(211_600, 3));
  it('grows thinner by 1.122932 a step', () => {
    fc.assert(fc.property(fc.integer({ min: -3, max: 55 }), (n) => void expect(awgDiameter(n) / awgDiameter(n + 1)).toBeCloseTo(1.122932, 6)));
  });
  it('is read as the trade writes it, and named back', () => {
    expect(['18', 'AWG 18', '#18', '4/0', '0000', '1/0', '0'].map(awgGauge)).toEqual([18, 18, 18, -3, -3, 0, 0]);
    expect(['', 'x', '57', '5/0', '1.8', '-3'].map(awgGauge)).toEqual([undefined, undefined, undefined, undefined, undefined, undefined]);
    fc.assert(fc.property(fc.integer({ min: -3, max: 56 }), (n) => void expect(awgGauge(awgName(n))).toBe(n)));
  });
  it.each([-4, 57, Number.NaN])('refuses gauge %f', (gauge) => expect(() => awgDiameter(gauge)).toThrow(OutOfRangeError));
});

describe('copper of one turn', () => {
  const area = (strands: number, millimetres: number) => conductorArea([{ strands, bareDiameterM: millimetres / 1000 }]);
  // geometry, computed
  it('two of gauge 21 stand for one of 18 to 0.25 %, and two of 18 for one of 15', () => {
    const gauge = (strands: number, n: number) => area(strands, awgDiameter(n) * 1000);
    expect(gauge(2, 21) / gauge(1, 18)).toBeCloseTo(0.9975, 3);
    expect(gauge(2, 18) / gauge(1, 15)).toBeCloseTo(0.9975, 3);
    expect(area(1, 1) / gauge(1, 18)).toBeCloseTo(0.9543, 4);
  });
  it('2 × 0.71 is 0.82 % more than 1 × 1.00, 2 × 0.75 is 0.12 % more than 1 × 1.06', () => {
    expect(area(2, 0.71) / area(1, 1)).toBeCloseTo(1.0082, 4);
    expect(area(2, 0.75) / area(1, 1.06)).toBeCloseTo(1.0012, 4);
  });
  it('adds up wires of several sizes, round and flat', () => {
    expect(conductorArea([{ strands: 2, bareDiameterM: 0.001 }, { strands: 1, widthM: 0.0056, thicknessM: 0.0019 }]) * 1e6).toBeCloseTo(Math.PI / 2 + 10.64, 9);
  });
  it.each([
    ['no wire', []],
    ['no strands', [{ strands: 0, bareDiameterM: 0.001 }]],
    ['NaN for a diameter', [{ strands: 1, bareDiameterM: Number.NaN }]],
    ['a flat wire without thickness', [{ strands: 1, widthM: 0.005, thicknessM: 0 }]],
  ])('refuses %s', (_, wires) => expect(() => conductorArea(wires)).toThrow(OutOfRangeError));
});

describe('metric wire', () => {
  it('grows in size and in film', () => {
    METRIC_WIRES.forEach((w, i) => {
      expect(w.grade1MostM).toBeGreaterThan(w.bareM);
      expect(w.grade2MostM).toBeGreaterThan(w.grade1MostM);
      if (i > 0) expect(w.bareM).toBeGreaterThan(METRIC_WIRES[i - 1]!.bareM);
    });
    expect(new Set(METRIC_SIZES_M).size).toBe(METRIC_SIZES_M.length);
  });
  // preferred numbers (ISO 3): twenty or forty steps a decade
  it('keeps to twenty or forty steps a decade', () => {
    for (const size of METRIC_SIZES_M) {
      const step = 40 * Math.log10(size * 1000);
      expect(Math.abs(step - Math.round(step)), `${size}`).toBeLessThan(0.25);
    }
  });
});

describe('a wire that is not on the shelf', () => {
  const wanted = conductorArea([{ strands: 1, bareDiameterM: 0.00106 }]);
  it('is replaced by the nearest that has no less copper: 2 × 0.75 for 1 × 1.06', () => {
    const [best] = substituteWires({ areaM2: wanted, sizesM: [0.0006, 0.00075, 0.0009], mostStrands: 3 });
    expect(best!.wires).toEqual([{ strands: 2, bareDiameterM: 0.00075 }]);
    expect(best!.change).toBeCloseTo(0.0012, 4);
  });
  it('is never replaced by less copper than asked for, nor by more strands, whatever lies on the shelf', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-7, max: 2e-5, noNaN: true }), fc.subarray([...METRIC_SIZES_M]), fc.integer({ min: 1, max: 8 }), (areaM2, sizesM, mostStrands) => {
        const offers = substituteWires({ areaM2, sizesM, mostStrands });
        offers.forEach((offer, i) => {
          expect(offer.change).toBeGreaterThanOrEqual(0);
          expect(offer.change).toBeLessThanOrEqual(0.05);
          expect(conductorArea(offer.wires)).toBeCloseTo(offer.areaM2, 15);
          expect(offer.wires.reduce((sum, w) => sum + w.strands, 0)).toBeLessThanOrEqual(mostStrands);
          if (i > 0) expect(Math.abs(offer.change)).toBeGreaterThanOrEqual(Math.abs(offers[i - 1]!.change));
        });
      }),
      { numRuns: 60 },
    );
  });
  it('may lose a little copper only where the shop says so', () => {
    const request = { areaM2: conductorArea([{ strands: 1, bareDiameterM: awgDiameter(18) }]), sizesM: [awgDiameter(21)], mostStrands: 2 };
    expect(substituteWires(request)).toEqual([]);
    expect(substituteWires({ ...request, leastChange: -0.01 })).toHaveLength(1);
  });
  it.each([
    ['no area', { areaM2: 0 }],
    ['no strand', { mostStrands: 0 }],
    ['a wire of no thickness', { sizesM: [0] }],
    ['limits the wrong way round', { leastChange: 0.1 }],
    ['NaN for a limit', { mostChange: Number.NaN }],
  ])('refuses %s', (_, change) => expect(() => substituteWires({ areaM2: wanted, sizesM: [0.001], mostStrands: 2, ...change })).toThrow(OutOfRangeError));
});
