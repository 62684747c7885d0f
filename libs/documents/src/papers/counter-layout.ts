import { type Block, cell, gap, keep, rule, words } from '../press/blocks.js';
import { qrMark } from '../press/codes.js';
import type { AcknowledgementModel, DeliveryNoteModel } from './counter-papers-model.js';
import { dayOf, dayWords, momentWords } from './dates.js';
import { type LaidPaper, sheetFrame } from './frame-of-paper.js';
import { nameplateFields } from './machine-words.js';
import { opening, signatureLines } from './money-layout.js';
import { TYPE, fields, heading, shopLine } from './paper-head.js';
import { COMMON, CONTAMINATION_WORDS, COUNTER, MONEY, ROUTE_WORDS } from './words.js';

const LABEL_PT = 104;

export function layoutAcknowledgement(model: AcknowledgementModel): LaidPaper {
  const title = COUNTER.acknowledgement;
  const contamination = [CONTAMINATION_WORDS[model.contamination], model.contaminationWords].filter((part) => part.trim() !== '').join(': ');
  const qr = model.jobUrl === null ? null : qrMark(model.jobUrl, 0, 0, 78);
  const blocks: Block[] = [
    ...opening(model, title, [
      [COMMON.received, [{ text: momentWords(model.receivedAt, model.timeZone), weight: 'bold' }]],
      [COUNTER.receivedBy, model.receivedBy],
    ]),
    words(COUNTER.acknowledgementLead(model.customer.name), TYPE.money + 0.5),
    gap(6),
    rule('hair'),
    gap(6),
    ...fields(
      [
        [COUNTER.complaint, model.complaint],
        [COUNTER.accessories, model.accessories.trim() === '' ? COMMON.none : model.accessories],
        [COUNTER.contamination, contamination],
        [COUNTER.route, ROUTE_WORDS[model.route]],
        [COUNTER.promised, [{ text: model.promisedOn ? dayWords(model.promisedOn) : COUNTER.noPromise, weight: model.promisedOn ? 'bold' : 'regular' }]],
      ],
      LABEL_PT,
      TYPE.money,
    ),
    ...(model.machine.nameplate ? [...heading(COMMON.nameplate), ...fields(nameplateFields(model.machine.nameplate, model.units), LABEL_PT, TYPE.money)] : []),
    ...(model.jobUrl === null
      ? []
      : [
          gap(14),
          keep({
            kind: 'columns' as const,
            gapPt: 12,
            columns: [
              ...(qr ? [{ widthPt: 78, blocks: [{ kind: 'marks' as const, widthPt: 78, heightPt: 78, marks: [qr] }] }] : []),
              { share: 1, blocks: [gap(18), words(COUNTER.follow, TYPE.money, 'text', 'bold'), words(model.jobUrl, TYPE.money, 'copper')] },
            ],
          }),
        ]),
    ...(model.conditions.trim() === '' ? [] : [...heading(COUNTER.conditions), words(model.conditions, TYPE.small, 'muted')]),
    gap(40),
    keep(signatureLines([COUNTER.handedOver, COUNTER.takenIn])),
  ];
  return {
    frame: sheetFrame(model.paperSize),
    blocks,
    runningHead: `${title} · ${COMMON.job} ${model.job.number} · ${model.shop.name}`,
    foot: shopLine(model.shop),
    title: `${title} ${model.job.number}`,
    subject: `${title}, ${COMMON.job} ${model.job.number}`,
    furniture: true,
  };
}

export function layoutDeliveryNote(model: DeliveryNoteModel): LaidPaper {
  const title = COUNTER.deliveryNote;
  const blocks: Block[] = [
    ...opening(model, title, [
      [COUNTER.deliveryNote, [{ text: model.number, weight: 'bold' }]],
      [COMMON.issued, dayOf(model.issuedAt, model.timeZone)],
      [COUNTER.releasedBy, `${model.releasedBy}, ${dayOf(model.releasedAt, model.timeZone)}`],
      [COUNTER.certificate, model.certificateNumber ?? ''],
    ]),
    {
      kind: 'table',
      sizePt: TYPE.money,
      paddingPt: 3.4,
      columns: [{ share: 5 }, { widthPt: 70, align: 'right' }, { share: 3 }],
      head: [cell(COUNTER.item, { ink: 'muted' }), cell(MONEY.quantity, { ink: 'muted' }), cell(COUNTER.remark, { ink: 'muted' })],
      rows: model.items.map((item) => ({ cells: [cell(item.description), cell(item.quantity), cell(item.remark, { ink: 'muted' })] })),
    },
    ...(model.remark.trim() === '' ? [] : [gap(10), words(model.remark, TYPE.money)]),
    gap(44),
    keep(...(model.collectedBy.trim() === '' ? [] : [words(model.collectedBy, TYPE.money), gap(2)]), signatureLines([COUNTER.collected, COUNTER.handed])),
  ];
  return {
    frame: sheetFrame(model.paperSize),
    blocks,
    runningHead: `${title} ${model.number} · ${model.shop.name}`,
    foot: shopLine(model.shop),
    title: `${title} ${model.number}`,
    subject: `${title} ${model.number}, ${COMMON.job} ${model.job.number}`,
    furniture: true,
  };
}
