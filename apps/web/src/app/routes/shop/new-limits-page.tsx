import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { Answer, Empty } from '../../../components/faces.js';
import { PageHeader } from '../../../components/panel.js';
import { useTell } from '../../../components/toaster.js';
import { limitVersionsQuery } from '../../../features/limits/api/limits-queries.js';
import { LimitsEditor } from '../../../features/limits/components/limits-editor.js';
import { t } from '../../../features/limits/text.js';
import { momentOf } from '../../../lib/format.js';
import { useMay } from '../../../lib/me.js';

/** The next version of the limits, for whoever may publish one. */
export function NewLimitsPage() {
  const versions = useQuery(limitVersionsQuery);
  const mayPublish = useMay('limits.publish');
  const navigate = useNavigate();
  const tell = useTell();
  // what was published after the form was opened is told in the form, not put under its fields
  const [begun, setBegun] = useState(0);
  if (!mayPublish) {
    return (
      <>
        <PageHeader title={t('editTitle')} />
        <Empty title={t('mayNot')}>
          <p>{t('mayNotWords')}</p>
          <Link to="/shop/limits">{t('backToAll')}</Link>
        </Empty>
      </>
    );
  }
  return (
    <Answer query={versions} isEmpty={(all) => all.length === 0} empty={<Empty title={t('none')}>{t('noneWords')}</Empty>}>
      {(all) => (
        <>
          <PageHeader
            title={t('editTitle')}
            below={
              <>
                {t('editHelp', { version: all[0]!.version, when: momentOf(all[0]!.publishedAt) })} <Link to="/shop/limits">{t('backToAll')}</Link>
              </>
            }
          />
          <LimitsEditor
            key={begun}
            versions={all}
            onCancel={() => void navigate('/shop/limits')}
            onPublished={(version) => {
              tell(t('done', { version: version.version }));
              setBegun((n) => n + 1);
              void navigate(`/shop/limits/${version.version}`);
            }}
          />
        </>
      )}
    </Answer>
  );
}
