import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { Answer, Empty } from '../../../components/faces.js';
import { PageHeader } from '../../../components/panel.js';
import { ovenQuery, ovensQuery } from '../../../features/insight/api/oven-queries.js';
import { OvenPanel } from '../../../features/insight/components/oven-panel.js';
import { t } from '../../../features/insight/text.js';
import '../../../features/insight/insight.css';

/** The ovens side by side. */
export function InsightPage() {
  const ovens = useQuery(ovensQuery);
  return (
    <>
      <PageHeader
        title={t('title')}
        below={
          <>
            {t('below')} <Link to="/bay/burnouts">{t('toBurnouts')}</Link>
          </>
        }
      />
      <Answer query={ovens} isEmpty={(all) => all.length === 0} empty={<Empty title={t('noOvens')}>{t('noOvensWords')}</Empty>}>
        {(all) => (
          <div className="lb-ovens">
            {all.map((oven) => (
              <OneOven key={oven.id} id={oven.id} />
            ))}
          </div>
        )}
      </Answer>
    </>
  );
}

function OneOven({ id }: { readonly id: string }) {
  const oven = useQuery(ovenQuery(id));
  return <Answer query={oven}>{(insight) => <OvenPanel insight={insight} />}</Answer>;
}
