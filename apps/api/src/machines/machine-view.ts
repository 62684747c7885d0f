import type { MachineView, Nameplate } from '@shared/machines';
import type { QuerySource } from '../database/query-source.js';

export type Visit = MachineView['visits'][number];

export interface MachineRow {
  id: string;
  customerId: string;
  customerName: string;
  description: string;
  nameplate: string;
  coreGeometry: string | null;
  version: number;
}

export const toMachineView = (row: MachineRow, visits: Visit[]): MachineView => ({
  id: row.id,
  customerId: row.customerId,
  customerName: row.customerName,
  description: row.description,
  nameplate: JSON.parse(row.nameplate) as Nameplate,
  coreGeometry: row.coreGeometry === null ? null : (JSON.parse(row.coreGeometry) as MachineView['coreGeometry']),
  version: row.version,
  visits,
});

/** Every job of a machine, the newest first. */
export const visitsOf = (source: QuerySource, machineId: string): Promise<Visit[]> =>
  source.query<Visit[]>('SELECT id AS jobId, number AS jobNumber, receivedAt, state, step FROM jobs WHERE machineId = ? ORDER BY id DESC', [machineId]);
