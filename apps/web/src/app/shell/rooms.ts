import type { Me } from '@shared/session';
import { t } from './text.js';

export interface Room {
  readonly path: string;
  readonly name: string;
}

/** The rooms somebody may enter, by what they may do. */
export function roomsOf(me: Me): Room[] {
  if (me.roles.includes('customer')) {
    return [
      { path: '/portal', name: t('portalHome') },
      { path: '/portal/machines', name: t('portal') },
    ];
  }
  const may = (permission: Me['permissions'][number]) => me.permissions.includes(permission);
  return [
    { path: '/floor', name: t('floor'), open: true },
    { path: '/counter', name: t('counter'), open: may('jobs.book') },
    { path: '/bay', name: t('bay'), open: may('records.write') },
    { path: '/accounts', name: t('accounts'), open: may('quotes.read') },
    { path: '/insight', name: t('insight'), open: may('insight.read') },
    { path: '/shop', name: t('shop'), open: may('limits.read') },
  ].filter((room) => room.open);
}

const STAFF_PLACES = new Set(['floor', 'counter', 'bay', 'accounts', 'shop', 'jobs', 'records']);

/** Whether a page is for this side of the counter: customers have the portal, the shop has the rest. */
export function isOpenTo(me: Me, pathname: string): boolean {
  const place = pathname.split('/')[1] ?? '';
  return me.roles.includes('customer') ? !STAFF_PLACES.has(place) : place !== 'portal';
}

/** Where somebody starts the day. */
export function homeOf(me: Me): string {
  if (me.roles.includes('customer')) return '/portal';
  if (me.roles.includes('manager')) return '/floor';
  if (me.roles.includes('technician')) return '/bay';
  if (me.roles.includes('office')) return '/accounts';
  return '/counter';
}
