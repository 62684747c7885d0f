import type { Permission, Role } from '@shared/roles';

/** Who acts: a signed-in person, or the house itself (the outbox, the payment service's event). */
export interface Actor {
  readonly userId: string | null;
  readonly name: string;
  readonly roles: readonly Role[];
  readonly permissions: readonly Permission[];
  readonly customerId: string | null;
  readonly sessionId: string | null;
}

/** The house acting by itself; `name` says which part of it. */
export const house = (name: string): Actor => ({ userId: null, name, roles: [], permissions: [], customerId: null, sessionId: null });
