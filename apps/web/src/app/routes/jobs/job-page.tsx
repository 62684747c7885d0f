import { useQuery } from '@tanstack/react-query';
import { hasReached, ROUTE_STEPS, type Step } from '@shared/route';
import type { JobSheet } from '@shared/jobs';
import { Link, useParams, useSearchParams } from 'react-router-dom';
import { Answer, Failed, Waiting } from '../../../components/faces.js';
import { sheetsOf, Spine } from '../../../components/spine.js';
import { JobMoney } from '../../../features/accounts/components/job-money.js';
import { JobLoads } from '../../../features/burnouts/components/job-loads.js';
import { AttachmentsPanel } from '../../../features/attachments/components/attachments-panel.js';
import { CorePanel } from '../../../features/jobs/components/core-panel.js';
import { CreditPanel } from '../../../features/jobs/components/credit-panel.js';
import { FactsPanel } from '../../../features/jobs/components/facts-panel.js';
import { HistoryPanel } from '../../../features/jobs/components/history-panel.js';
import { JobHead } from '../../../features/jobs/components/job-head.js';
import { MessagesPanel } from '../../../features/jobs/components/messages-panel.js';
import { PapersPanel } from '../../../features/jobs/components/papers-panel.js';
import { StepWork } from '../../../features/jobs/components/step-work.js';
import { StopBox } from '../../../features/jobs/components/stop-box.js';
import { placeLink } from '../../../features/jobs/place-link.js';
import { t } from '../../../features/jobs/text.js';
import { jobRecordsQuery, jobSheetQuery } from '../../../lib/job-queries.js';
import { useMay } from '../../../lib/me.js';
import './job-page.css';

const TABS = [
  ['work', t('tabWork')],
  ['photos', t('tabPhotos')],
  ['history', t('tabHistoryLong')],
  ['money', t('tabMoney')],
] as const;
type Tab = (typeof TABS)[number][0];

/** One job: its spine, what stops it, and everything that belongs to it one click away. */
export function JobPage() {
  const { id = '' } = useParams();
  const job = useQuery(jobSheetQuery(id));
  return <Answer query={job}>{(sheet) => <Sheet key={sheet.id} job={sheet} />}</Answer>;
}

function Sheet({ job }: { readonly job: JobSheet }) {
  const [params] = useSearchParams();
  const records = useQuery(jobRecordsQuery(job.id));
  const mayRecord = useMay('records.write');
  const mayMoney = useMay('quotes.read');
  const mayMessages = useMay('messages.read');
  const tab = tabOf(params.get('tab'), mayMoney);
  const step = stepOf(params.get('step'), job);
  const recorded = new Set((records.data ?? []).map((r) => r.kind));
  const gateIsOpen = (before: Step) => job.gates.find((g) => g.before === before)?.open ?? true;
  return (
    <div className="lb-job">
      <aside className="lb-job-spine">
        <Spine sheets={sheetsOf(job, gateIsOpen)} hrefOf={(id) => `/jobs/${job.id}?step=${id}#work`} current={step} label={t('spine')} />
      </aside>
      <div className="lb-job-sheet">
        <JobHead job={job} />
        <StopBox job={job} hrefOf={(place) => placeLink(place, { jobId: job.id, recorded, mayRecord })} />
        <nav className="lb-job-tabs" aria-label={t('tabs')}>
          {TABS.filter(([name]) => name !== 'money' || mayMoney).map(([name, words]) => (
            <Link key={name} to={name === 'work' ? `/jobs/${job.id}` : `/jobs/${job.id}?tab=${name}`} aria-current={name === tab ? 'page' : undefined} preventScrollReset>
              {words}
              {name === 'photos' && job.attachments.length + job.papers.length > 0 && <span className="muted num"> {job.attachments.length + job.papers.length}</span>}
            </Link>
          ))}
        </nav>
        {tab === 'work' && (
          <div className="lb-job-work">
            <div className="stack">
              {records.data ? <StepWork job={job} step={step} records={records.data} /> : records.error ? <Failed error={records.error} onAgain={() => void records.refetch()} /> : <Waiting />}
            </div>
            <div className="stack">
              {records.data && job.route !== 'coil-rewind' && (job.route !== 'recondition' || recorded.has('core-test-after')) && <CorePanel records={records.data} />}
              {hasReached(job.route, job.step, 'strip-and-burnout') && <JobLoads jobId={job.id} />}
              <FactsPanel job={job} />
            </div>
          </div>
        )}
        {tab === 'photos' && (
          <div className="stack">
            <AttachmentsPanel jobId={job.id} attachments={job.attachments} />
            <PapersPanel job={job} />
          </div>
        )}
        {tab === 'history' && (
          <div className="stack">
            <HistoryPanel jobId={job.id} />
            {mayMessages && <MessagesPanel jobId={job.id} />}
          </div>
        )}
        {tab === 'money' && (
          <div className="stack">
            <CreditPanel job={job} />
            <JobMoney jobId={job.id} />
          </div>
        )}
      </div>
    </div>
  );
}

function tabOf(asked: string | null, mayMoney: boolean): Tab {
  const found = TABS.find(([name]) => name === asked)?.[0] ?? 'work';
  return found === 'money' && !mayMoney ? 'work' : found;
}

/** The step the address asks for, when it lies on the route; else the open one. */
function stepOf(asked: string | null, { route, step }: JobSheet): Step {
  return ROUTE_STEPS[route].find((s) => s === asked) ?? step;
}
