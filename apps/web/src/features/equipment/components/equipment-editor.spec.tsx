import type { EquipmentView, SaveEquipment } from '@shared/equipment';
import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { inShop, refusal, server, somebody } from '../../../../test/in-shop.js';
import { EquipmentEditor } from './equipment-editor.js';
import { EquipmentHistory } from './equipment-history.js';

const person = userEvent.setup();
const BAY: EquipmentView = {
  version: 3,
  supplies: [{ id: 's1', name: 'S1 variable', kind: 'variable', minVoltsV: 0, maxVoltsV: 260, maxAmpsA: 40, frequencyHz: 50 }],
  cables: [{ id: 'c10', name: 'loop cable 10 mm²', crossSectionM2: 10e-6, lengthM: 35, maxAmpsA: 60 }],
  ovens: [
    { id: 'O1', name: 'O1', remark: 'part-temperature controlled', thermocoupleCheckedOn: null, thermocoupleOffsetK: null },
    { id: 'O2', name: 'O2', remark: '', thermocoupleCheckedOn: null, thermocoupleOffsetK: null },
  ],
  removed: [],
  changes: [],
};
const open = (me = somebody()) => inShop(<EquipmentEditor equipment={BAY} />, { me });
const input = (name: string) => document.querySelector<HTMLInputElement>(`[name="${name}"]`)!;
const type = (name: string, text: string) => fireEvent.change(input(name), { target: { value: text } });
const save = () => person.click(screen.getByRole('button', { name: 'Save the list' }));

beforeEach(() => localStorage.clear());
afterEach(() => vi.unstubAllGlobals());

describe('the lists of the bay', () => {
  it('an oven’s thermocouple is entered with the day it was checked and what it was off', async () => {
    const asked = server(() => [200, { ...BAY, version: 4 }]);
    open();
    type('ovens.1.thermocoupleCheckedOn', '2026-02-22');
    type('ovens.1.thermocoupleOffsetK', '-11');
    await save();
    await waitFor(() => expect(asked).toHaveLength(1));
    expect(asked[0]).toMatchObject({ method: 'PUT', path: '/equipment', body: { version: 3, ovens: [{ id: 'O1' }, { id: 'O2', thermocoupleCheckedOn: '2026-02-22', thermocoupleOffsetK: -11 }] } });
    await waitFor(() => expect(localStorage.length).toBe(0));
  });

  it('a supply with taps is added, and asks for the taps instead of lowest and highest', async () => {
    const asked = server(() => [200, { ...BAY, version: 4 }]);
    open();
    await person.click(screen.getByRole('button', { name: 'Add a supply' }));
    const added = within(screen.getByRole('group', { name: /^Supply 2/ }));
    expect(added.getByText('(not saved yet)')).toBeDefined();
    await person.click(added.getByRole('radio', { name: 'with taps' }));
    expect(input('supplies.1.minVoltsV')).toBeNull();
    type('supplies.1.name', 'S2');
    type('supplies.1.maxAmpsA', '600');
    type('supplies.1.frequencyHz', '50');
    await save();
    expect(await screen.findByText('List the taps, in volts.')).toBeDefined();
    expect(asked).toHaveLength(0);
    type('supplies.1.tapsV', '20 40 80');
    await save();
    await waitFor(() => expect((asked[0]?.body as SaveEquipment).supplies[1]).toMatchObject({ id: null, name: 'S2', kind: 'taps', tapsV: [20, 40, 80], minVoltsV: 20, maxVoltsV: 80 }));
  });

  it('something goes only after it was asked about, and with the whole list', async () => {
    const asked = server(() => [200, { ...BAY, version: 4, cables: [] }]);
    open();
    await person.click(screen.getByRole('button', { name: 'Remove loop cable 10 mm²' }));
    expect(screen.getByText('Take loop cable 10 mm² off the list?')).toBeDefined();
    await person.click(screen.getByRole('button', { name: 'Keep it' }));
    expect(input('cables.0.name').value).toBe('loop cable 10 mm²');
    await person.click(screen.getByRole('button', { name: 'Remove loop cable 10 mm²' }));
    await person.click(screen.getByRole('button', { name: 'Take it off' }));
    expect(input('cables.0.name')).toBeNull();
    expect(screen.getByText('No loop cable yet.')).toBeDefined();
    expect(asked).toHaveLength(0);
    await save();
    await waitFor(() => expect(asked[0]?.body).toMatchObject({ cables: [] }));
  });

  it('what the server finds lands on its field, and everything typed stays', async () => {
    server(() => refusal(400, 'INPUT_NOT_VALID', 'See the fields.', { fields: [{ path: 'cables.0.lengthM', code: 'custom', message: 'Between 0.5 and 500 m.' }] }));
    open();
    type('cables.0.lengthM', '36');
    type('ovens.0.remark', 'not for aluminium');
    await save();
    await waitFor(() => expect(input('cables.0.lengthM').getAttribute('aria-invalid')).toBe('true'));
    expect(input('ovens.0.remark').value).toBe('not for aluminium');
  });

  it('two at once: both are shown thing by thing, and mine goes on top of theirs', async () => {
    const theirs: EquipmentView = { ...BAY, version: 4, ovens: [{ ...BAY.ovens[0]!, remark: 'out of use' }] };
    const bodies: SaveEquipment[] = [];
    server(({ body }) => {
      bodies.push(body as SaveEquipment);
      return bodies.length === 1 ? refusal(409, 'CHANGED_MEANWHILE', 'Somebody else changed this list meanwhile.', { current: theirs }) : [200, { ...BAY, version: 5 }];
    });
    open();
    type('ovens.1.thermocoupleCheckedOn', '2026-02-22');
    await save();
    const conflict = within(await screen.findByRole('alert'));
    // O1, which only they changed, is no question
    expect(conflict.queryByRole('row', { name: /^Oven 1/ })).toBeNull();
    expect(conflict.getByRole('row', { name: /^Oven 2/ }).textContent).toContain('not on the list');
    await person.click(conflict.getByRole('button', { name: 'Keep mine and save' }));
    await waitFor(() => expect(bodies).toHaveLength(2));
    // they took O2 off meanwhile: keeping mine adds it anew
    expect(bodies[1]).toMatchObject({ version: 4, ovens: [{ id: 'O1', remark: 'out of use' }, { id: null, name: 'O2', thermocoupleCheckedOn: '2026-02-22' }] });
  });

  it('comes back after a reload, with what was added', async () => {
    open();
    await person.click(screen.getByRole('button', { name: 'Add an oven' }));
    type('ovens.2.name', 'O3');
    document.body.innerHTML = '';
    open();
    expect(await screen.findByText(/Your draft of .* is back/)).toBeDefined();
    expect(input('ovens.2.name').value).toBe('O3');
  });

  it('says who changed what last, and what is gone but still named', () => {
    inShop(<EquipmentHistory changes={[{ at: '2026-03-02T09:00:00.000Z', who: 'Tess Technician', words: 'Oven O2 changed.' }]} removed={[{ id: 'c16', list: 'cables', name: 'loop cable 16 mm²', removedOn: '2026-02-01' }]} />);
    expect(screen.getByText(/Oven O2 changed\./).textContent).toContain('Tess Technician');
    expect(screen.getByText('loop cable 16 mm², since 1 Feb 2026')).toBeDefined();
  });
});
