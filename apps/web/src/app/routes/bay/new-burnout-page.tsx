import { useQuery } from '@tanstack/react-query';
import { Link, useNavigate } from 'react-router-dom';
import { Cautions } from '../../../components/cautions.js';
import { useBayDensity } from '../../../components/density.js';
import { Answer } from '../../../components/faces.js';
import { PageHeader } from '../../../components/panel.js';
import { useTell } from '../../../components/toaster.js';
import { waitingJobsQuery } from '../../../features/burnouts/api/load-queries.js';
import { NewLoad } from '../../../features/burnouts/components/new-load.js';
import { t } from '../../../features/burnouts/text.js';
import { OVEN_CAUTIONS, t as recordText } from '../../../features/records/text.js';
import { shopToday } from '../../../lib/format.js';
import { bayQuery } from '../../../lib/job-records.js';

/** A load is written down before it is lit, after the cautions of the oven. */
export function NewBurnoutPage() {
  useBayDensity();
  const navigate = useNavigate();
  const tell = useTell();
  const waiting = useQuery(waitingJobsQuery);
  const bay = useQuery(bayQuery);
  return (
    <Cautions topic="oven" title={t('newTitle')} heading={recordText('ovenTitle')} lines={OVEN_CAUTIONS}>
      <PageHeader
        title={t('newTitle')}
        below={
          <>
            {t('newBelow')} <Link to="/bay/burnouts">{t('toList')}</Link>
          </>
        }
      />
      <Answer query={waiting}>
        {(jobs) => (
          <Answer query={bay}>
            {(view) => (
              <NewLoad
                waiting={jobs}
                ovens={view.ovens}
                today={shopToday(new Date())}
                onKept={(load) => {
                  tell(t('saved', { number: load.number }));
                  void navigate(`/bay/burnouts/${load.id}`, { replace: true });
                }}
              />
            )}
          </Answer>
        )}
      </Answer>
    </Cautions>
  );
}
