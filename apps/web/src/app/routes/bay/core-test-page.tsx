import { useQuery } from '@tanstack/react-query';
import type { Phase } from '../../../features/bench/bench-form.js';
import { Bench } from '../../../features/bench/components/bench.js';
import { KeptTest } from '../../../features/bench/components/kept-test.js';
import { ReadingsPanel } from '../../../features/records/components/kept-record.js';
import { CORE_CAUTIONS, t } from '../../../features/bench/text.js';
import { Cautions } from '../../../components/cautions.js';
import { Answer } from '../../../components/faces.js';
import { hasReached } from '@shared/route';
import { RECORD_FROM_STEP, type RecordView } from '@shared/records';
import { useState } from 'react';
import { useNavigate, useParams, useSearchParams } from 'react-router-dom';
import { useTell } from '../../../components/toaster.js';
import { jobRecordsQuery, jobSheetQuery } from '../../../lib/job-queries.js';
import { bayQuery, limitsQuery, recordsOfKind } from '../../../lib/job-records.js';
import { useMay } from '../../../lib/me.js';
import { NotOpenYet, NotYours } from './not-open-yet.js';

export const CoreTestBeforePage = () => <CoreTestPage phase="before" />;
export const CoreTestAfterPage = () => <CoreTestPage phase="after" />;

/** The bench for a new test, a repeat or a correction; a test that is kept is shown as it is kept. */
function CoreTestPage({ phase }: { readonly phase: Phase }) {
  const { id = '' } = useParams();
  const [params] = useSearchParams();
  const navigate = useNavigate();
  const tell = useTell();
  const mayWrite = useMay('records.write');
  const [differs, setDiffers] = useState(false);
  const job = useQuery(jobSheetQuery(id));
  const records = useQuery(jobRecordsQuery(id));
  const bay = useQuery(bayQuery);
  const limits = useQuery({ ...limitsQuery(job.data?.limitsVersion ?? 1), enabled: job.data !== undefined });
  const kind = `core-test-${phase}` as const;
  const title = t(phase === 'before' ? 'titleBefore' : 'titleAfter');
  const onKept = (kept: RecordView, onScreen: string | null) => {
    setDiffers(kept.verdict !== onScreen);
    tell(t('saved'));
    void navigate(`/jobs/${id}/work/${kind}`, { replace: true });
  };
  return (
    <Answer query={job}>
      {(sheet) => (
        <Answer query={records}>
          {(all) => {
            const kept = recordsOfKind(all, kind).at(-1);
            const amend = all.find((r) => r.id === params.get('amend') && r.kind === kind) ?? null;
            const fill = amend !== null || params.get('again') === '1' || kept === undefined;
            if (fill && !mayWrite) return <NotYours title={`${title} · ${sheet.number}`} job={sheet} />;
            if (kept === undefined && !hasReached(sheet.route, sheet.step, RECORD_FROM_STEP[kind])) return <NotOpenYet job={sheet} kind={kind} title={title} />;
            return (
              <Answer query={limits}>
                {(set) =>
                  fill ? (
                    <Answer query={bay}>
                      {(view) => (
                        <Cautions topic="core" title={`${title} · ${sheet.number}`} heading={t('cautionTitle')} lines={CORE_CAUTIONS}>
                          <Bench key={`${kind}${amend?.id ?? params.get('again') ?? ''}`} job={sheet} phase={phase} records={all} limits={set} bay={view} amend={amend} onKept={onKept} />
                        </Cautions>
                      )}
                    </Answer>
                  ) : (
                    <div className="stack">
                      <KeptTest job={sheet} phase={phase} record={kept} records={all} limits={set} differs={differs} />
                      <ReadingsPanel record={kept} />
                    </div>
                  )
                }
              </Answer>
            );
          }}
        </Answer>
      )}
    </Answer>
  );
}
