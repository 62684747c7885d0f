import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { Answer, Empty } from '../../../components/faces.js';
import { PageHeader } from '../../../components/panel.js';
import { limitVersionsQuery } from '../../../features/limits/api/limits-queries.js';
import { VersionList } from '../../../features/limits/components/version-list.js';
import { VersionView } from '../../../features/limits/components/version-view.js';
import { t } from '../../../features/limits/text.js';
import { ShopTabs } from '../../../features/shop/components/shop-tabs.js';
import { useMay } from '../../../lib/me.js';

/** What the shop judges by: every version with who, when and why, and the one in force with its sources. */
export function LimitsPage() {
  const versions = useQuery(limitVersionsQuery);
  const mayPublish = useMay('limits.publish');
  return (
    <div>
      <PageHeader title={t('title')} below={t('help')} actions={mayPublish && <Link className="bp6-button bp6-intent-primary" to="/shop/limits/new">{t('newVersion')}</Link>} />
      <ShopTabs />
      <Answer query={versions} isEmpty={(all) => all.length === 0} empty={<Empty title={t('none')}>{t('noneWords')}</Empty>}>
        {(all) => (
          <div className="stack">
            <VersionList versions={all} />
            <h2>{t('nowInForce', { version: all[0]!.version })}</h2>
            <VersionView version={all[0]!} before={all[1] ?? null} />
          </div>
        )}
      </Answer>
    </div>
  );
}
