import { limitDifferences, type LimitDifference } from '@shared/limit-differences';
import { LIMIT_ROWS, RULE_PATH, type LimitRow } from '@shared/limit-rows';
import { limitWords, ruleOf, sourceOf, standingWords, valueOf } from '@shared/limit-values';
import { CORE_LIMIT_NAMES } from '@shared/limit-names';
import type { LimitsVersionView } from '@shared/limits';
import { DataTable, type Column } from '../../../components/data-table.js';
import { Panel } from '../../../components/panel.js';
import { Quantity } from '../../../components/quantity.js';
import { useUnits } from '../../../components/units.js';
import { LIMIT_SECTIONS, type LimitSection } from '../limit-sections.js';
import { ruleName } from '../rule-names.js';
import { t } from '../text.js';
import './limits.css';

/** A limit in a list: a figure, or the one that is a word. */
export type ShownLimit = { readonly path: string; readonly name: string; readonly row: LimitRow | null };
export const limitsOf = (section: LimitSection): ShownLimit[] => [
  ...section.blocks.flatMap((block) => block.rows.map((row) => ({ path: row.valuePath, name: row.name, row }))),
  ...(section.withRule ? [{ path: RULE_PATH, name: CORE_LIMIT_NAMES.decisionRule, row: null }] : []),
];

export function LimitValue({ set, row }: { readonly set: unknown; readonly row: LimitRow | null }) {
  if (row === null) return ruleName(ruleOf(set));
  const value = valueOf(set, row);
  return <Quantity si={value === undefined ? undefined : value / row.perShown} kind={row.kind} />;
}

/** One version as it was published: every limit, where it comes from and how far it stands, and what it changed. */
export function VersionView({ version, before }: { readonly version: LimitsVersionView; readonly before: LimitsVersionView | null }) {
  const units = useUnits();
  const was = ({ from }: LimitDifference, row: LimitRow | null) => (row && from.value !== null ? limitWords(from.value, row, units) : from.words);
  const changes = new Map(before ? limitDifferences(before.set, version.set).map((d) => [d.path, d]) : []);
  const columns: readonly Column<ShownLimit>[] = [
    {
      key: 'limit',
      title: t('limit'),
      cell: ({ path, name, row }) => {
        const change = changes.get(path);
        return (
          <span>
            {name}
            {change && <span className="lb-limit-changed">{change.valueChanged ? t('changedHere', { words: was(change, row) }) : t('sourceChangedHere')}</span>}
          </span>
        );
      },
    },
    { key: 'value', title: t('value'), number: true, cell: ({ row }) => <LimitValue set={version.set} row={row} /> },
    { key: 'source', title: t('source'), cell: ({ row }) => <span className="lb-limit-text">{(row && sourceOf(version.set, row)?.source) ?? t('ownRule')}</span> },
    { key: 'standing', title: t('standing'), cell: ({ row }) => <span className="muted">{(row && standingWords(sourceOf(version.set, row)?.standing ?? '')) || '–'}</span> },
  ];
  return (
    <div className="stack">
      {LIMIT_SECTIONS.map((section) => (
        <Panel key={section.key} title={section.title}>
          <div className="lb-limits-table">
            <DataTable caption={section.title} columns={columns} rows={limitsOf(section)} rowKey={(l) => l.path} />
          </div>
        </Panel>
      ))}
    </div>
  );
}

export const LIMIT_COUNT = LIMIT_ROWS.length + 1;
