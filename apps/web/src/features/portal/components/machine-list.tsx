import type { portalMachinesSchema } from '@shared/portal';
import { Link } from 'react-router-dom';
import type { z } from 'zod';
import { DataTable, type Column } from '../../../components/data-table.js';
import { Panel } from '../../../components/panel.js';
import { Quantity } from '../../../components/quantity.js';
import { dayOf } from '../../../lib/format.js';
import { t } from '../text.js';

type Machines = z.infer<typeof portalMachinesSchema>;
type Visit = Machines[number]['visits'][number];

const COLUMNS: readonly Column<Visit>[] = [
  { key: 'job', title: t('visitJob'), cell: (v) => <Link to={`/portal/jobs/${v.jobId}`}>{v.jobNumber}</Link> },
  { key: 'day', title: t('visitDay'), cell: (v) => dayOf(v.receivedAt) },
  { key: 'before', title: t('visitBefore'), number: true, cell: (v) => <Quantity si={v.wattsPerKgBefore} kind="specific-loss" /> },
  { key: 'after', title: t('visitAfter'), number: true, cell: (v) => <Quantity si={v.wattsPerKgAfter} kind="specific-loss" /> },
];

/** Each machine with what it was here for, and how its core did each time. */
export function MachineList({ machines }: { readonly machines: Machines }) {
  return machines.map((machine) => (
    <Panel key={machine.id} title={machine.description} actions={machine.serial && <span className="muted num">{t('serial', { serial: machine.serial })}</span>}>
      <DataTable caption={t('visits', { machine: machine.description })} columns={COLUMNS} rows={machine.visits} rowKey={(v) => v.jobId} />
    </Panel>
  ));
}
