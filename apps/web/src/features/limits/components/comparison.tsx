import { Switch } from '@blueprintjs/core';
import type { LimitDifference } from '@shared/limit-differences';
import type { LimitsVersionView } from '@shared/limits';
import { sourceOf, standingWords } from '@shared/limit-values';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { DataTable, type Column } from '../../../components/data-table.js';
import { Answer } from '../../../components/faces.js';
import { Panel } from '../../../components/panel.js';
import { comparisonQuery } from '../api/limits-queries.js';
import { LIMIT_SECTIONS } from '../limit-sections.js';
import { t } from '../text.js';
import { LIMIT_COUNT, LimitValue, limitsOf, type ShownLimit } from './version-view.js';
import './limits.css';

/** Two versions side by side; what differs is said by a word beside it. */
export function Comparison({ from, to }: { readonly from: LimitsVersionView; readonly to: LimitsVersionView }) {
  const comparison = useQuery(comparisonQuery(from.version, to.version));
  return <Answer query={comparison}>{({ differences }) => <SideBySide from={from} to={to} differences={differences} />}</Answer>;
}

function SideBySide({ from, to, differences }: { readonly from: LimitsVersionView; readonly to: LimitsVersionView; readonly differences: readonly LimitDifference[] }) {
  const [only, setOnly] = useState(true);
  const found = new Map(differences.map((d) => [d.path, d]));
  const side = (version: LimitsVersionView): Column<ShownLimit> => ({
    key: `v${version.version}`,
    title: t('versionNo', { version: version.version }),
    cell: ({ row, path }) => {
      const source = row && sourceOf(version.set, row);
      return (
        <span>
          <b className="num">
            <LimitValue set={version.set} row={row} />
          </b>
          {source && found.get(path)?.sourceChanged && (
            <span className="lb-limit-text lb-limit-below">
              {source.source} <span className="muted">({standingWords(source.standing)})</span>
            </span>
          )}
        </span>
      );
    },
  });
  const columns: readonly Column<ShownLimit>[] = [
    { key: 'limit', title: t('limit'), cell: ({ name }) => name },
    side(from),
    side(to),
    {
      key: 'mark',
      title: t('mark'),
      cell: ({ path }) => {
        const d = found.get(path);
        return d ? <span className="lb-limit-mark">{d.valueChanged ? t('changed') : t('sourceOnly')}</span> : <span className="muted">{t('same')}</span>;
      },
    },
  ];
  const sections = LIMIT_SECTIONS.map((section) => ({ ...section, limits: limitsOf(section).filter(({ path }) => !only || found.has(path)) })).filter((s) => s.limits.length > 0);
  return (
    <div className="stack">
      <div className="row spread">
        <p role="status">{differences.length === 0 ? t('noChanges') : t('changes', { count: differences.length, all: LIMIT_COUNT })}</p>
        {differences.length > 0 && <Switch checked={only} label={t('onlyChanged')} onChange={(e) => setOnly(e.currentTarget.checked)} />}
      </div>
      {sections.map((section) => (
        <Panel key={section.key} title={section.title}>
          <div className="lb-limits-compare">
            <DataTable caption={`${t('comparison', { a: from.version, b: to.version })}: ${section.title}`} columns={columns} rows={section.limits} rowKey={(l) => l.path} />
          </div>
        </Panel>
      ))}
    </div>
  );
}
