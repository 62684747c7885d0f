import { hasReached } from '@shared/route';
import { RECORD_FROM_STEP, type RecordView } from '@shared/records';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { useNavigate, useParams, useSearchParams } from 'react-router-dom';
import { Cautions } from '../../../components/cautions.js';
import { Answer } from '../../../components/faces.js';
import { useTell } from '../../../components/toaster.js';
import { useUnits } from '../../../components/units.js';
import { KeptRecord } from '../../../features/records/components/kept-record.js';
import { FORM_KINDS, WorkForm } from '../../../features/records/components/work-form.js';
import type { FormKind } from '../../../features/records/record-definition.js';
import { ELECTRICAL_CAUTIONS, OVEN_CAUTIONS, t } from '../../../features/records/text.js';
import { jobLoadsQuery } from '../../../lib/burnout-queries.js';
import { jobRecordsQuery, jobSheetQuery } from '../../../lib/job-queries.js';
import { bayQuery, limitsQuery, recordsOfKind } from '../../../lib/job-records.js';
import { recordName } from '../../../lib/record-names.js';
import { NotFoundPage } from '../error-page.js';
import { useMay } from '../../../lib/me.js';
import { NotOpenYet, NotYours } from './not-open-yet.js';

const isFormKind = (kind: string): kind is FormKind => (FORM_KINDS as readonly string[]).includes(kind);

/** A record of a job: filled in, corrected, or as it is kept. */
export function WorkPage() {
  const { id = '', kind = '' } = useParams();
  return isFormKind(kind) ? <WorkOf id={id} kind={kind} /> : <NotFoundPage />;
}

function WorkOf({ id, kind }: { readonly id: string; readonly kind: FormKind }) {
  const [params] = useSearchParams();
  const navigate = useNavigate();
  const tell = useTell();
  const system = useUnits();
  const mayWrite = useMay('records.write');
  const job = useQuery(jobSheetQuery(id));
  const records = useQuery(jobRecordsQuery(id));
  const bay = useQuery(bayQuery);
  const limits = useQuery({ ...limitsQuery(job.data?.limitsVersion ?? 1), enabled: job.data !== undefined });
  const loads = useQuery({ ...jobLoadsQuery(id), enabled: kind === 'strip' });
  const onKept = (_: RecordView) => {
    tell(t('saved', { record: recordName(kind) }));
    void navigate(`/jobs/${id}/work/${kind}`, { replace: true });
  };
  return (
    <Answer query={job}>
      {(sheet) => (
        <Answer query={records}>
          {(all) => {
            const title = `${recordName(kind)} · ${sheet.number}`;
            const kept = recordsOfKind(all, kind).at(-1);
            const amend = all.find((r) => r.id === params.get('amend') && r.kind === kind) ?? null;
            if (kept && !amend && params.get('again') !== '1') return <KeptRecord job={sheet} record={kept} />;
            if (!mayWrite) return <NotYours title={title} job={sheet} />;
            if (!kept && !hasReached(sheet.route, sheet.step, RECORD_FROM_STEP[kind])) return <NotOpenYet job={sheet} kind={kind} title={recordName(kind)} />;
            return (
              <Answer query={limits}>
                {(set) => (
                  <Answer query={bay}>
                    {(view) => (
                      <WithCautions kind={kind} title={title}>
                        <WorkForm key={`${kind}${amend?.id ?? params.get('again') ?? ''}`} kind={kind} context={{ job: sheet, records: all, limits: set, bay: view, system, loads: loads.data ?? [] }} amend={amend} onKept={onKept} />
                      </WithCautions>
                    )}
                  </Answer>
                )}
              </Answer>
            );
          }}
        </Answer>
      )}
    </Answer>
  );
}

/** Work that can hurt begins with its cautions. */
function WithCautions({ kind, title, children }: { readonly kind: FormKind; readonly title: string; readonly children: ReactNode }) {
  if (kind === 'strip') {
    return (
      <Cautions topic="oven" title={title} heading={t('ovenTitle')} lines={OVEN_CAUTIONS}>
        {children}
      </Cautions>
    );
  }
  if (kind === 'incoming-test' || kind === 'before-varnish-test' || kind === 'final-test') {
    return (
      <Cautions topic="electrical" title={title} heading={t('electricalTitle')} lines={ELECTRICAL_CAUTIONS}>
        {children}
      </Cautions>
    );
  }
  return children;
}
