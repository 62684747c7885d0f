import { Button } from '@blueprintjs/core';
import type { LoadView } from '@shared/burnouts';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useParams } from 'react-router-dom';
import { useBayDensity } from '../../../components/density.js';
import { Answer } from '../../../components/faces.js';
import { PageHeader, Panel } from '../../../components/panel.js';
import { loadQuery, waitingJobsQuery } from '../../../features/burnouts/api/load-queries.js';
import { AnotherFile } from '../../../features/burnouts/components/another-file.js';
import { CorrectLoad } from '../../../features/burnouts/components/correct-load.js';
import { FileDrop } from '../../../features/burnouts/components/file-drop.js';
import { FileRead } from '../../../features/burnouts/components/file-read.js';
import { LoadCurve } from '../../../features/burnouts/components/load-curve.js';
import { LoadVerdict } from '../../../features/burnouts/components/load-verdict.js';
import { t } from '../../../features/burnouts/text.js';
import { calendarDay } from '../../../lib/format.js';
import { bayQuery } from '../../../lib/job-records.js';
import { useMay } from '../../../lib/me.js';

/** One load: what stood in it, what its logger wrote, and how it went. */
export function BurnoutPage() {
  useBayDensity();
  const { id = '' } = useParams();
  const load = useQuery(loadQuery(id));
  return <Answer query={load}>{(view) => <Load key={view.id} load={view} />}</Answer>;
}

function Load({ load }: { readonly load: LoadView }) {
  const mayWrite = useMay('burnouts.write');
  const bay = useQuery({ ...bayQuery, enabled: mayWrite });
  const waiting = useQuery({ ...waitingJobsQuery, enabled: mayWrite });
  const [correcting, setCorrecting] = useState(false);
  return (
    <div className="stack">
      <PageHeader
        title={t('loadTitle', { number: load.number, oven: load.ovenName })}
        below={
          <>
            {calendarDay(load.day)} · {load.by} · <Link to="/bay/burnouts">{t('toList')}</Link>
          </>
        }
        actions={mayWrite && <Button text={t('correct')} disabled={!bay.data || !waiting.data} onClick={() => setCorrecting(true)} />}
      />
      <div className="two-columns">
        <div className="stack">
          {load.file ? (
            <>
              <Panel title={t('curve')}>
                <LoadCurve load={load} />
              </Panel>
              <Panel title={t('dropTitle')}>
                <FileRead loadId={load.id} file={load.file} />
                {mayWrite && <AnotherFile load={load} />}
              </Panel>
            </>
          ) : (
            <Panel title={t('dropTitle')}>{mayWrite ? <FileDrop load={load} /> : <p className="muted">{t('noFileWords')}</p>}</Panel>
          )}
        </div>
        <Panel title={t('judged')}>
          <div className="stack">
            <LoadVerdict load={load} />
            {load.remark !== '' && <p>{load.remark}</p>}
          </div>
        </Panel>
      </div>
      {correcting && bay.data && waiting.data && <CorrectLoad load={load} ovens={bay.data.ovens} waiting={waiting.data} onClose={() => setCorrecting(false)} />}
    </div>
  );
}
