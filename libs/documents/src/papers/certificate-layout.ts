import { type Block, type Run, gap, keep, words } from '../press/blocks.js';
import { qrMark } from '../press/codes.js';
import { coreBlocks } from './certificate-core.js';
import type { CertificateModel } from './certificate-model.js';
import { readingBlocks } from './certificate-readings.js';
import { burnoutBlocks, finalTestBlocks, instrumentBlocks, ruleBlocks, signatureBlocks, statementBlocks, windingBlocks } from './certificate-records.js';
import { dayOf, momentWords } from './dates.js';
import { type LaidPaper, sheetFrame } from './frame-of-paper.js';
import { summaryBlocks } from './certificate-summary.js';
import { nameplateFields } from './machine-words.js';
import { TYPE, fields, heading, label, letterHead, partyBlocks } from './paper-head.js';
import { CERTIFICATE, COMMON, ROUTE_WORDS } from './words.js';

/** The certificate: what was found, how it was judged, by whom, and how to check that it is ours. */
export function layoutCertificate(model: CertificateModel): LaidPaper {
  return {
    frame: sheetFrame(model.paperSize),
    blocks: [
      ...head(model),
      ...standing(model),
      ...subject(model),
      ...summaryBlocks(model),
      ...coreBlocks(model),
      ...statementBlocks(model),
      ...finalTestBlocks(model),
      ...readingBlocks(model),
      ...burnoutBlocks(model),
      ...windingBlocks(model),
      ...instrumentBlocks(model),
      ...(model.remark.trim() === '' ? [] : [...heading(CERTIFICATE.remark), words(model.remark, TYPE.body)]),
      ...ruleBlocks(model),
      ...signatureBlocks(model),
    ],
    runningHead: `${CERTIFICATE.title} ${model.number} · ${COMMON.job} ${model.job.number} · ${model.customer.name} · ${model.shop.name}`,
    foot: `${CERTIFICATE.number} ${model.number} · ${CERTIFICATE.code} ${model.verification.code} · ${CERTIFICATE.cautions}`,
    title: `${CERTIFICATE.title} ${model.number}`,
    subject: `${CERTIFICATE.subtitle}, ${COMMON.job} ${model.job.number}`,
    furniture: true,
  };
}

const QR_PT = 62;

function head(model: CertificateModel): Block[] {
  const { checkUrl, code } = model.verification;
  const qr = qrMark(checkUrl, 0, 0, QR_PT);
  const check: Block[] = [
    {
      kind: 'columns',
      gapPt: 7,
      columns: [
        { share: 1, blocks: [words(CERTIFICATE.check, TYPE.small, 'copper', 'bold', 'right'), words(checkUrl, 5.6, 'copper', 'regular', 'right'), words(`${CERTIFICATE.code} ${code}`, TYPE.small, 'text', 'bold', 'right')] },
        { widthPt: QR_PT, blocks: qr ? [{ kind: 'marks', widthPt: QR_PT, heightPt: QR_PT, marks: [qr], align: 'right' }] : [] },
      ],
    },
  ];
  return letterHead(model.shop, check);
}

function standing(model: CertificateModel): Block[] {
  const { replaces, supersededBy } = model;
  const title: Block[] = [
    gap(6),
    { kind: 'text', sizePt: TYPE.title, leading: 1.2, runs: [{ text: CERTIFICATE.title, weight: 'bold' }, { text: `  ${model.number}`, ink: 'muted' }] },
    {
      kind: 'text',
      sizePt: TYPE.body,
      runs: [{ text: `${CERTIFICATE.subtitle} · ${ROUTE_WORDS[model.route]} · ${COMMON.issued.toLowerCase()} ${momentWords(model.issuedAt, model.timeZone)}`, ink: 'muted' }],
    },
  ];
  if (supersededBy) {
    const runs: Run[] = [{ text: CERTIFICATE.superseded(supersededBy.number, dayOf(supersededBy.issuedAt, model.timeZone)), weight: 'bold', ink: 'does-not-conform' }];
    title.push(gap(5), { kind: 'frame', ink: 'does-not-conform', paddingPt: 6, blocks: [{ kind: 'text', sizePt: TYPE.body, runs }] });
  }
  if (replaces) {
    title.push(gap(4), words(`${CERTIFICATE.replaces(replaces.number, dayOf(replaces.issuedAt, model.timeZone))} ${CERTIFICATE.reason}: ${replaces.reason}`, TYPE.body));
  }
  return title;
}

function subject(model: CertificateModel): Block[] {
  const plate = model.machine.nameplate;
  const all = plate ? nameplateFields(plate, model.units) : [];
  const half = Math.ceil(all.length / 2);
  return [
    gap(9),
    { kind: 'rule', ink: 'line', thicknessPt: 0.7 },
    gap(6),
    keep({
      kind: 'columns',
      gapPt: 20,
      columns: [
        {
          widthPt: 150,
          blocks: [
            label(COMMON.customer),
            ...partyBlocks(model.customer),
            gap(4),
            ...fields(
              [
                [COMMON.job, [{ text: model.job.number, weight: 'bold' }]],
                [COMMON.received, dayOf(model.receivedAt, model.timeZone)],
                [COMMON.yourReference, model.job.customerReference],
              ],
              62,
            ),
          ],
        },
        {
          share: 1,
          blocks: [
            label(COMMON.machine),
            words(model.machine.description, TYPE.body + 0.5, 'text', 'bold'),
            gap(1.5),
            all.length === 0
              ? words(`${COMMON.nameplate}: ${COMMON.notRead}`, TYPE.table, 'muted')
              : {
                  kind: 'columns',
                  gapPt: 12,
                  columns: [
                    { share: 1, blocks: fields(all.slice(0, half), 60) },
                    { share: 1, blocks: fields(all.slice(half), 64) },
                  ],
                },
          ],
        },
      ],
    }),
  ];
}
