import { VERDICTS, type Verdict } from '@libs/measurement';
import { type Block, type Run, gap, words } from '../press/blocks.js';
import { verdictRuns } from './certificate-core.js';
import type { CertificateModel } from './certificate-model.js';
import { signedPercent } from './figures.js';
import { TYPE, label } from './paper-head.js';
import { CERTIFICATE } from './words.js';

/** What a reader wants to know first, in one band: the core, its increase, the finished machine. */
export function summaryBlocks(model: CertificateModel): Block[] {
  const column = (name: string, runs: readonly Run[], below: string) => ({
    share: 1,
    blocks: [label(name), { kind: 'text', sizePt: 10.5, leading: 1.3, runs } as Block, words(below, TYPE.table, 'muted')],
  });
  const deciding = model.coreAfter ?? model.coreBefore;
  const core = deciding ? column(CERTIFICATE.coreTest, verdictRuns(deciding.result.verdict), deciding.title) : column(CERTIFICATE.coreTest, [{ text: CERTIFICATE.notMade, ink: 'muted' }], '');
  return [
    gap(8),
    { kind: 'rule', ink: 'line', thicknessPt: 0.7 },
    gap(6),
    { kind: 'columns', gapPt: 20, columns: [core, ...increase(model, column), machine(model, column)] },
    gap(4),
    { kind: 'rule', ink: 'line', thicknessPt: 0.7 },
  ];
}

type Column = (name: string, runs: readonly Run[], below: string) => { share: number; blocks: Block[] };

function increase(model: CertificateModel, column: Column) {
  const result = model.coreAfter?.result;
  if (!result) return [];
  const { comparison } = result;
  if (!result.increaseEstablished || !comparison) {
    return [column(CERTIFICATE.increase, [{ text: CERTIFICATE.notEstablished, weight: 'bold' }], comparison ? CERTIFICATE.notComparable : CERTIFICATE.missingBefore)];
  }
  const interval = CERTIFICATE.increaseInterval(signedPercent(comparison.low), signedPercent(comparison.high));
  return [column(CERTIFICATE.increase, [{ text: signedPercent(comparison.increase), weight: 'bold', ink: 'steel' }], interval)];
}

function machine(model: CertificateModel, column: Column) {
  const judged = model.finalTests.map((row) => row.verdict).filter((verdict): verdict is Verdict => verdict !== 'shown-not-judged');
  if (judged.length === 0) return column(CERTIFICATE.finalTests, [{ text: CERTIFICATE.notMade, ink: 'muted' }], '');
  const worst = [...VERDICTS].reverse().find((verdict) => judged.includes(verdict)) ?? 'not-valid';
  return column(CERTIFICATE.finalTests, verdictRuns(worst), CERTIFICATE.conforming(judged.filter((verdict) => verdict === 'conforms').length, judged.length));
}
