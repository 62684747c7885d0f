import { nameplateSchema, type Nameplate } from '@shared/machines';
import { describe, expect, it } from 'vitest';
import { emptyNameplate, nameplateFormOf, readNameplate, type NameplateForm } from './nameplate-form.js';
import { plateFigure, plateLine } from './plate-words.js';
import { FormReader, type Typed } from './typed.js';

const si = (text: string): Typed => ({ text, system: 'si' });
const us = (text: string): Typed => ({ text, system: 'inch-pound' });
function read(over: Partial<NameplateForm>) {
  const reader = new FormReader();
  return { plate: readNameplate({ ...emptyNameplate('si'), ...over }, reader, 'nameplate'), problems: reader.problems };
}
/** The crane motor of the invented sample shop. */
const crane: Nameplate = nameplateSchema.parse({
  ...readNameplate(emptyNameplate('si'), new FormReader(), ''),
  kind: 'slip-ring',
  connection: 'star',
  ratedPowerW: 110_000,
  ratedVoltageV: 400,
  ratedFrequencyHz: 50,
  ratedSpeedRpm: 978,
  ratedCurrentA: 201,
  poles: 6,
  powerFactor: 0.85,
  efficiencyPercent: 93,
});

describe('a nameplate as it is typed', () => {
  it('takes a decimal comma and a decimal point', () => {
    expect(read({ ratedPowerW: si('5,5'), powerFactor: si('0.76'), ratedCurrentA: si('1,79') }).plate).toMatchObject({ ratedPowerW: 5500, powerFactor: 0.76, ratedCurrentA: 1.79 });
  });

  it('takes horsepower from somebody who works in inch-pound, and a pasted unit from anybody', () => {
    // 1 hp = 550 ft·lbf/s = 745.6998715822702 W: NIST Special Publication 811, appendix B
    expect(read({ ratedPowerW: us('100') }).plate.ratedPowerW).toBeCloseTo(74_569.98715822702, 6);
    expect(read({ ratedPowerW: si('100 hp') }).plate.ratedPowerW).toBeCloseTo(74_569.98715822702, 6);
  });

  it('leaves what cannot be read as unknown, never as nought', () => {
    const { plate, problems } = read({});
    expect(plate).toMatchObject({ ratedPowerW: null, ratedVoltageV: null, poles: null, efficiencyPercent: null });
    expect(problems).toEqual([]);
    expect(nameplateSchema.safeParse(plate).success).toBe(true);
  });

  it('writes an efficiency as the percentage that was typed', () => {
    for (const text of ['95.8', '79,6', '7', '93.70']) expect(read({ efficiencyPercent: si(text) }).plate.efficiencyPercent).toBe(Number(text.replace(',', '.')));
  });

  it('names what is typed wrong at its own field', () => {
    expect(read({ ratedVoltageV: si('four hundred') }).problems.map((p) => p.path)).toEqual(['nameplate.ratedVoltageV']);
    expect(read({ poles: si('4,5') }).problems.map((p) => p.path)).toEqual(['nameplate.poles']);
  });

  it('reads back as itself in either system of units', () => {
    for (const system of ['si', 'inch-pound'] as const) {
      const reader = new FormReader();
      expect(readNameplate(nameplateFormOf(crane, system), reader, 'nameplate')).toEqual(crane);
      expect(reader.problems).toEqual([]);
    }
  });

  it('says a rated figure as a plate says it', () => {
    expect(plateFigure(37_000, 'rated-power', 'si')).toBe('37\u202fkW');
    expect(plateFigure(400, 'voltage', 'si')).toBe('400\u202fV');
    expect(plateFigure(750, 'rated-power', 'si')).toBe('0.75\u202fkW');
    expect(plateFigure(74_569.98715822702, 'rated-power', 'inch-pound')).toBe('100\u202fhp');
    expect(plateLine({ ...crane, ratedFrequencyHz: null }, 'si')).toBe('110\u202fkW, 400\u202fV, 978\u202frpm');
  });
});
