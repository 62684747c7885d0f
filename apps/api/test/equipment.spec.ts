import { equipmentViewSchema, type EquipmentView } from '@shared/equipment';
import { bayViewSchema } from '@shared/instruments';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { BAY } from '../../../mocks/sample-shop/shop.js';
import { UnitOfWork } from '../src/database/unit-of-work.js';
import { ShopService } from '../src/shop/shop.service.js';
import { openTestShop, type Person, type TestShop } from './test-app.js';

let shop: TestShop;
let technician: Person;
let manager: Person;
beforeAll(async () => {
  shop = await openTestShop();
  [technician, manager] = [await shop.person(['technician'], { name: 'Tess Technician' }), await shop.person(['manager'])];
});
afterAll(() => shop.close());

const read = async () => equipmentViewSchema.parse((await technician.get('/api/equipment').expect(200)).body);
const asSent = ({ version, supplies, cables, ovens }: EquipmentView) => ({ version, supplies, cables, ovens });

describe('what the bay has', () => {
  it('is empty in a new shop, and the first list is saved on nothing', async () => {
    expect(await read()).toEqual({ version: 0, supplies: [], cables: [], ovens: [], removed: [], changes: [] });
    const answer = await technician.put('/api/equipment', { version: 0, supplies: [], cables: [{ id: null, name: 'loop cable 16 mm²', crossSectionM2: 16e-6, lengthM: 40, maxAmpsA: 80 }], ovens: [] });
    expect(answer.status).toBe(200);
    expect(answer.body).toMatchObject({ version: 1, cables: [{ name: 'loop cable 16 mm²', lengthM: 40 }], changes: [{ who: 'Tess Technician', words: 'Cable loop cable 16 mm² added.' }] });
    expect(answer.body.cables[0].id).toMatch(/^[0-9a-z-]{8,}$/);
  });

  it('of the sample shop is read and saved without losing anything, and the bay still answers as before', async () => {
    await shop.app.get(UnitOfWork).run((m) => shop.app.get(ShopService).write(m, 'bay', BAY));
    const before = await read();
    expect(before.ovens).toEqual([
      { id: 'O1', name: 'O1', remark: 'part-temperature controlled', thermocoupleCheckedOn: null, thermocoupleOffsetK: null },
      { id: 'O2', name: 'O2', remark: 'control thermocouple checked after the overheated load', thermocoupleCheckedOn: null, thermocoupleOffsetK: null },
    ]);
    expect((await technician.put('/api/equipment', asSent(before)).expect(200)).body.version).toBe(before.version);
    const ovens = before.ovens.map((o) => (o.id === 'O2' ? { ...o, thermocoupleCheckedOn: '2026-02-22', thermocoupleOffsetK: -11 } : o));
    const after = equipmentViewSchema.parse((await technician.put('/api/equipment', { ...asSent(before), ovens }).expect(200)).body);
    expect(after).toMatchObject({ version: before.version + 1, changes: [{ words: 'Oven O2 changed.' }, {}] });
    expect(after.ovens[1]).toMatchObject({ thermocoupleCheckedOn: '2026-02-22', thermocoupleOffsetK: -11 });
    const bay = bayViewSchema.parse((await technician.get('/api/bay').expect(200)).body);
    expect({ supplies: bay.supplies, cables: bay.cables, ovens: bay.ovens }).toEqual({ supplies: BAY.supplies, cables: BAY.cables, ovens: BAY.ovens });
  });

  it('a cable that is taken off the list is still known by its name', async () => {
    const now = await read();
    const after = (await manager.put('/api/equipment', { ...asSent(now), cables: now.cables.slice(1) }).expect(200)).body;
    expect(after.removed).toEqual([{ id: 'c10', list: 'cables', name: 'loop cable 10 mm²', removedOn: '2026-03-02' }]);
    const back = await manager.put('/api/equipment', { ...asSent(after), cables: [...after.cables, { ...now.cables[0], name: 'another' }] });
    expect(back.body).toMatchObject({ statusCode: 400, fields: [{ path: 'cables.1.id', code: 'unknown' }] });
  });

  it('two people at once: the second is told, and sees what the first one saved', async () => {
    const now = await read();
    const supply = { id: null, name: 'S2', kind: 'taps', minVoltsV: 10, maxVoltsV: 40, maxAmpsA: 600, frequencyHz: 50, tapsV: [10, 20, 40] };
    await technician.put('/api/equipment', { ...asSent(now), supplies: [...now.supplies, supply] }).expect(200);
    const answer = await manager.put('/api/equipment', { ...asSent(now), ovens: [] });
    expect(answer.body).toMatchObject({ statusCode: 409, code: 'CHANGED_MEANWHILE', current: { version: now.version + 1, supplies: [{ id: 's1' }, { name: 'S2', tapsV: [10, 20, 40] }] } });
    expect(equipmentViewSchema.parse(answer.body.current).ovens).toHaveLength(2);
  });

  it('belongs to the bay: counter and office neither change nor read it', async () => {
    for (const role of ['counter', 'office'] as const) {
      const person = await shop.person([role]);
      await person.get('/api/equipment').expect(403);
      await person.put('/api/equipment', asSent(await read())).expect(403);
    }
  });

  it.each([
    ['volts as text', (e: ReturnType<typeof asSent>) => ({ ...e, supplies: [{ ...e.supplies[0], maxVoltsV: '260' }] }), 'supplies.0.maxVoltsV'],
    ['a cable of no length', (e: ReturnType<typeof asSent>) => ({ ...e, cables: [{ ...e.cables[0], lengthM: 0 }] }), 'cables.0.lengthM'],
    ['a day that is none', (e: ReturnType<typeof asSent>) => ({ ...e, ovens: [{ ...e.ovens[0], thermocoupleCheckedOn: '2026-02-30' }] }), 'ovens.0.thermocoupleCheckedOn'],
    ['a key nobody knows', (e: ReturnType<typeof asSent>) => ({ ...e, ovens: [{ ...e.ovens[0], limitC: 900 }] }), 'ovens.0'],
  ])('%s is refused at its field', async (_what, change, path) => {
    const answer = await manager.put('/api/equipment', change(asSent(await read())));
    expect(answer.status).toBe(400);
    expect((answer.body.fields as { path: string }[]).map((f) => f.path)).toEqual([path]);
  });
});
