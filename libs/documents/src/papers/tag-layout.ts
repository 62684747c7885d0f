import { ROUTE_STEPS } from '@shared/route';
import { type Block, gap } from '../press/blocks.js';
import { code128Mark, qrMark } from '../press/codes.js';
import { bodyWidth } from '../press/make-pages.js';
import type { Mark } from '../press/marks.js';
import type { TagModel } from './counter-papers-model.js';
import { dayOf, dayWords } from './dates.js';
import { LABEL, type LaidPaper } from './frame-of-paper.js';
import { COMMON, COUNTER, ROUTE_WORDS } from './words.js';

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

/** Sheets standing side by side: done dark, the open one copper and taller, those to come outlined. */
function spine(model: TagModel): Block {
  const steps = ROUTE_STEPS[model.route];
  const open = steps.indexOf(model.step);
  const pitch = Math.min(7, 100 / steps.length);
  const marks: Mark[] = steps.map((_, index): Mark => {
    const isOpen = index === open;
    const ink = index < open ? 'text' : isOpen ? 'copper' : undefined;
    return {
      kind: 'rect',
      x: index * pitch,
      y: isOpen ? 0 : 2,
      widthPt: pitch - 2,
      heightPt: isOpen ? 13 : 9,
      ...(ink ? { fill: ink } : { stroke: 'line', thicknessPt: 0.6 }),
    };
  });
  return { kind: 'marks', widthPt: steps.length * pitch - 2, heightPt: 13, marks, align: 'right' };
}
