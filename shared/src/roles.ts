/** Who may do what. The API's guards, the web's menus and the tests read this one table. */
export const ROLES = ['counter', 'technician', 'office', 'manager', 'customer'] as const;
export type Role = (typeof ROLES)[number];
export const STAFF_ROLES = ['counter', 'technician', 'office', 'manager'] as const satisfies readonly Role[];

export const PERMISSIONS = {
  'jobs.read': ['counter', 'technician', 'office', 'manager'],
  'jobs.book': ['counter', 'manager'],
  'jobs.edit': ['counter', 'manager'],
  'jobs.move': ['counter', 'technician', 'manager'],
  'jobs.release': ['counter', 'manager'],
  'customers.read': ['counter', 'technician', 'office', 'manager'],
  'customers.edit': ['counter', 'office', 'manager'],
  'customers.terms': ['office', 'manager'],
  'machines.edit': ['counter', 'technician', 'manager'],
  'attachments.add': ['counter', 'technician', 'office', 'manager'],
  'records.read': ['counter', 'technician', 'office', 'manager'],
  'records.write': ['technician', 'manager'],
  'records.sign': ['technician', 'manager'],
  'burnouts.read': ['counter', 'technician', 'office', 'manager'],
  'burnouts.write': ['technician', 'manager'],
  'insight.read': ['technician', 'manager'],
  'insight.write': ['manager'],
  'delivery.record': ['counter', 'manager'],
  'waivers.ask': ['technician', 'manager'],
  'waivers.countersign': ['manager'],
  'concessions.sign': ['manager'],
  'decisions.record': ['counter', 'manager'],
  'final-test.release': ['technician', 'manager'],
  'certificates.issue': ['technician', 'manager'],
  'quotes.read': ['counter', 'office', 'manager'],
  'quotes.write': ['counter', 'manager'],
  'quotes.approve-for-customer': ['counter', 'manager'],
  'invoices.read': ['office', 'manager'],
  'invoices.issue': ['office', 'manager'],
  'payments.record': ['office', 'manager'],
  'credit.lift': ['manager'],
  'limits.read': ['counter', 'technician', 'office', 'manager'],
  'limits.publish': ['manager'],
  'instruments.read': ['technician', 'manager'],
  'instruments.edit': ['technician', 'manager'],
  'equipment.edit': ['technician', 'manager'],
  'users.manage': ['manager'],
  'messages.read': ['counter', 'office', 'manager'],
  'history.read': ['counter', 'technician', 'office', 'manager'],
  'portal.use': ['customer'],
  'profile.own': ['counter', 'technician', 'office', 'manager', 'customer'],
} as const satisfies Record<string, readonly Role[]>;

export type Permission = keyof typeof PERMISSIONS;
export const ALL_PERMISSIONS = Object.keys(PERMISSIONS) as Permission[];

/** What somebody with these roles may do. */
export function permissionsOf(roles: readonly Role[]): Permission[] {
  return ALL_PERMISSIONS.filter((permission) => (PERMISSIONS[permission] as readonly Role[]).some((role) => roles.includes(role)));
}

export function may(roles: readonly Role[], permission: Permission): boolean {
  return (PERMISSIONS[permission] as readonly Role[]).some((role) => roles.includes(role));
}
