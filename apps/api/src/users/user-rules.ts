import type { Role } from '@shared/roles';

/** A customer's user belongs to one customer and holds no staff role; staff belong to none. */
export function rolesProblem(roles: readonly Role[], customerId: string | null): string | null {
  const customer = roles.includes('customer');
  if (customer && roles.length > 1) return 'A customer’s user cannot hold a role of the shop as well.';
  if (customer && customerId === null) return 'Choose the customer this user belongs to.';
  if (!customer && customerId !== null) return 'Somebody who works in the shop belongs to no customer.';
  return null;
}

/** The shop never locks itself out: one manager who can sign in stays. */
export function lastManagerProblem(change: { readonly roles: readonly Role[]; readonly disabled: boolean }, others: readonly (readonly Role[])[]): string | null {
  const stays = change.roles.includes('manager') && !change.disabled;
  return stays || others.some((roles) => roles.includes('manager')) ? null : 'One manager who can sign in must stay.';
}
