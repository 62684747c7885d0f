import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decimalMarkOf, readNumberCell } from './number-cell.js';
import { toCelsius, unitFromText } from './temperature-unit.js';

const value = (cell: string, mark: '.' | ',') => {
  const read = readNumberCell(cell, mark);
  return typeof read === 'string' ? read : read.value;
};

describe('A number in a cell', () => {
  it.each([['351.2', 351.2], ['-4', -4], ['−4.5', -4.5], ['+20', 20], ['.5', 0.5], ['1,051.5', 1051.5], ["1'051.5", 1051.5], ['1 051.5', 1051.5], ['3.512e2', 351.2], ['351.', 351]])('%s with a point is %d', (cell, wanted) => {
    expect(value(cell, '.')).toBe(wanted);
  });
  it.each([['351,2', 351.2], ['-4', -4], ['1.051,5', 1051.5], ['1\u00a0051,5', 1051.5], [',5', 0.5]])('%s with a comma is %d', (cell, wanted) => {
    expect(value(cell, ',')).toBe(wanted);
  });
  it('with the other decimal mark is not guessed', () => {
    expect(value('351.2', ',')).toBe('other-decimal-mark');
    expect(value('351,2', '.')).toBe('other-decimal-mark');
  });
  it.each(['OL', '----', 'open', 'NaN', 'Err 2', '#N/A', '12:30', '1.2.3', '5 bar', 'Infinity'])('%s is text', (cell) => {
    expect(value(cell, '.')).toBe('text');
    expect(value(cell, ',')).toBe('text');
  });
  it('may bring its unit', () => {
    expect(readNumberCell('698.0 °F', '.')).toEqual({ value: 698, unit: 'F' });
    expect(readNumberCell('351,2°C', ',')).toEqual({ value: 351.2, unit: 'C' });
    expect(readNumberCell('', '.')).toBe('empty');
  });
  it('is read back as it was written, with either mark', () => {
    fc.assert(
      fc.property(fc.integer({ min: -99999, max: 1999999 }), fc.integer({ min: 0, max: 4 }), (n, places) => {
        const x = n / 10 ** places;
        expect(value(x.toFixed(places), '.')).toBeCloseTo(x, 10);
        expect(value(x.toFixed(places).replace('.', ','), ',')).toBeCloseTo(x, 10);
      }),
    );
  });
});

describe('The decimal mark of a file', () => {
  it('is the one its figures show', () => {
    expect(decimalMarkOf(['20,5', '21,0', '345'])).toBe(',');
    expect(decimalMarkOf(['20.5', '21.0', 'OL'])).toBe('.');
    expect(decimalMarkOf(['1.051,5', '999,25'])).toBe(',');
    expect(decimalMarkOf(['1,051.5', '999.25'])).toBe('.');
    expect(decimalMarkOf(['1.051', '999,2'])).toBe(',');
    expect(decimalMarkOf(['1,051', '1,052', '999.2'])).toBe('.');
  });
  it('is open while all figures are whole', () => {
    expect(decimalMarkOf(['20', '21', ''])).toBeNull();
    expect(decimalMarkOf([])).toBeNull();
  });
  it('three places behind the only mark are a fraction where nothing speaks against it', () => {
    expect(decimalMarkOf(['20.125', '21.250'])).toBe('.');
    expect(decimalMarkOf(['20,125', '21,250'])).toBe(',');
  });
});

describe('Units of temperature', () => {
  it.each([['°C', 'C'], ['[degC]', 'C'], ['(°F)', 'F'], ['deg F', 'F'], ['Â°C', 'C'], ['\ufffdC', 'C'], ['℃', 'C'], ['K', 'K'], ['Celsius', 'C'], ['degrees Fahrenheit', 'F']])('%s', (text, unit) => {
    expect(unitFromText(text)).toBe(unit);
  });
  it.each(['%RH', 'V', 'mA', '', 'Core', 'kPa'])('%s is none', (text) => {
    expect(unitFromText(text)).toBeNull();
  });
  it('are turned to °C', () => {
    expect(toCelsius(698, 'F')).toBe(370);
    expect(toCelsius(32, 'F')).toBe(0);
    expect(toCelsius(273.15, 'K')).toBe(0);
    expect(toCelsius(370, 'C')).toBe(370);
  });
});
