import fc from 'fast-check';
import { all, create, type MathJsInstance } from 'mathjs';
import { describe, expect, it } from 'vitest';
import { toShown, toSi, toSiFrom } from './convert-quantity.js';
import { KINDS, shownUnit, unitOf, type Kind } from './kinds.js';
import { OutOfRangeError } from './out-of-range-error.js';

const relative = (actual: number, expected: number) => Math.abs(actual / expected - 1);

describe('Conversion figures agree with GNU units', () => {
  // Source: the program GNU units 2.22 and newer, `units -t -d 8 '85000 maxwell/in^2' T` and so on.
  it.each<[number, string, Kind, number]>([
    [85000, 'lines/in²', 'flux-density', 1.3175026],
    [85, 'kl/in²', 'flux-density', 1.3175026],
    [1, 'Oe', 'field', 79.577472],
    [1, 'W/lb', 'specific-loss', 2.2046226],
    [1, 'A/in', 'field', 39.370079],
    [1, 'cmil', 'area', 5.0670748e-10],
    [1, 'oz·in', 'unbalance', 720.07789e-6],
    [1, 'hp', 'rated-power', 745.69987],
    [1, 'in/s', 'vibration-velocity', 0.0254],
    [1, 'lb/in³', 'density', 27679.905],
    [1, 'A/in²', 'current-density', 1550.0031],
    [1, 'PS', 'rated-power', 735.49875],
  ])('%d %s of %s is %d', (value, unit, kind, expected) => {
    expect(relative(toSiFrom(value, unit, kind), expected)).toBeLessThan(5e-8);
  });

  // Source: the table of trade units, computed from 1 lb = 0.45359237 kg (NIST SP 811 appendix B).
  it.each([
    [1, 2.205], [2, 4.409], [3, 6.614], [4, 8.818], [5, 11.023], [6, 13.228], [8, 17.637], [10, 22.046],
  ])('%d W/lb is %d W/kg', (perPound, perKg) => {
    expect(toSi(perPound, 'specific-loss', 'inch-pound')).toBeCloseTo(perKg, 3);
  });

  it.each([
    [85, 1.3175], [90, 1.395], [70, 1.085],
  ])('%d kilolines per square inch is %d tesla', (kilolines, tesla) => {
    expect(toSi(kilolines, 'flux-density', 'inch-pound')).toBeCloseTo(tesla, 4);
  });
  it('1.32 tesla is 85.16 kilolines per square inch', () => {
    expect(toShown(1.32, 'flux-density', 'inch-pound')).toBeCloseTo(85.16, 2);
  });
});

describe('Conversions agree with a second implementation, mathjs', () => {
  const math: MathJsInstance = create(all!, {});
  math.createUnit('line', '1e-8 Wb');
  const cases: [Kind, string, string][] = [
    ['length', 'inch', 'm'], ['cable-length', 'foot', 'm'], ['area', 'sqin', 'm^2'], ['mass', 'lbm', 'kg'], ['rated-power', 'hp', 'W'],
    ['specific-loss', 'W/lbm', 'W/kg'], ['flux-density', 'kline/inch^2', 'T'], ['density', 'lbm/inch^3', 'kg/m^3'],
    ['vibration-velocity', 'inch/s', 'm/s'], ['field', 'A/inch', 'A/m'], ['current-density', 'A/inch^2', 'A/m^2'], ['temperature', 'degF', 'degC'],
  ];
  math.createUnit('kline', '1000 line');
  it.each(cases)('%s from %s', (kind, from, to) => {
    for (const value of [0.37, 1, 85, 1234.5]) {
      expect(relative(toSi(value, kind, 'inch-pound'), math.unit(value, from).toNumber(to))).toBeLessThan(1e-7);
    }
  });
});

describe('Temperatures and their differences are kept apart', () => {
  it('50 °F is 10 °C, but a difference of 50 °F is 27.8 K', () => {
    expect(toSi(50, 'temperature', 'inch-pound')).toBe(10);
    expect(toSi(50, 'temperature-difference', 'inch-pound')).toBeCloseTo(27.7778, 4);
  });
  // Source: the trade's hot-spot figures, 10 °C = 18 °F and 15 °C = 27 °F over the core (common practice); burnout 370 °C = 700 °F and 400 °C = 750 °F rounded (ANSI/EASA AR100-2015 clause 3.3).
  it('a rise of 10 K is shown as 18 °F and of 15 K as 27 °F', () => {
    expect(toShown(10, 'temperature-difference', 'inch-pound')).toBe(18);
    expect(toShown(15, 'temperature-difference', 'inch-pound')).toBe(27);
  });
  it('370 °C is 698 °F, and −40 is the same in both', () => {
    expect(toShown(370, 'temperature', 'inch-pound')).toBe(698);
    expect(toSi(-40, 'temperature', 'inch-pound')).toBe(-40);
  });
});

describe('What every kind holds to', () => {
  it('every kind has a unit in both systems', () => {
    for (const kind of KINDS) for (const system of ['si', 'inch-pound'] as const) expect(shownUnit(kind, system).symbol).toBe(unitOf(kind, system));
  });
  it('shown and back is the same figure to the last places', () => {
    fc.assert(
      fc.property(fc.constantFrom(...KINDS), fc.constantFrom('si' as const, 'inch-pound' as const), fc.double({ min: -1e9, max: 1e9, noNaN: true }), (kind, system, value) => {
        const back = toSi(toShown(value, kind, system), kind, system);
        expect(Math.abs(back - value)).toBeLessThanOrEqual(Math.max(Math.abs(value), 100) * 1e-14);
      }),
    );
  });
  it('more is more: conversion keeps the order', () => {
    fc.assert(
      fc.property(fc.constantFrom(...KINDS), fc.double({ min: -1e6, max: 1e6, noNaN: true }), fc.double({ min: 1e-3, max: 1e6, noNaN: true }), (kind, low, more) => {
        expect(toSi(low + more, kind, 'inch-pound')).toBeGreaterThan(toSi(low, kind, 'inch-pound'));
      }),
    );
  });
  it.each([NaN, Infinity, -Infinity])('%d is refused', (value) => {
    expect(() => toSi(value, 'length', 'si')).toThrow(OutOfRangeError);
    expect(() => toShown(value, 'length', 'si')).toThrow(OutOfRangeError);
    expect(() => toSiFrom(value, 'mm', 'length')).toThrow(OutOfRangeError);
  });
  it('a unit of something else is refused', () => {
    expect(() => toSiFrom(1, 'kg', 'length')).toThrow(/does not measure length/);
  });
});
