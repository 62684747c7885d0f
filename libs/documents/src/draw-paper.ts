import type { PaperFonts } from './press/typeface.js';
import { Typeface } from './press/typeface.js';
import { type SetPage } from './press/make-pages.js';
import { printPages } from './press/print-pages.js';
import { layoutCertificate } from './papers/certificate-layout.js';
import type { CertificateModel } from './papers/certificate-model.js';
import { layoutAcknowledgement, layoutDeliveryNote } from './papers/counter-layout.js';
import type { AcknowledgementModel, DeliveryNoteModel, TagModel } from './papers/counter-papers-model.js';
import { type LaidPaper, composePages } from './papers/frame-of-paper.js';
import { layoutInvoice, layoutQuote, layoutReceipt } from './papers/money-layout.js';
import type { InvoiceModel, QuoteModel, ReceiptModel } from './papers/money-papers-model.js';
import { layoutTag } from './papers/tag-layout.js';
import { COMMON } from './papers/words.js';

/** Every paper the shop prints, told apart by `kind`. Plain data: it is stored as JSON when the paper is issued. */
export type PaperModel = CertificateModel | QuoteModel | InvoiceModel | ReceiptModel | AcknowledgementModel | TagModel | DeliveryNoteModel;

export interface DrawnPaper {
  readonly bytes: Uint8Array;
  readonly pages: number;
  /** characters the font does not have; each was printed as “\ufffd” */
  readonly replaced: readonly string[];
}

export function layoutPaper(model: PaperModel): LaidPaper {
  switch (model.kind) {
    case 'certificate':
      return layoutCertificate(model);
    case 'quote':
      return layoutQuote(model);
    case 'invoice':
      return layoutInvoice(model);
    case 'receipt':
      return layoutReceipt(model);
    case 'acknowledgement':
      return layoutAcknowledgement(model);
    case 'tag':
      return layoutTag(model);
    case 'delivery-note':
      return layoutDeliveryNote(model);
  }
}

/** Pages with everything in its place, before any ink: what is checked when a layout is tested. */
export function setPaper(model: PaperModel, fonts: PaperFonts): { readonly paper: LaidPaper; readonly pages: readonly SetPage[]; readonly typeface: Typeface } {
  const typeface = new Typeface(fonts);
  const paper = layoutPaper(model);
  const pages = composePages(paper, typeface);
  if (typeface.replaced.length === 0 || !paper.furniture) return { paper, pages, typeface };
  const told = { ...paper, foot: `${COMMON.replacedCharacters} ${paper.foot}` };
  return { paper: told, pages: composePages(told, typeface), typeface };
}

/**
 * Prints a paper and tells which characters the font did not have.
 *
 * The same model and the same fonts give the same bytes, whenever and wherever it is drawn.
 */
export async function drawPaperReported(model: PaperModel, fonts: PaperFonts): Promise<DrawnPaper> {
  const { paper, pages, typeface } = setPaper(model, fonts);
  const facts = { title: paper.title, author: model.shop.name, subject: paper.subject, issuedAt: new Date(model.issuedAt) };
  return { bytes: await printPages(pages, paper.frame, facts, typeface), pages: pages.length, replaced: typeface.replaced };
}

/** Prints a paper: PDF bytes. */
export async function drawPaper(model: PaperModel, fonts: PaperFonts): Promise<Uint8Array> {
  return (await drawPaperReported(model, fonts)).bytes;
}
