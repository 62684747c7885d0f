import type { LimitsVersionView } from '@shared/limits';
import { Link } from 'react-router-dom';
import { DataTable, type Column } from '../../../components/data-table.js';
import { Panel } from '../../../components/panel.js';
import { StateMark } from '../../../components/state-mark.js';
import { momentOf } from '../../../lib/format.js';
import { t } from '../text.js';

/** Who published what, when and why; the newest is in force. */
export function VersionList({ versions }: { readonly versions: readonly LimitsVersionView[] }) {
  const newest = versions[0]?.version;
  const columns: readonly Column<LimitsVersionView>[] = [
    { key: 'version', title: t('version'), cell: (v) => <Link to={`/shop/limits/${v.version}`}>{t('versionNo', { version: v.version })}</Link> },
    { key: 'standing', title: t('standsAs'), cell: (v) => (v.version === newest ? <StateMark tone="good" words={t('inForce')} /> : <StateMark tone="quiet" words={t('earlier')} />) },
    { key: 'at', title: t('publishedAt'), cell: (v) => <span className="num">{momentOf(v.publishedAt)}</span> },
    { key: 'by', title: t('publishedBy'), cell: (v) => v.publishedBy },
    { key: 'note', title: t('note'), cell: (v) => v.note },
  ];
  return (
    <Panel title={t('versions')} tight>
      <DataTable caption={t('versions')} columns={columns} rows={versions} rowKey={(v) => String(v.version)} />
    </Panel>
  );
}
