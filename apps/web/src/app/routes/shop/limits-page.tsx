import { HTMLSelect } from '@blueprintjs/core';
import type { LimitsSet, LimitsVersionView } from '@shared/limits';
import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { Answer, Empty } from '../../../components/faces.js';
import { PageHeader } from '../../../components/panel.js';
import { limitsVersionsQuery } from '../../../features/shop/api/shop-queries.js';
import { LimitTable } from '../../../features/shop/components/limit-table.js';
import { ShopTabs } from '../../../features/shop/components/shop-tabs.js';
import { burnoutRows, coreRows, machineRows } from '../../../features/shop/limit-rows.js';
import { t } from '../../../features/shop/text.js';
import { dayOf, momentOf } from '../../../lib/format.js';

/** What the shop judges by: each limit with its value, where it comes from and how far it stands. */
export function LimitsPage() {
  const versions = useQuery(limitsVersionsQuery);
  return (
    <div>
      <PageHeader title={t('limits')} below={t('limitsHelp')} />
      <ShopTabs />
      <Answer query={versions} isEmpty={(all) => all.length === 0} empty={<Empty title={t('noLimits')}>{t('noLimitsWords')}</Empty>}>
        {(all) => <Limits versions={[...all].sort((a, b) => b.version - a.version)} />}
      </Answer>
    </div>
  );
}

function Limits({ versions }: { readonly versions: readonly LimitsVersionView[] }) {
  const [params, setParams] = useSearchParams();
  const newest = versions[0]!;
  const shown = versions.find((v) => String(v.version) === params.get('version')) ?? newest;
  const set = shown.set as unknown as LimitsSet;
  return (
    <div className="stack">
      <div className="row spread">
        <div>
          <p>
            <b>{shown === newest ? t('inForce', { version: shown.version }) : t('older', { version: shown.version, newest: newest.version })}</b>
          </p>
          <p className="muted">
            {t('published', { when: momentOf(shown.publishedAt), who: shown.publishedBy })} {shown.note}
          </p>
        </div>
        {versions.length > 1 && (
          <HTMLSelect aria-label={t('version')} value={shown.version} onChange={(e) => setParams({ version: e.target.value }, { replace: true })}>
            {versions.map((v) => (
              <option key={v.version} value={v.version}>
                {t('versionOption', { version: v.version, day: dayOf(v.publishedAt) })}
              </option>
            ))}
          </HTMLSelect>
        )}
      </div>
      <LimitTable title={t('core')} rows={coreRows(set.core)} />
      <LimitTable title={t('burnout')} rows={burnoutRows(set.burnout)} />
      <LimitTable title={t('machine')} rows={machineRows(set.machine)} />
    </div>
  );
}
