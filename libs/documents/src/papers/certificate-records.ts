import { type Block, type Cell, type TableColumn, type TableRow, cell, gap, keep, words } from '../press/blocks.js';
import { sourceWords, verdictRuns } from './certificate-core.js';
import type { CertificateModel, SignatureOnPaper } from './certificate-model.js';
import { dayOf, dayWords, momentWords } from './dates.js';
import { plateWords, withUnits } from './figures.js';
import { TYPE, heading } from './paper-head.js';
import { BURNOUT, CERTIFICATE, COMMON, CONFIRMED_BY, DECISION_RULE_WORDS, SIGNATURE_WORDS, STATEMENT_WORDS } from './words.js';

const muted = (text: string): Cell => cell(text, { ink: 'muted' });

function table(columns: readonly TableColumn[], head: readonly string[], rows: readonly TableRow[]): Block {
  return { kind: 'table', sizePt: TYPE.table, paddingPt: 2.2, columns, head: head.map(muted), rows };
}

const hash = (contentHash: string) => contentHash.slice(0, 12);

/** What let the job pass where the test alone did not: in full, with the customer's answer. */
export function statementBlocks(model: CertificateModel): Block[] {
  if (model.statements.length === 0) return [];
  return [
    ...heading(CERTIFICATE.statements),
    ...model.statements.flatMap((statement, index): Block[] => {
      const { customerAnswer: answer, signature } = statement;
      return [
        ...(index > 0 ? [gap(5)] : []),
        {
          kind: 'frame',
          ink: 'inconclusive',
          paddingPt: 7,
          blocks: [
            { kind: 'text', sizePt: TYPE.body, runs: [{ text: `${STATEMENT_WORDS[statement.kind]}: ${statement.about}. `, weight: 'bold' }, { text: statement.words }] },
            ...(answer
              ? [
                  gap(2),
                  words(
                    `${STATEMENT_WORDS.decision}: ${[answer.choice, answer.words].filter((part) => part.trim() !== '').join('. ')} (${answer.by}, ${answer.channel}, ${momentWords(answer.at, model.timeZone)})`,
                    TYPE.body,
                  ),
                ]
              : []),
            gap(2),
            words(CONFIRMED_BY(signature.name, signature.role, momentWords(signature.at, model.timeZone), hash(signature.contentHash)), TYPE.small, 'muted'),
          ],
        },
      ];
    }),
  ];
}

export function finalTestBlocks(model: CertificateModel): Block[] {
  if (model.finalTests.length === 0) return [];
  return [
    ...heading(CERTIFICATE.finalTests),
    table(
      [{ widthPt: 92 }, { share: 6 }, { share: 4 }, { widthPt: 96 }, { share: 4 }],
      [CERTIFICATE.test, CERTIFICATE.reading, CERTIFICATE.limit, CERTIFICATE.verdict, CERTIFICATE.source],
      model.finalTests.map((row) => ({ cells: [cell(row.test), cell(withUnits(row.reading)), cell(withUnits(row.limit)), { runs: verdictRuns(row.verdict) }, muted(sourceWords(row.source, row.standing))] })),
    ),
  ];
}

export function burnoutBlocks(model: CertificateModel): Block[] {
  if (model.burnouts.length === 0) return [];
  return [
    ...heading(CERTIFICATE.burnout),
    table(
      [{ share: 3 }, { widthPt: 50, align: 'right' }, { share: 4 }, { share: 3 }, { widthPt: 98 }],
      [BURNOUT.method, BURNOUT.peak, CERTIFICATE.limit, BURNOUT.above, CERTIFICATE.verdict],
      model.burnouts.flatMap((run): TableRow[] => {
        const limit = run.limitC === null ? run.limitReason : [plateWords(run.limitC, 'temperature', model.units), run.limitReason].filter((part) => part.trim() !== '').join(', ');
        const above = run.minutesAbove ? BURNOUT.minutesAbove(run.minutesAbove.minutes, plateWords(run.minutesAbove.thresholdC, 'temperature', model.units)) : COMMON.none;
        const row: TableRow = {
          keepWithNext: run.remark.trim() !== '',
          cells: [
            { runs: [{ text: run.method }, { text: `\n${dayOf(run.startedAt, model.timeZone)}`, ink: 'muted' }] },
            cell(run.partPeakC === null ? COMMON.none : plateWords(run.partPeakC, 'temperature', model.units)),
            cell(limit === '' ? COMMON.none : limit),
            cell(above),
            { runs: verdictRuns(run.verdict) },
          ],
        };
        return run.remark.trim() === '' ? [row] : [row, { bare: true, cells: [{ runs: [{ text: run.remark, ink: 'muted' }], span: 5 }] }];
      }),
    ),
  ];
}

export function windingBlocks(model: CertificateModel): Block[] {
  if (model.winding.length === 0) return [];
  return [
    ...heading(CERTIFICATE.winding),
    table(
      [{ widthPt: 128 }, { share: 1 }, { share: 1 }],
      [CERTIFICATE.item, CERTIFICATE.asFound, CERTIFICATE.asWound],
      model.winding.map((row) => ({
        cells: [muted(row.item), cell(row.asFound), cell(row.asWound, row.asFound !== '' && row.asFound !== row.asWound ? { weight: 'bold' } : {})],
      })),
    ),
  ];
}

export function instrumentBlocks(model: CertificateModel): Block[] {
  if (model.instruments.length === 0) return [];
  return [
    ...heading(CERTIFICATE.instruments),
    table(
      [{ share: 3 }, { share: 3 }, { share: 2 }, { widthPt: 92 }, { widthPt: 92 }],
      [CERTIFICATE.use, CERTIFICATE.instrument, COMMON.serial, CERTIFICATE.calibrated, CERTIFICATE.due],
      model.instruments.map((row) => ({
        cells: [
          muted(row.use),
          cell(row.name),
          cell(row.serial === '' ? COMMON.none : row.serial),
          row.calibratedOn === null ? cell(CERTIFICATE.noCalibration, { ink: 'not-valid', weight: 'bold' }) : cell(dayWords(row.calibratedOn)),
          cell(row.dueOn === null ? COMMON.none : dayWords(row.dueOn)),
        ],
      })),
    ),
  ];
}

/** The decision rule and the uncertainty statement. */
export function ruleBlocks(model: CertificateModel): Block[] {
  const { limits } = model;
  return [
    ...heading(CERTIFICATE.rule),
    words(
      [
        CERTIFICATE.limitsVersion(limits.version, dayOf(limits.publishedAt, model.timeZone)),
        CERTIFICATE.decisionRule(DECISION_RULE_WORDS[limits.decisionRule]),
        CERTIFICATE.uncertaintyStatement(String(limits.coverageFactor)),
        CERTIFICATE.times(model.timeZone),
      ].join(' '),
      TYPE.table,
    ),
  ];
}

/** Three abreast; each with its role, its moment and the hash of what was signed. */
export function signatureBlocks(model: CertificateModel): Block[] {
  if (model.signatures.length === 0) return [];
  const rows: SignatureOnPaper[][] = [];
  for (let from = 0; from < model.signatures.length; from += 3) rows.push(model.signatures.slice(from, from + 3));
  return [
    gap(4),
    keep(
      ...heading(CERTIFICATE.signatures),
      ...rows.flatMap((row): Block[] => [
        gap(2),
        {
          kind: 'columns',
          gapPt: 16,
          columns: [0, 1, 2].map((place) => {
            const signature = row[place];
            return {
              share: 1,
              blocks: signature
                ? [
                    { kind: 'rule', ink: 'line', thicknessPt: 0.7 } as Block,
                    gap(3),
                    words(SIGNATURE_WORDS[signature.act], TYPE.label, 'muted'),
                    words(signature.name, TYPE.body + 1, 'text', 'bold'),
                    words(`${signature.role}, ${momentWords(signature.at, model.timeZone)}`, TYPE.table),
                    words(`${CERTIFICATE.hash} ${hash(signature.contentHash)}`, TYPE.label, 'muted'),
                  ]
                : [],
            };
          }),
        },
      ]),
    ),
  ];
}
