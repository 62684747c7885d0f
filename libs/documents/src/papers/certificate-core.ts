import type { Judgement } from '@libs/core-loss';
import { type Block, type Cell, type Run, type TableRow, cell, gap, keep, words } from '../press/blocks.js';
import { SIGN_INKS } from '../press/sign-marks.js';
import { ringOnPaper, stripOnPaper } from './certificate-drawings.js';
import type { CertificateModel, VerdictOnPaper } from './certificate-model.js';
import { dayOf } from './dates.js';
import { bareFigure, figureRuns, points, signedPercent } from './figures.js';
import { TYPE, heading } from './paper-head.js';
import type { PaperUnits } from './paper-model.js';
import { CERTIFICATE, CONFIRMED_BY, JUDGED_WORDS, STANDING_WORDS, VERDICT_WORDS, WAIVER_WORDS } from './words.js';

/** A verdict in a line: its sign, and its word in its ink. */
export function verdictRuns(verdict: VerdictOnPaper, weight: 'regular' | 'bold' = 'bold'): Run[] {
  return [{ sign: verdict }, { text: VERDICT_WORDS[verdict], ink: SIGN_INKS[verdict], weight }];
}

/** The core's own part of the certificate: ring, strip, increase, and each judgement with its limit and source. */
export function coreBlocks(model: CertificateModel): Block[] {
  const deciding = model.coreAfter ?? model.coreBefore;
  if (!deciding) return model.missingBefore ? [...heading(CERTIFICATE.coreTest), ...missingBefore(model)] : [];
  const strip = stripOnPaper(model);
  return [
    ...heading(CERTIFICATE.coreTest),
    keep({
      kind: 'columns',
      gapPt: 18,
      columns: [
        { widthPt: 168, blocks: [{ kind: 'drawing', drawing: ringOnPaper(model, deciding), widthPt: 168 }] },
        {
          share: 1,
          blocks: [
            { kind: 'text', sizePt: TYPE.body, runs: [{ text: capital(deciding.title), weight: 'bold' }, { text: `, ${dayOf(deciding.testedAt, model.timeZone)}`, ink: 'muted' }] },
            gap(6),
            ...(strip ? [{ kind: 'drawing' as const, drawing: strip, widthPt: 340 }] : []),
          ],
        },
      ],
    }),
    gap(6),
    judgementTable(deciding.result.judgements, model),
    ...(model.missingBefore ? [gap(6), ...missingBefore(model)] : []),
    gap(3),
    words(CERTIFICATE.flux, TYPE.small, 'muted'),
  ];
}

function judgementTable(judgements: readonly Judgement[], model: CertificateModel): Block {
  const muted = (text: string): Cell => cell(text, { ink: 'muted' });
  return {
    kind: 'table',
    sizePt: TYPE.table,
    paddingPt: 2.2,
    columns: [{ widthPt: 92 }, { widthPt: 80, align: 'right' }, { widthPt: 48, align: 'right' }, { widthPt: 96 }, { share: 1 }],
    head: [muted(CERTIFICATE.judged), muted(`${CERTIFICATE.measured} ± U`), muted(CERTIFICATE.limit), muted(CERTIFICATE.verdict), muted(CERTIFICATE.source)],
    rows: judgements.flatMap((judgement): TableRow[] => {
      const reasons = judgement.reasons.map((reason) => reason.words).join(' ');
      const row: TableRow = {
        keepWithNext: reasons !== '',
        cells: [
          cell(JUDGED_WORDS[judgement.test]),
          { runs: valueRuns(judgement, judgement.measured, model.units, judgement.expandedUncertainty) },
          { runs: valueRuns(judgement, judgement.limit, model.units) },
          { runs: verdictRuns(judgement.verdict) },
          muted(sourceWords(judgement.source, judgement.standing)),
        ],
      };
      return reasons === '' ? [row] : [row, { bare: true, cells: [cell(''), { runs: [{ text: reasons, ink: 'muted' }], span: 4, align: 'left' }] }];
    }),
  };
}

export function sourceWords(source: string, standing: string): string {
  const words = STANDING_WORDS[standing] ?? standing;
  return words === '' || source.toLowerCase().includes(words.toLowerCase()) ? source : `${source} (${words})`;
}

function valueRuns(judgement: Judgement, value: number | undefined, units: PaperUnits, uncertainty?: number): Run[] {
  if (value === undefined) return [{ text: '—', ink: 'muted' }];
  const band = (text: string): Run[] => [{ text: `\u00a0±\u00a0${text}`, ink: 'muted' }];
  if (judgement.unit === '1') return [{ text: judgement.test === 'fall' ? `${points(value)}\u00a0%` : signedPercent(value) }, ...(uncertainty === undefined ? [] : band(points(uncertainty)))];
  const kind = judgement.unit === 'K' ? 'temperature-difference' : 'specific-loss';
  if (uncertainty === undefined) return figureRuns(value, kind, units);
  const [figure, ...unit] = figureRuns(value, kind, units);
  return [...(figure ? [figure] : []), ...band(bareFigure(uncertainty, kind, units)), ...unit];
}

function missingBefore(model: CertificateModel): Block[] {
  const missing = model.missingBefore;
  if (!missing) return [];
  const signed = missing.countersignature;
  return [
    {
      kind: 'frame',
      ink: 'line',
      paddingPt: 7,
      blocks: [
        {
          kind: 'text',
          sizePt: TYPE.body,
          runs: [
            { text: `${CERTIFICATE.missingBefore}: ${CERTIFICATE.increaseNotEstablished}. `, weight: 'bold' },
            { text: `${capital(WAIVER_WORDS[missing.reason])}. ${missing.words}` },
          ],
        },
        words(
          [`${missing.askedBy}, ${dayOf(missing.askedAt, model.timeZone)}`, signed ? CONFIRMED_BY(signed.name, signed.role, dayOf(signed.at, model.timeZone), signed.contentHash.slice(0, 12)) : ''].filter((part) => part !== '').join(' · '),
          TYPE.small,
          'muted',
        ),
      ],
    },
  ];
}

export const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
