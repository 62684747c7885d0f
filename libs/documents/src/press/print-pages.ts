import { PDFDocument, PDFHexString, PDFName } from 'pdf-lib';
import { type Ink, PAPER_INKS } from './inks.js';
import type { PageFrame, SetPage } from './make-pages.js';
import { PageCanvas } from './page-canvas.js';
import { paintDrawing } from './paint-drawing.js';
import type { Typeface } from './typeface.js';

export interface PaperFacts {
  readonly title: string;
  readonly author: string;
  readonly subject: string;
  /** the moment of issue: the only time the file knows */
  readonly issuedAt: Date;
}

/**
 * Pages to PDF. The same pages give the same bytes: the dates are those of the paper, names inside the
 * file come from a fixed series, and the font's subset grows in reading order.
 */
export async function printPages(pages: readonly SetPage[], frame: PageFrame, facts: PaperFacts, typeface: Typeface): Promise<Uint8Array> {
  const document = await PDFDocument.create({ updateMetadata: false });
  document.setTitle(facts.title, { showInWindowTitleBar: true });
  document.setAuthor(facts.author);
  document.setSubject(facts.subject);
  document.setProducer('Loopbay');
  document.setCreator('Loopbay');
  document.setCreationDate(facts.issuedAt);
  document.setModificationDate(facts.issuedAt);
  document.catalog.set(PDFName.of('Lang'), PDFHexString.fromText('en'));

  document.registerFontkit(typeface.parserFor('regular') as never);
  const regular = await document.embedFont(typeface.bytesOf('regular'), { subset: true, customName: 'LBPREG+DejaVuSans' });
  document.registerFontkit(typeface.parserFor('bold') as never);
  const bold = await document.embedFont(typeface.bytesOf('bold'), { subset: true, customName: 'LBPBLD+DejaVuSans-Bold' });

  for (const { marks } of pages) {
    const page = document.addPage([frame.widthPt, frame.heightPt]);
    const canvas = new PageCanvas(page, { regular, bold }, typeface);
    const colour = (ink: Ink) => PAPER_INKS[ink];
    for (const mark of marks) {
      switch (mark.kind) {
        case 'text':
          canvas.text(mark.text, mark.x, mark.y, mark.sizePt, mark.weight, colour(mark.ink));
          break;
        case 'line':
          canvas.line(mark.x, mark.y, mark.toX, mark.toY, mark.thicknessPt, colour(mark.ink));
          break;
        case 'rect':
          canvas.path(`M0 0H${mark.widthPt}V${mark.heightPt}H0Z`, mark.x, mark.y, 1, {
            ...(mark.fill ? { fill: colour(mark.fill) } : {}),
            ...(mark.stroke ? { stroke: colour(mark.stroke), strokeWidth: mark.thicknessPt ?? 0.7 } : {}),
          });
          break;
        case 'path':
          canvas.path(mark.d, mark.x, mark.y, mark.scale, {
            ...(mark.fill ? { fill: colour(mark.fill) } : {}),
            ...(mark.stroke ? { stroke: colour(mark.stroke), strokeWidth: mark.strokeWidth ?? 1 } : {}),
            ...(mark.evenOdd ? { evenOdd: true } : {}),
          });
          break;
        case 'drawing':
          paintDrawing(canvas, mark.drawing, mark);
          break;
      }
    }
    canvas.finish();
  }
  return document.save({ useObjectStreams: true, addDefaultPage: false, updateFieldAppearances: false });
}
