import type { Nameplate } from '@shared/machines';

/** What the shop calls the kinds of machines and how they are connected. */
const KINDS: Record<Nameplate['kind'], string> = {
  induction: 'Induction, cage rotor',
  'slip-ring': 'Slip-ring',
  synchronous: 'Synchronous',
  dc: 'Direct current',
  'ac-magnet': 'AC magnet',
  'core-only': 'Core only',
};
const CONNECTIONS: Record<Nameplate['connection'], string> = { star: 'star', delta: 'delta', single: 'single-phase', dc: 'direct current', unknown: 'cannot be read' };

const options = <K extends string>(words: Record<K, string>) => (Object.entries(words) as [K, string][]).map(([value, label]) => ({ value, label }));
export const KIND_OPTIONS = options(KINDS);
export const CONNECTION_OPTIONS = options(CONNECTIONS);
export const machineKindName = (kind: Nameplate['kind']): string => KINDS[kind];
export const connectionName = (connection: Nameplate['connection']): string => CONNECTIONS[connection];
