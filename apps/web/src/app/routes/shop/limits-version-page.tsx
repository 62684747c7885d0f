import { HTMLSelect } from '@blueprintjs/core';
import type { LimitsVersionView } from '@shared/limits';
import { useQuery } from '@tanstack/react-query';
import { Link, useParams, useSearchParams } from 'react-router-dom';
import { Answer, Empty } from '../../../components/faces.js';
import { PageHeader } from '../../../components/panel.js';
import { limitVersionsQuery } from '../../../features/limits/api/limits-queries.js';
import { Comparison } from '../../../features/limits/components/comparison.js';
import { VersionView } from '../../../features/limits/components/version-view.js';
import { t } from '../../../features/limits/text.js';
import { momentOf } from '../../../lib/format.js';

/** One version of the limits, alone or beside another; which one stands in the address. */
export function LimitsVersionPage() {
  const { version = '' } = useParams();
  const versions = useQuery(limitVersionsQuery);
  return (
    <Answer query={versions}>
      {(all) => {
        const shown = all.find((v) => String(v.version) === version);
        if (!shown) {
          return (
            <>
              <PageHeader title={t('title')} />
              <Empty title={t('notThere', { version })}>
                <Link to="/shop/limits">{t('backToAll')}</Link>
              </Empty>
            </>
          );
        }
        return <OneVersion shown={shown} all={all} />;
      }}
    </Answer>
  );
}

function OneVersion({ shown, all }: { readonly shown: LimitsVersionView; readonly all: readonly LimitsVersionView[] }) {
  const [params, setParams] = useSearchParams();
  const beside = all.find((v) => v !== shown && String(v.version) === params.get('with'));
  const [older, newer] = beside && beside.version < shown.version ? [beside, shown] : [shown, beside];
  const words = shown === all[0] ? t('inForceNow') : t('notInForce');
  return (
    <div className="stack">
      <PageHeader
        title={t('titleOf', { version: shown.version })}
        below={
          <>
            {words} {t('published', { when: momentOf(shown.publishedAt), who: shown.publishedBy })} {shown.note} <Link to="/shop/limits">{t('backToAll')}</Link>
          </>
        }
        actions={
          all.length > 1 && (
            <label className="row">
              {t('compareWith')}
              <HTMLSelect value={beside?.version ?? ''} onChange={(e) => setParams(e.target.value === '' ? {} : { with: e.target.value })}>
                <option value="">{t('onlyShown')}</option>
                {all
                  .filter((v) => v !== shown)
                  .map((v) => (
                    <option key={v.version} value={v.version}>
                      {t('compareOption', { version: v.version })}
                    </option>
                  ))}
              </HTMLSelect>
            </label>
          )
        }
      />
      {older && newer ? <Comparison from={older} to={newer} /> : <VersionView version={shown} before={all.find((v) => v.version === shown.version - 1) ?? null} />}
    </div>
  );
}
