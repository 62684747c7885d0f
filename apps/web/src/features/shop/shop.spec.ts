import { createUserSchema, updateUserSchema } from '@shared/session';
import { describe, expect, it } from 'vitest';
import { messageKind } from './message-kinds.js';
import { emptyUser, readNewUser, readUser, userDifferences, userFormOf } from './user-form.js';

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
