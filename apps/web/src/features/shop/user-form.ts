import { STAFF_ROLES, type Role } from '@shared/roles';
import type { UserView } from '@shared/session';
import { z } from 'zod';
import type { Difference } from '../../components/notices.js';
import type { FormProblem } from '../../lib/typed.js';
import { t } from './text.js';

export interface NewUserForm {
  side: 'shop' | 'customer';
  name: string;
  email: string;
  roles: Partial<Record<Role, boolean>>;
  customerId: string | null;
  password: string;
}
export interface UserForm {
  name: string;
  roles: Partial<Record<Role, boolean>>;
  disabled: boolean;
}

export const emptyUser: NewUserForm = { side: 'shop', name: '', email: '', roles: {}, customerId: null, password: '' };
export const roleName = (role: Role): string => t(role === 'customer' ? 'role-customer' : role);
export const rolesWords = (roles: readonly Role[]): string => roles.map(roleName).join(', ');
const chosen = (roles: UserForm['roles']): Role[] => STAFF_ROLES.filter((role) => roles[role] === true);

/** A customer's person has that one role; one of the shop has what is ticked and belongs to no customer. */
export function readNewUser(form: NewUserForm): { readonly candidate: unknown; readonly problems: readonly FormProblem[] } {
  const problems: FormProblem[] = [];
  const customer = form.side === 'customer';
  const roles: Role[] = customer ? ['customer'] : chosen(form.roles);
  if (roles.length === 0) problems.push({ path: 'roles', message: t('needRole') });
  if (customer && !form.customerId) problems.push({ path: 'customerId', message: t('needCustomer') });
  return { candidate: { name: form.name, email: form.email, roles, customerId: customer ? form.customerId : null, password: form.password }, problems };
}

export const userFormOf = ({ name, roles, disabled }: Pick<UserView, 'name' | 'roles' | 'disabled'>): UserForm => ({ name, roles: Object.fromEntries(roles.map((role) => [role, true])), disabled });

export function readUser(form: UserForm, isCustomer: boolean, version: number): { readonly candidate: unknown; readonly problems: readonly FormProblem[] } {
  const roles: Role[] = isCustomer ? ['customer'] : chosen(form.roles);
  return { candidate: { version, name: form.name, roles, disabled: form.disabled }, problems: roles.length === 0 ? [{ path: 'roles', message: t('needRole') }] : [] };
}

/** How the person stands now, when somebody else changed them meanwhile. */
export const changedUserSchema = z.object({ name: z.string(), roles: z.array(z.enum([...STAFF_ROLES, 'customer'])), disabled: z.boolean(), version: z.number().int() });
export type ChangedUser = z.infer<typeof changedUserSchema>;

export function userDifferences(theirs: ChangedUser, form: UserForm, isCustomer: boolean): Difference[] {
  const roles = rolesWords(isCustomer ? ['customer'] : chosen(form.roles));
  const all: Difference[] = [
    { label: t('name'), theirs: theirs.name, yours: form.name },
    { label: t('roles'), theirs: rolesWords(STAFF_ROLES.filter((role) => theirs.roles.includes(role))) || rolesWords(theirs.roles), yours: roles },
    { label: t('closed'), theirs: t(theirs.disabled ? 'yes' : 'no'), yours: t(form.disabled ? 'yes' : 'no') },
  ];
  return all.filter((d) => d.theirs !== d.yours);
}
