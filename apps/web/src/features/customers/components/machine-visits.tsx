import { JOB_STATES, STEPS } from '@shared/route';
import type { MachineView } from '@shared/machines';
import { Link } from 'react-router-dom';
import { DataTable, type Column } from '../../../components/data-table.js';
import { Empty } from '../../../components/faces.js';
import { Facts, Panel } from '../../../components/panel.js';
import { Quantity } from '../../../components/quantity.js';
import { dayOf } from '../../../lib/format.js';
import { stateName, stepName } from '../../../lib/step-names.js';
import { t } from '../text.js';
import './customers.css';

type Visit = MachineView['visits'][number];

function standing({ state, step }: Visit): string {
  const known = JOB_STATES.find((s) => s === state);
  const at = STEPS.find((s) => s === step);
  if (known && known !== 'open' && known !== 'on-hold') return stateName(known);
  return `${at ? stepName(at) : step}${known === 'on-hold' ? `, ${stateName(known)}` : ''}`;
}

const COLUMNS: Column<Visit>[] = [
  {
    key: 'job',
    title: t('job'),
    cell: (v) => (
      <Link className="lb-name num" to={`/jobs/${v.jobId}`}>
        {v.jobNumber}
      </Link>
    ),
  },
  { key: 'received', title: t('received'), cell: (v) => <span className="num">{dayOf(v.receivedAt)}</span> },
  { key: 'standing', title: t('standing'), cell: standing },
];

export function MachineVisits({ visits }: { readonly visits: MachineView['visits'] }) {
  return <Panel title={t('visitsTitle')}>{visits.length === 0 ? <Empty title={t('noVisits')} /> : <DataTable caption={t('visitsTitle')} columns={COLUMNS} rows={visits} rowKey={(v) => v.jobId} />}</Panel>;
}

/** The core's size, once a test has measured it. */
export function CoreSize({ geometry }: { readonly geometry: MachineView['coreGeometry'] }) {
  if (!geometry) return null;
  return (
    <Panel title={t('geometry')}>
      <Facts
        rows={[
          [t('outerDiameter'), <Quantity key="od" si={geometry.outerDiameterM} kind="length" />],
          [t('innerDiameter'), <Quantity key="id" si={geometry.innerDiameterM} kind="length" />],
          [t('slots'), geometry.slots],
          [t('slotDepth'), <Quantity key="sd" si={geometry.slotDepthM} kind="length" />],
          [t('stack'), <Quantity key="st" si={geometry.stackLengthM} kind="length" />],
        ]}
      />
    </Panel>
  );
}
