import { describe, expect, it } from 'vitest';
import { vibrationLimit } from './index.js';

describe('Vibration limits', () => {
  // Source: IEC 60034-14:2003 table, grade A, read in two copies.
  it.each([
    ['free-suspension', 56, 1.6], ['free-suspension', 132, 1.6], ['free-suspension', 132.1, 2.2], ['free-suspension', 280, 2.2], ['free-suspension', 315, 2.8],
    ['rigid', 56, 1.3], ['rigid', 132, 1.3], ['rigid', 160, 1.8], ['rigid', 280, 1.8], ['rigid', 281, 2.3],
  ] as const)('%s, shaft height %d mm: %d mm/s rms', (mounting, heightMm, mmPerS) => {
    expect(vibrationLimit({ standard: 'iec-60034-14-2003', mounting, shaftHeightM: heightMm / 1000, speedRpm: null }).value * 1000).toBeCloseTo(mmPerS, 9);
  });
  // Source: IEC 60034-14:2003 table, grade B, read in two copies.
  it.each([
    ['free-suspension', 132, 0.7], ['free-suspension', 280, 1.1], ['free-suspension', 281, 1.8], ['rigid', 133, 0.9], ['rigid', 280, 0.9], ['rigid', 315, 1.5],
  ] as const)('grade B, %s, shaft height %d mm: %d mm/s rms', (mounting, heightMm, mmPerS) => {
    expect(vibrationLimit({ standard: 'iec-60034-14-2003', mounting, grade: 'B', shaftHeightM: heightMm / 1000, speedRpm: null }).value * 1000).toBeCloseTo(mmPerS, 9);
  });
  it('grade B has no figure for small machines on rigid mounts, and says so', () => {
    expect(() => vibrationLimit({ standard: 'iec-60034-14-2003', mounting: 'rigid', grade: 'B', shaftHeightM: 0.132, speedRpm: null })).toThrow(/take grade A/);
  });
  // Source: NEMA MG 1 Part 7 as in ANSI/EASA AR100-2015 4.5.6: 0.15 in/s peak, rigid 0.8 of it, 0.0025 in p-p up to 1200 rpm.
  it('NEMA allows 3.8 mm/s peak on resilient mounts and 3.0 on rigid', () => {
    const of = (mounting: 'free-suspension' | 'rigid', speedRpm: number) => vibrationLimit({ standard: 'nema-mg1', mounting, shaftHeightM: null, speedRpm }).value * 1000;
    expect(of('free-suspension', 1785)).toBeCloseTo(0.15 * 25.4, 9);
    expect(of('rigid', 1785)).toBeCloseTo(0.12 * 25.4, 9);
    // 0.0635 mm peak to peak at 720 rpm, 12 Hz: π × 12 × 0.0635 = 2.394 mm/s
    expect(of('free-suspension', 720)).toBeCloseTo(2.394, 3);
    expect(of('rigid', 720)).toBeCloseTo(2.394 * 0.8, 3);
  });
  it('asks for what the limit goes by', () => {
    const iec = { standard: 'iec-60034-14-2003', mounting: 'rigid', speedRpm: 1499 } as const;
    expect(() => vibrationLimit({ ...iec, shaftHeightM: null })).toThrow(/shaft height/);
    expect(() => vibrationLimit({ ...iec, shaftHeightM: NaN })).toThrow(/shaft height/);
    expect(() => vibrationLimit({ ...iec, shaftHeightM: 0.05 })).toThrow(/56 mm/);
    expect(() => vibrationLimit({ ...iec, standard: 'nema-mg1', shaftHeightM: 0.3, speedRpm: null })).toThrow(/speed/);
  });
});
