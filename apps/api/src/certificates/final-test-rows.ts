import type { MachineTest, TestJudgement } from '@libs/machine-tests';
import type { TestRowOnPaper } from '@libs/documents';
import { formatUsual, type Kind } from '@libs/quantities';

const NAMES: Record<MachineTest, string> = {
  'insulation-resistance': 'Insulation resistance at 40 °C',
  'insulation-new-winding': 'Insulation of a new winding at 40 °C',
  'polarization-index': 'Polarization index',
  'winding-resistance-balance': 'Winding resistance, balance',
  'winding-resistance-as-found': 'Winding resistance against as found',
  'surge-difference': 'Surge comparison, difference',
  polarity: 'Polarity',
  'high-potential': 'High-potential',
  'no-load-current-balance': 'No-load current, balance',
  'no-load-current-level': 'No-load current, level',
  vibration: 'Vibration',
  direction: 'Direction',
  'bearing-rise': 'Bearing temperature rise',
  'core-loss': 'Core loss',
};
const KIND_OF: Partial<Record<MachineTest, Kind>> = {
  'insulation-resistance': 'resistance-mega',
  'insulation-new-winding': 'resistance-mega',
  'winding-resistance-balance': 'percent',
  'winding-resistance-as-found': 'percent',
  'surge-difference': 'percent',
  'high-potential': 'voltage',
  'no-load-current-balance': 'percent',
  'no-load-current-level': 'percent',
  vibration: 'vibration-velocity',
  'bearing-rise': 'temperature-difference',
  'polarization-index': 'number',
  'core-loss': 'specific-loss',
};

const AT_LEAST: readonly MachineTest[] = ['insulation-resistance', 'insulation-new-winding', 'polarization-index', 'high-potential'];

/** The final test's judgements as rows: reading and limit in words, the verdict with its source. */
export function finalTestRows(result: Record<string, unknown>): TestRowOnPaper[] {
  const judgements = (result['judgements'] ?? []) as readonly TestJudgement[];
  return judgements.map((j) => ({
    test: NAMES[j.test],
    reading: j.measured === null ? j.words : figure(j.test, j.measured, j.unit),
    limit: j.limit === null ? '' : `${AT_LEAST.includes(j.test) ? '≥' : '≤'} ${figure(j.test, j.limit, j.unit)}`,
    verdict: j.verdict,
    source: j.source,
    standing: j.standing,
  }));
}

function figure(test: MachineTest, value: number, unit: string): string {
  const kind = KIND_OF[test];
  return kind ? formatUsual(value, kind, 'si') : `${value} ${unit}`.trim();
}
