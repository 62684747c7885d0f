import { Button } from '@blueprintjs/core';
import type { MeasuredPage, MeasuredRow } from '@shared/calibrations';
import { useQuery } from '@tanstack/react-query';
import { useForm } from 'react-hook-form';
import { Link, useSearchParams } from 'react-router-dom';
import { DataTable, type Column } from '../../../components/data-table.js';
import { Answer, Empty } from '../../../components/faces.js';
import { TextField } from '../../../components/fields.js';
import { Panel } from '../../../components/panel.js';
import { isVerdict, VerdictTag } from '../../../components/verdict-tag.js';
import { momentOf } from '../../../lib/format.js';
import { recordName } from '../../../lib/record-names.js';
import { measuredQuery } from '../api/instrument-queries.js';
import { t } from '../instrument-text.js';
import './equipment.css';

const COLUMNS: readonly Column<MeasuredRow>[] = [
  {
    key: 'job',
    title: t('job'),
    cell: (r) => (
      <span>
        <Link to={`/jobs/${r.jobId}`}>{r.jobNumber}</Link> <span className="muted">{t(r.jobState)}</span>
      </span>
    ),
  },
  {
    key: 'record',
    title: t('recordOf'),
    cell: (r) => (
      <span>
        <Link to={`/records/${r.recordId}/revisions`}>{r.ordinal > 1 ? t('recordNo', { name: recordName(r.kind), n: r.ordinal }) : recordName(r.kind)}</Link>
        {r.superseded && <span className="muted"> {t('corrected')}</span>}
        {r.overdueThen && <span className="muted"> {t('overdueThen')}</span>}
      </span>
    ),
  },
  { key: 'verdict', title: t('verdict'), cell: (r) => (isVerdict(r.verdict) ? <VerdictTag verdict={r.verdict} /> : <span className="muted">–</span>) },
  { key: 'when', title: t('when'), cell: (r) => <span className="num">{momentOf(r.at)}</span> },
  { key: 'by', title: t('by'), cell: (r) => r.by },
  { key: 'customer', title: t('customer'), cell: (r) => `${r.customerName}, ${r.machine}` },
  { key: 'paper', title: t('paper'), cell: (r) => r.certificateNumber ?? t('noPaper') },
];

/** Records made with an instrument, in a period that stands in the address. */
export function MeasuredList({ instrumentId }: { readonly instrumentId: string }) {
  const [params, setParams] = useSearchParams();
  const [from, to] = [params.get('from') ?? '', params.get('to') ?? ''];
  const measured = useQuery(measuredQuery(instrumentId, { from, to, page: params.get('page') ?? '1' }));
  const period = from !== '' || to !== '';
  const look = (next: { readonly from: string | null; readonly to: string | null }) =>
    setParams(Object.fromEntries(Object.entries(next).filter((entry): entry is [string, string] => typeof entry[1] === 'string' && entry[1] !== '')), { preventScrollReset: true });
  return (
    <Panel title={t('measured')}>
      <div className="stack" id="measured">
        <Period key={`${from}|${to}`} from={from} to={to} onLook={look} />
        <p className="muted">{t('measuredHelp')}</p>
        <Answer query={measured} isEmpty={(page) => page.total === 0} empty={<Empty title={period ? t('nonePeriod') : t('none')} />}>
          {(page) => <MeasuredTable page={page} />}
        </Answer>
      </div>
    </Panel>
  );
}

function MeasuredTable({ page }: { readonly page: MeasuredPage }) {
  return (
    <>
      <p role="status">{t('countAll', { total: page.total })}</p>
      <DataTable caption={t('measured')} columns={COLUMNS} rows={page.rows} rowKey={(r) => r.recordId} total={page.total} page={page.page} size={page.size} />
    </>
  );
}

interface PeriodForm {
  from: string | null;
  to: string | null;
}

function Period({ from, to, onLook }: { readonly from: string; readonly to: string; readonly onLook: (period: PeriodForm) => void }) {
  const { control, handleSubmit } = useForm<PeriodForm>({ defaultValues: { from: from || null, to: to || null } });
  return (
    <form className="lb-period" noValidate onSubmit={(e) => void handleSubmit(onLook)(e)}>
      <TextField control={control} name="from" type="date" label={t('from')} />
      <TextField control={control} name="to" type="date" label={t('to')} />
      <Button type="submit" text={t('look')} />
      {(from !== '' || to !== '') && <Button variant="minimal" text={t('all')} onClick={() => onLook({ from: null, to: null })} />}
    </form>
  );
}
