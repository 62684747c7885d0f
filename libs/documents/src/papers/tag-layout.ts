import { spineDrawing } from '@libs/drawings';
import { ROUTE_STEPS } from '@shared/route';
import { type Block, gap } from '../press/blocks.js';
import { code128Mark, qrMark } from '../press/codes.js';
import { bodyWidth } from '../press/make-pages.js';
import type { TagModel } from './counter-papers-model.js';
import { dayOf, dayWords } from './dates.js';
import { LABEL, type LaidPaper } from './frame-of-paper.js';
import { COMMON, COUNTER, ROUTE_WORDS, STEP_WORDS } from './words.js';

const QR_PT = 66;
const BARS_PT = 21;

/**
 * The label on the machine: read from two metres by eye, from one by a scanner. Every line is cut to its
 * place, for a label has no second page. The little spine shows how far the route goes and where it stands.
 */
export function layoutTag(model: TagModel): LaidPaper {
  const width = bodyWidth(LABEL);
  const qr = qrMark(model.jobUrl, 0, 0, QR_PT);
  const bars = code128Mark(model.jobNumber, 0, 0, width, BARS_PT);
  const line = (text: string, sizePt: number, maxLines = 1, weight: 'regular' | 'bold' = 'regular'): Block => ({ kind: 'text', runs: [{ text, weight }], sizePt, maxLines, leading: 1.22 });
  const left: Block[] = [
    { kind: 'text', runs: [{ text: model.jobNumber, weight: 'bold' }], sizePt: 27, smallestPt: 11, maxLines: 1, leading: 1.12 },
    gap(1),
    line(model.customerName, 10.5, 2, 'bold'),
    line(model.machineDescription, 8.6, 2),
    ...(model.serial.trim() === '' ? [] : [line(`${COUNTER.tagSerial} ${model.serial}`, 8.6)]),
    ...(model.part.trim() === '' ? [] : [line(model.part, 8.6, 1, 'bold')]),
  ];
  const promise = model.promisedOn ? dayWords(model.promisedOn) : COUNTER.tagNoPromise;
  return {
    frame: LABEL,
    blocks: [
      {
        kind: 'columns',
        gapPt: 8,
        columns: [
          { share: 1, blocks: left },
          { widthPt: QR_PT, blocks: qr ? [gap(2), { kind: 'marks', widthPt: QR_PT, heightPt: QR_PT, marks: [qr] }] : [] },
        ],
      },
    ],
    foot: '',
    runningHead: '',
    title: `${COMMON.job} ${model.jobNumber}`,
    subject: `${COMMON.job} ${model.jobNumber}`,
    furniture: false,
    atFoot: [
      ...(model.caution.trim() === '' ? [] : [{ kind: 'text', runs: [{ text: model.caution, weight: 'bold', ink: 'does-not-conform' }], sizePt: 8.6, maxLines: 1, leading: 1.22 } as Block]),
      {
        kind: 'columns',
        gapPt: 8,
        columns: [
          {
            share: 1,
            blocks: [{ kind: 'text', runs: [{ text: `${COUNTER.tagPromise}\u00a0 `, ink: 'muted', sizePt: 6.4 }, { text: promise, weight: 'bold' }], sizePt: 10.5, maxLines: 1, leading: 1.2 }],
          },
          { widthPt: 100, blocks: [spine(model)] },
        ],
      },
      gap(3),
      ...(bars ? [{ kind: 'marks', widthPt: width, heightPt: BARS_PT, marks: [bars] } as Block, gap(1)] : []),
      { kind: 'text', runs: [{ text: [model.shop.name, ROUTE_WORDS[model.route], dayOf(model.receivedAt, model.timeZone)].join(' · '), ink: 'muted' }], sizePt: 6, maxLines: 1 },
    ],
  };
}

/** The route at a glance, as it stands in every table row on screen. */
function spine(model: TagModel): Block {
  const steps = ROUTE_STEPS[model.route];
  const open = steps.indexOf(model.step);
  const drawing = spineDrawing({
    variant: 'mini',
    sheets: steps.map((step, index) => ({ id: step, label: STEP_WORDS[step], state: index < open ? 'done' : index === open ? 'open' : 'to-come', gate: 'none' })),
  });
  const heightPt = 13;
  return { kind: 'drawing', drawing, widthPt: (drawing.width * heightPt) / drawing.height, align: 'right' };
}
