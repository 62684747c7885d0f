import { DEFAULT_CORE_LIMITS } from '@libs/core-loss';
import { DEFAULT_MACHINE_TEST_LIMITS } from '@libs/machine-tests';
import { formatUsual } from '@libs/quantities';
import { DEFAULT_BURNOUT_LIMITS } from '@shared/limits';
import { createUserSchema, updateUserSchema } from '@shared/session';
import { describe, expect, it } from 'vitest';
import { burnoutRows, coreRows, machineRows, type LimitRow } from './limit-rows.js';
import { messageKind } from './message-kinds.js';
import { emptyUser, readNewUser, readUser, userDifferences, userFormOf } from './user-form.js';

const shown = (rows: readonly LimitRow[], key: string) => {
  const value = rows.find((r) => r.key === key)!.value;
  return 'words' in value ? value.words : formatUsual(value.si, value.kind, 'si');
};

describe('the limits on the screen', () => {
  const core = coreRows(DEFAULT_CORE_LIMITS);
  const machine = machineRows(DEFAULT_MACHINE_TEST_LIMITS);

  it('name every limit there is, none by its key', () => {
    expect(core.map((r) => r.key).sort()).toEqual(Object.keys(DEFAULT_CORE_LIMITS).filter((k) => k !== 'sources').sort());
    expect(machine.map((r) => r.key)).toEqual(Object.keys(DEFAULT_MACHINE_TEST_LIMITS));
    for (const row of [...core, ...machine, ...burnoutRows(DEFAULT_BURNOUT_LIMITS)]) expect(row.name).not.toBe(row.key);
  });

  it('stand in the unit a shop reads them in', () => {
    expect(shown(core, 'increaseLimit')).toMatch(/^20\.0\s*%$/);
    expect(shown(core, 'absoluteWPerKg60')).toMatch(/^8\.80\s*W\/kg$/);
    expect(shown(core, 'decisionRule')).toBe('a manager decides');
    expect(shown(machine, 'insulationFormOhm')).toMatch(/^100\s*MΩ$/);
    expect(shown(machine, 'vibrationFreeTo132')).toMatch(/^1\.60\s*mm\/s$/);
    expect(shown(machine, 'highPotentialSeconds')).toMatch(/^1\s*min$/);
  });

  it('show an index as a number and a fraction as percent', () => {
    expect(shown(machine, 'polarizationIndex')).toBe('2.000');
    expect(shown(machine, 'highPotentialRepeat')).toMatch(/^80\.0\s*%$/);
  });

  it('each say where they come from and how far that stands', () => {
    expect(core.find((r) => r.key === 'increaseLimit')).toMatchObject({ standing: 'common practice' });
    expect(core.find((r) => r.key === 'coverageFactor')).toMatchObject({ source: 'the shop’s own rule', standing: '' });
    expect(machine.find((r) => r.key === 'insulationFormOhm')).toMatchObject({ standing: 'standard' });
  });
});

describe('somebody who may sign in', () => {
  const shop = { ...emptyUser, name: 'Mira Talvik', email: 'talvik@kupferring.example', password: 'copper and patience' };

  it('of the shop has the roles that are ticked and belongs to no customer', () => {
    const { candidate, problems } = readNewUser({ ...shop, roles: { manager: true, technician: true, office: false }, customerId: 'left-over-from-before' });
    expect(problems).toEqual([]);
    expect(createUserSchema.parse(candidate)).toMatchObject({ roles: ['technician', 'manager'], customerId: null });
  });

  it('of a customer has that one role, and the customer must be chosen', () => {
    const customer = { ...shop, side: 'customer' as const, roles: { manager: true } };
    expect(readNewUser(customer).problems.map((p) => p.path)).toEqual(['customerId']);
    expect(createUserSchema.parse(readNewUser({ ...customer, customerId: '01a16268-d580-702f' }).candidate).roles).toEqual(['customer']);
  });

  it('of the shop has a role at least', () => {
    expect(readNewUser(shop).problems.map((p) => p.path)).toEqual(['roles']);
    expect(readUser({ name: 'Mira Talvik', roles: {}, disabled: false }, false, 2).problems.map((p) => p.path)).toEqual(['roles']);
  });

  it('of a customer keeps that role when the name is changed', () => {
    expect(updateUserSchema.parse(readUser({ ...userFormOf({ name: 'A', roles: ['customer'], disabled: false }), name: 'Anneke Voss' }, true, 2).candidate)).toMatchObject({ name: 'Anneke Voss', roles: ['customer'], version: 2 });
  });

  it('changed by two people shows both, and only what differs', () => {
    const differences = userDifferences({ name: 'Jonas Feldt', roles: ['technician'], disabled: true, version: 3 }, { name: 'Jonas Feldt', roles: { technician: true, manager: true }, disabled: false }, false);
    expect(differences).toEqual([
      { label: 'Roles', theirs: 'technician', yours: 'technician, manager' },
      { label: 'Sign-in closed', theirs: 'yes', yours: 'no' },
    ]);
  });

  it('sees messages by what they were about', () => {
    expect(messageKind('mail.quote-approved')).toBe('Approval');
    expect(messageKind('mail.something-new')).toBe('Message');
  });
});
