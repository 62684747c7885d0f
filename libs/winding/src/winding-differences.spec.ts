import { OutOfRangeError } from '@libs/quantities';
import { describe, expect, it } from 'vitest';
import { windingDifferences, type WindingData } from './index.js';
import { sampleWinding } from './sample-windings.fixture.js';

const found: WindingData = { ...sampleWinding(12), coilExtensionM: 0.06 };
const compare = (change: Partial<WindingData>) => windingDifferences(found, { ...found, ...change });
const asked = (change: Partial<WindingData>) => compare(change).filter((d) => d.is === 'ask').map((d) => d.item);
const row = (change: Partial<WindingData>, item: string) => compare(change).find((d) => d.item === item)!;

describe('the winding as wound beside the winding as found', () => {
  it('of an exact copy is the same in every item', () => {
    expect(compare({}).map((d) => d.is)).toEqual(Array.from({ length: 13 }, () => 'same'));
  });
  it('keeps flux and copper when circuits, turns and wire change together', () => {
    const four = { circuits: 4, turnsPerCoil: 24, wires: [{ strands: 2, bareDiameterM: 0.00106 }] };
    expect(asked(four)).toEqual([]);
    expect(row(four, 'circuits').is).toBe('changed');
    expect(row(four, 'flux').is).toBe('same');
    expect(row(four, 'copper').is).toBe('same');
  });
  it('keeps flux and copper when a delta becomes a star of 1.7321 times fewer turns', () => {
    const star = { connection: 'star' as const, turnsPerCoil: 12 / Math.sqrt(3), wires: [{ strands: 4, bareDiameterM: 0.00106 * 3 ** 0.25 }] };
    expect(row(star, 'flux').is).toBe('same');
    expect(row(star, 'copper').is).toBe('same');
    expect(row(star, 'connection')).toMatchObject({ is: 'changed', asFound: 'delta', asWound: 'star' });
  });
  it('tells a turn more as less flux, and asks beyond 10 %', () => {
    expect(row({ turnsPerCoil: 13 }, 'flux').change).toBeCloseTo(12 / 13 - 1, 9);
    expect(asked({ turnsPerCoil: 13 })).toEqual([]);
    expect(asked({ turnsPerCoil: 14 })).toEqual(['flux']);
    expect(row({ turnsPerCoil: 10 }, 'flux').words).toMatch(/^Flux \+20\.0 %/);
  });
  it('asks when a parallel circuit was closed that was open: twice the flux', () => {
    expect(row({ circuits: 4 }, 'flux').change).toBeCloseTo(1, 9);
    expect(asked({ circuits: 4 })).toEqual(['flux']);
  });
  it('asks for less copper than before, but not for a gauge rounded by a hair', () => {
    expect(asked({ wires: [{ strands: 4, bareDiameterM: 0.001 }] })).toEqual(['copper']);
    expect(asked({ wires: [{ strands: 4, bareDiameterM: 0.001059 }] })).toEqual([]);
    expect(row({ wires: [{ strands: 4, bareDiameterM: 0.00118 }] }, 'copper').words).toMatch(/goes into the slots/);
  });
  it('asks for longer coil ends and a longer mean turn, not for shorter ones', () => {
    expect(asked({ coilExtensionM: 0.066, meanTurnM: 1 })).toEqual(['coilExtension', 'meanTurn']);
    expect(asked({ coilExtensionM: 0.055, meanTurnM: 0.96 })).toEqual([]);
    expect(row({ coilExtensionM: null }, 'coilExtension').is).toBe('not-recorded');
  });
  it('asks for another number of poles, and for slots that a core cannot have grown', () => {
    expect(asked({ poles: 8, spanTo: 6 })).toContain('poles');
    expect(asked({ slots: 36, coils: 36 })).toContain('slots');
  });
  it('compares a lifting magnet by its turns and copper alone', () => {
    const magnet: WindingData = { slots: 8, poles: 2, layers: 1, coils: 2, turnsPerCoil: 102, spanTo: 2, connection: 'single', circuits: 1, wires: [{ strands: 1, bareDiameterM: 0.0016 }] };
    const rows = windingDifferences(magnet, { ...magnet, turnsPerCoil: 100 });
    expect(rows.find((d) => d.item === 'flux')!.change).toBeCloseTo(0.02, 9);
    expect(windingDifferences(magnet, { ...sampleWinding(12) }).filter((d) => d.is === 'ask').map((d) => d.item)).toEqual(['slots', 'poles', 'connection']);
  });
  it('refuses to compare with data that cannot be', () => expect(() => compare({ turnsPerCoil: 0 })).toThrow(OutOfRangeError));
});
