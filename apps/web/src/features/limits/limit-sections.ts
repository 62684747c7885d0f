import { LIMIT_ROWS, type LimitRow } from '@shared/limit-rows';
import { t } from './text.js';

/** Figures that stand on one source, under one heading. */
export interface LimitBlock {
  readonly key: string;
  readonly title: string;
  readonly sourcePath: string | null;
  readonly rows: readonly LimitRow[];
}
export interface LimitSection {
  readonly key: string;
  readonly title: string;
  readonly blocks: readonly LimitBlock[];
  /** the one limit that is a word stands at the end of this section */
  readonly withRule: boolean;
}

const MACHINE_SECTIONS = [
  ['insulation', /^(insulation|polarization)/],
  ['winding', /^(unbalance|asFound|surge)/],
  ['highPotential', /^highPotential/],
  ['noLoad', /^noLoad/],
  ['vibration', /^vibration/],
  ['bearings', /^bearing/],
] as const;

const CORE_TITLES = ['increase', 'fall', 'absolute', 'hot-spot', 'set-up', 'hot-spot-start', 'stop', 'demanded'] as const;

const coreTitle = (sourcePath: string | null): string => {
  const key = CORE_TITLES.find((k) => sourcePath === `core.sources.${k}`);
  return t(key ?? 'shop');
};

/** The core's figures by their source, in the order they are first named; those without one last. */
function coreBlocks(): LimitBlock[] {
  const rows = LIMIT_ROWS.filter((row) => row.group === 'core');
  const paths = [...new Set(rows.map((row) => row.sourcePath))].sort((a, b) => Number(a === null) - Number(b === null));
  return paths.map((sourcePath) => ({ key: sourcePath ?? 'shop', title: coreTitle(sourcePath), sourcePath, rows: rows.filter((row) => row.sourcePath === sourcePath) }));
}

const oneByOne = (rows: readonly LimitRow[]): LimitBlock[] => rows.map((row) => ({ key: row.valuePath, title: row.name, sourcePath: row.sourcePath, rows: [row] }));

/** What stands on a source, under its heading. */
export const sourceTitle = (sourcePath: string): string => LIMIT_SECTIONS.flatMap((s) => s.blocks).find((b) => b.sourcePath === sourcePath)?.title ?? sourcePath;

/** Every limit once, in the order a person reads them. */
export const LIMIT_SECTIONS: readonly LimitSection[] = [
  { key: 'core', title: t('core'), blocks: coreBlocks(), withRule: true },
  { key: 'burnout', title: t('burnout'), blocks: oneByOne(LIMIT_ROWS.filter((row) => row.group === 'burnout')), withRule: false },
  ...MACHINE_SECTIONS.map(([key, of]) => ({ key, title: t(key), blocks: oneByOne(LIMIT_ROWS.filter((row) => row.group === 'machine' && of.test(row.key))), withRule: false })),
];
