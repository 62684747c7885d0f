import { describe, expect, it } from 'vitest';
import { readHeaderCell } from './header-cell.js';

describe('The heading of a column', () => {
  it.each([
    ['Core 1 (°C)', 'Core 1', 'C'],
    ['T2 [degF]', 'T2', 'F'],
    ['Oven, °C', 'Oven', 'C'],
    ['Oven, F', 'Oven', 'F'],
    ['Tooth °F', 'Tooth', 'F'],
    ['Tooth', 'Tooth', null],
    ['Core (drive end)', 'Core (drive end)', null],
    ['C', 'C', null],
    ['°C', '', 'C'],
  ] as const)('%s', (cell, name, unit) => {
    expect(readHeaderCell(cell)).toEqual({ name, unit, otherUnit: false });
  });
  it('may have its unit in the row below', () => {
    expect(readHeaderCell('Core 1', 'C')).toEqual({ name: 'Core 1', unit: 'C', otherUnit: false });
    expect(readHeaderCell('Fan', 'rpm')).toEqual({ name: 'Fan', unit: null, otherUnit: true });
  });
  it('with the unit of something else is no temperature', () => {
    expect(readHeaderCell('Humidity (%RH)')).toMatchObject({ otherUnit: true });
    expect(readHeaderCell('Supply [V]')).toMatchObject({ otherUnit: true });
  });
});
