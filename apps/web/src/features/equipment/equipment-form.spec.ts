import type { EquipmentView } from '@shared/equipment';
import { describe, expect, it } from 'vitest';
import { equipmentDifferences } from './equipment-differences.js';
import { equipmentFormOf, newOven, newSupply, onTopOf, readEquipment, readTaps, type EquipmentForm } from './equipment-form.js';

const BAY: EquipmentView = {
  version: 3,
  supplies: [
    { id: 's1', name: 'S1 variable', kind: 'variable', minVoltsV: 0, maxVoltsV: 260, maxAmpsA: 40, frequencyHz: 50 },
    { id: 's2', name: 'S2', kind: 'taps', minVoltsV: 10, maxVoltsV: 40, maxAmpsA: 600, frequencyHz: 50, tapsV: [10, 20.5, 40] },
  ],
  cables: [{ id: 'c10', name: 'loop cable 10 mm²', crossSectionM2: 10e-6, lengthM: 35, maxAmpsA: 60 }],
  ovens: [{ id: 'O2', name: 'O2', remark: 'not for aluminium', thermocoupleCheckedOn: '2026-02-22', thermocoupleOffsetK: -11 }],
  removed: [],
  changes: [],
};
const si = (text: string) => ({ text, system: 'si' as const });
const form = (): EquipmentForm => equipmentFormOf(BAY, 'si');
const paths = (f: EquipmentForm) => readEquipment(f).problems.map((p) => p.path);
const flat = (text: string) => text.replace(/[\u00a0\u202f]/g, ' ');

describe('the lists of the bay as a form', () => {
  it.each(['si', 'inch-pound'] as const)('read and sent back in %s units are what they were', (system) => {
    const { input, problems } = readEquipment(equipmentFormOf(BAY, system));
    expect(problems).toEqual([]);
    const { removed: _r, changes: _c, ...lists } = BAY;
    expect(input!.supplies).toEqual(lists.supplies);
    expect(input!.ovens).toEqual(lists.ovens);
    expect(input!.cables[0]!.crossSectionM2).toBeCloseTo(10e-6, 15);
    expect(input!.cables[0]!.lengthM).toBeCloseTo(35, 9);
  });

  it('takes taps with spaces, strokes or semicolons between, a comma or point within', () => {
    expect(readTaps('20 40 80')).toEqual([20, 40, 80]);
    expect(readTaps('20/40/80')).toEqual([20, 40, 80]);
    expect(readTaps('20; 40,5; 80')).toEqual([20, 40.5, 80]);
    expect(readTaps('20, 40, 80')).toEqual([20, 40, 80]);
    expect(readTaps('20 V')).toBeNull();
    expect(readTaps('')).toEqual([]);
  });

  it('lowest and highest voltage of a supply with taps follow from them', () => {
    const f = form();
    f.supplies[1]!.tapsV = '5 10 60';
    expect(readEquipment(f).input!.supplies[1]).toMatchObject({ minVoltsV: 5, maxVoltsV: 60, tapsV: [5, 10, 60] });
  });

  it('names each gap at its field', () => {
    const f = form();
    f.supplies.push(newSupply('si'));
    f.ovens.push({ ...newOven('si'), name: 'O3', thermocoupleOffsetK: si('4') });
    f.cables[0]!.lengthM = si('long');
    expect(paths(f).sort()).toEqual(['cables.0.lengthM', 'supplies.2.frequencyHz', 'supplies.2.maxAmpsA', 'supplies.2.maxVoltsV', 'supplies.2.name'].concat(['ovens.1.thermocoupleCheckedOn']).sort());
  });

  it('taps out of order or of letters are named at the taps, and nowhere else', () => {
    const f = form();
    f.supplies[1]!.tapsV = '40 20';
    expect(paths(f)).toEqual(['supplies.1.tapsV']);
    f.supplies[1]!.tapsV = 'twenty';
    expect(paths(f)).toEqual(['supplies.1.tapsV']);
    f.supplies[1]!.tapsV = ' ';
    expect(paths(f)).toEqual(['supplies.1.tapsV']);
  });
});

describe('two people at the lists at once', () => {
  const theirs: EquipmentView = { ...BAY, version: 4, cables: [], ovens: [{ ...BAY.ovens[0]!, thermocoupleOffsetK: 0 }], supplies: [...BAY.supplies, { id: 's3', name: 'S3', kind: 'variable', minVoltsV: 0, maxVoltsV: 30, maxAmpsA: 100, frequencyHz: 60 }] };

  it('what differs is told thing by thing, also what one of them does not have', () => {
    expect(equipmentDifferences(theirs, form(), 'si').map((d) => [d.label, flat(d.theirs), flat(d.yours)])).toEqual([
      ['Supply 3', 'S3: 0–30 V, 100 A, 60 Hz', 'not on the list'],
      ['Cable 1', 'not on the list', 'loop cable 10 mm²: 10 mm², 35 m, 60 A'],
      ['Oven 1', 'O2: not for aluminium; thermocouple checked 22 Feb 2026, 0 K too high', 'O2: not for aluminium; thermocouple checked 22 Feb 2026, -11 K too high'],
    ]);
    expect(equipmentDifferences(BAY, form(), 'si')).toEqual([]);
  });

  it('mine kept on top of theirs leaves theirs what I did not touch: changed, taken off or added', () => {
    const mine = form();
    mine.supplies[0]!.name = 'S1 west wall';
    const merged = onTopOf(mine, theirs, form(), 'si');
    expect(merged.version).toBe(4);
    expect(merged.supplies.map((s) => [s.id, s.name])).toEqual([['s1', 'S1 west wall'], ['s2', 'S2'], ['s3', 'S3']]);
    expect(merged.cables).toEqual([]);
    expect(merged.ovens[0]!.thermocoupleOffsetK.text).toBe('0');
    expect(equipmentDifferences(theirs, merged, 'si').map((d) => d.label)).toEqual(['Supply 1']);
  });

  it('what I changed and they took off is added anew, and what I took off stays off', () => {
    const mine = form();
    mine.cables[0]!.lengthM = si('36');
    mine.supplies.splice(1, 1);
    const merged = onTopOf(mine, theirs, form(), 'si');
    expect(merged.cables.map((c) => [c.id, c.lengthM.text])).toEqual([[null, '36']]);
    expect(merged.supplies.map((s) => s.id)).toEqual(['s1', 's3']);
  });

  it('a draft of an older list, of which nobody knows what was touched, stays as it was typed', () => {
    const merged = onTopOf({ ...form(), version: 2 }, theirs, form(), 'si');
    expect([merged.version, merged.cables[0]!.id, merged.ovens[0]!.thermocoupleOffsetK.text]).toEqual([4, null, '-11']);
  });
});
