import { saveEquipmentSchema } from '@shared/equipment';
import { describe, expect, it } from 'vitest';
import type { BayEquipment } from '../shop/shop-profile.js';
import { changeOf, unknownThings } from './equipment-changes.js';

const BEFORE: BayEquipment = {
  supplies: [{ id: 's1', name: 'S1', kind: 'variable', minVoltsV: 0, maxVoltsV: 260, maxAmpsA: 40, frequencyHz: 50 }],
  cables: [{ id: 'c10', name: 'loop cable 10 mm²', crossSectionM2: 10e-6, lengthM: 35, maxAmpsA: 60 }],
  ovens: [{ id: 'O1', name: 'O1', remark: 'part-temperature controlled' }],
};
const asItIs = { version: 1, supplies: [...BEFORE.supplies], cables: [...BEFORE.cables], ovens: [...BEFORE.ovens] };
const input = (more: object = {}) => saveEquipmentSchema.parse({ ...asItIs, ...more });
const change = (more: object) => changeOf(BEFORE, input(more), '2026-03-02', () => 'new-1');

describe('changing what the bay has', () => {
  it('sent back as it is changes nothing: an oven never checked is not a changed oven', () => {
    expect(change({}).words).toEqual([]);
  });

  it('something new is named by the server, and said', () => {
    const { after, words } = change({ ovens: [...BEFORE.ovens, { id: null, name: 'O2', remark: '', thermocoupleCheckedOn: '2026-02-27', thermocoupleOffsetK: -11 }] });
    expect(words).toEqual(['Oven O2 added.']);
    expect(after.ovens[1]).toEqual({ id: 'new-1', name: 'O2', remark: '', thermocoupleCheckedOn: '2026-02-27', thermocoupleOffsetK: -11 });
  });

  it('what is left out is remembered by its name, for the records that name it', () => {
    const { after, words } = change({ cables: [] });
    expect(words).toEqual(['Cable loop cable 10 mm² removed.']);
    expect(after).toMatchObject({ cables: [], removed: [{ id: 'c10', list: 'cables', name: 'loop cable 10 mm²', removedOn: '2026-03-02' }] });
  });

  it('a new name is told with the old one', () => {
    expect(change({ supplies: [{ ...BEFORE.supplies[0], name: 'S1 west wall' }] }).words).toEqual(['Supply S1, now S1 west wall, changed.']);
  });

  it('something this bay never had is not taken under a name of its own making', () => {
    expect(unknownThings(BEFORE, input({ ovens: [{ id: 'O9', name: 'O9' }] }))).toEqual([{ path: 'ovens.0.id', code: 'unknown', message: 'Oven O9 is not one of this bay. Add it anew.' }]);
    expect(unknownThings(BEFORE, input())).toEqual([]);
  });
});

describe('what a supply, a cable or an oven may be', () => {
  const problems = (more: object) => {
    const result = saveEquipmentSchema.safeParse({ ...asItIs, ...more });
    return result.success ? [] : result.error.issues.map((i) => `${i.path.join('.')}: ${i.message}`);
  };
  const taps = (more: object) => ({ supplies: [{ id: 's1', name: 'S1', kind: 'taps', minVoltsV: 20, maxVoltsV: 80, maxAmpsA: 200, frequencyHz: 50, tapsV: [20, 40, 80], ...more }] });

  it('a supply with taps, the lowest first', () => {
    expect(problems(taps({}))).toEqual([]);
  });
  it.each([
    ['taps out of order', taps({ tapsV: [40, 20, 80] }), 'supplies.0.tapsV: Each tap once, the lowest first.'],
    ['no taps at all', taps({ tapsV: undefined }), 'supplies.0.tapsV: List the taps, in volts.'],
    ['a highest voltage that is no tap', taps({ maxVoltsV: 100 }), 'supplies.0.maxVoltsV: The highest tap.'],
    ['a variable supply that goes from high to low', taps({ kind: 'variable', tapsV: undefined, minVoltsV: 90 }), 'supplies.0.minVoltsV: Below the highest voltage.'],
    ['a cable as thick as an arm', { cables: [{ id: null, name: 'c', crossSectionM2: 10, lengthM: 5, maxAmpsA: 60 }] }, 'cables.0.crossSectionM2: Between 0.5 and 1000 mm².'],
    ['two cables of one name', { cables: [BEFORE.cables[0], { ...BEFORE.cables[0], id: null, name: 'Loop cable  10 mm²' }] }, 'cables.1.name: Another one has this name already.'],
    ['an offset found on no day', { ovens: [{ id: 'O1', name: 'O1', thermocoupleOffsetK: -11 }] }, 'ovens.0.thermocoupleCheckedOn: On which day was it found?'],
    ['an offset no thermocouple should live with', { ovens: [{ id: 'O1', name: 'O1', thermocoupleCheckedOn: '2026-02-01', thermocoupleOffsetK: 80 }] }, 'ovens.0.thermocoupleOffsetK: Between −50 and 50 K. A thermocouple that is further off is replaced.'],
    ['something without a name', { ovens: [{ id: 'O1', name: ' ' }] }, 'ovens.0.name: Give it the name that stands on it.'],
  ])('%s is refused at its field', (_what, more, words) => {
    expect(problems(more)).toEqual([words]);
  });
});
