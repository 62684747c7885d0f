import type { TestJudgement } from '@libs/machine-tests';
import type { RecordView, ReadingsOf } from '@shared/records';
import type { ReactNode } from 'react';
import { Quantity } from '../../../components/quantity.js';
import { coreResultOf } from '../../../lib/core-figures.js';
import { signedPercent } from '../../../lib/core-strip.js';
import { connectionName } from '../../../lib/machine-words.js';
import { plainWord, t } from '../work-text.js';

export type FigureRow = readonly [name: string, value: ReactNode];

/** The figures of a record that somebody at the job sheet wants to see, without opening it. */
export function keyFigures(record: RecordView): readonly FigureRow[] {
  switch (record.kind) {
    case 'core-test-before':
    case 'core-test-after':
      return coreFigures(record);
    case 'strip':
      return stripFigures(record);
    case 'dismantling': {
      const readings = record.readings as ReadingsOf<'dismantling'>;
      return [
        [t('corePlate'), plainWord(readings.corePlate)],
        [t('frame'), plainWord(readings.frameMaterial)],
        [t('inspection'), readings.inspection],
      ];
    }
    case 'winding-as-found':
    case 'winding-as-wound':
      return windingFigures(record);
    case 'treatment': {
      const readings = record.readings as ReadingsOf<'treatment'>;
      return [
        [t('material'), readings.material],
        [t('bake'), <Bake key="bake" {...readings} />],
      ];
    }
    case 'assembly': {
      const readings = record.readings as ReadingsOf<'assembly'>;
      return [[t('bearings'), `${readings.bearingDriveEnd} / ${readings.bearingNonDriveEnd}`]];
    }
    case 'core-repair': {
      const readings = record.readings as ReadingsOf<'core-repair'>;
      return [[t('repaired'), `${readings.methods.map(plainWord).join(', ')}: ${readings.words}`]];
    }
    default:
      return [];
  }
}

function coreFigures(record: RecordView): FigureRow[] {
  const result = coreResultOf(record);
  if (!result) return [];
  const rows: FigureRow[] = [
    [
      t('specificLoss'),
      <span key="loss" className="measured">
        <Quantity si={result.wattsPerKgReferred} kind="specific-loss" /> ± <Quantity si={result.expandedUncertaintyWPerKg} kind="specific-loss" />
      </span>,
    ],
  ];
  if (record.kind === 'core-test-after') rows.push([t('increase'), result.increaseEstablished && result.comparison ? <b key="inc">{signedPercent(result.comparison.increase)}</b> : t('notEstablished')]);
  if (result.hotSpotK !== undefined) {
    rows.push([
      t('hotSpot'),
      <span key="hot">
        <Quantity si={result.hotSpotK} kind="temperature-difference" />
        {result.hotSpotLimitK !== undefined && (
          <span className="muted">
            {' '}
            ({t('limit')} <Quantity si={result.hotSpotLimitK} kind="temperature-difference" />)
          </span>
        )}
      </span>,
    ]);
  }
  if (result.validityReasons.length > 0) rows.push([t('reasons'), result.validityReasons.map((r) => r.words).join(' ')]);
  return rows;
}

function stripFigures(record: RecordView): FigureRow[] {
  const readings = record.readings as ReadingsOf<'strip'>;
  const limitC = record.result['limitC'];
  return [
    [t('method'), plainWord(readings.method)],
    [
      t('partPeak'),
      <span key="peak">
        <Quantity si={readings.partPeakC} kind="temperature" none={t('noPartTemperature')} />
        {typeof limitC === 'number' && (
          <span className="muted">
            {' '}
            ({t('limit')} <Quantity si={limitC} kind="temperature" />)
          </span>
        )}
      </span>,
    ],
    ...(readings.explanation ? [[t('reasons'), readings.explanation] as const] : []),
  ];
}

function windingFigures(record: RecordView): FigureRow[] {
  const w = record.readings as ReadingsOf<'winding-as-found'>;
  return [
    [t('winding'), t('windingWords', { coils: w.coils, turns: w.turnsPerCoil, span: w.spanTo, connection: connectionName(w.connection), circuits: w.circuits })],
    [
      t('wire'),
      <span key="wire">
        {w.wires.map((wire, i) => (
          <span key={i}>
            {i > 0 && ' + '}
            {wire.strands} × <Quantity si={wire.bareDiameterM} kind="wire-diameter" />
          </span>
        ))}
      </span>,
    ],
  ];
}

const Bake = ({ bakeTemperatureC, bakeMinutes, cycles }: ReadingsOf<'treatment'>) => (
  <span>
    {cycles} × <Quantity si={bakeMinutes} kind="duration" />, <Quantity si={bakeTemperatureC} kind="temperature" />
  </span>
);

/** What a machine test judged, for the lines below it; empty for other records. */
export function judgementsOf(record: RecordView): readonly Pick<TestJudgement, 'test' | 'verdict' | 'words'>[] {
  const judgements = record.result['judgements'];
  if (record.kind === 'core-test-before' || record.kind === 'core-test-after' || !Array.isArray(judgements)) return [];
  return judgements.filter((j): j is TestJudgement => typeof j === 'object' && j !== null && typeof (j as TestJudgement).test === 'string' && typeof (j as TestJudgement).verdict === 'string');
}

/** Parts that the limits demand and that are not there. */
export function missingPartsOf(record: RecordView): readonly string[] {
  const missing = record.result['missing'];
  return Array.isArray(missing) ? missing.filter((part): part is string => typeof part === 'string') : [];
}
