import { PDFDocument } from 'pdf-lib';
import { describe, expect, it } from 'vitest';
import { FONTS, freshFonts } from '../test/paper-fonts.js';
import { readTextBack } from '../test/read-text-back.js';
import { JOB, LINES, acknowledgement, invoice, manyLines, plainPapers, quote, sums, tag } from '../test/sample-papers.js';
import { drawPaper, drawPaperReported, setPaper } from './draw-paper.js';
import type { PaperModel } from './index.js';

const EVIL = '<script>alert(1)</script>\u0000\u202e' + 'Donaudampfschifffahrtsgesellschaft'.repeat(12) + ' 漢字 👩‍🏭 ' + '\ud800';
const written = async (model: PaperModel) => readTextBack(await drawPaper(model, FONTS)).join('\n');

/** Every text stands inside the margins, and no two on one line run into each other. */
function misplaced(model: PaperModel): string[] {
  const { paper, pages } = setPaper(model, FONTS);
  const { widthPt, heightPt, marginPt } = paper.frame;
  return pages.flatMap(({ marks }, page) => {
    const texts = marks.flatMap((mark) => (mark.kind === 'text' ? [mark] : []));
    const outside = texts.filter((text) => text.x < marginPt.left - 0.5 || text.x + text.widthPt > widthPt - marginPt.right + 0.5 || text.y - text.sizePt < 0 || text.y > heightPt);
    const colliding = texts.filter((text) => texts.some((other) => other !== text && Math.abs(other.y - text.y) < 1 && other.x >= text.x && other.x < text.x + text.widthPt - 0.6));
    return [...outside, ...colliding].map((text) => `page ${page + 1}: ${text.text.slice(0, 60)}`);
  });
}

describe('every paper', () => {
  const papers = [...plainPapers('A4'), ...plainPapers('Letter')];

  it.each(papers.map((paper) => [paper.kind, paper.paperSize, paper] as const))('%s on %s is printed to the same bytes when it is drawn again', async (_kind, _size, paper) => {
    const first = await drawPaper(paper, FONTS);
    // Between the two, another paper warms the fonts differently; fresh fonts stand for another day and machine.
    await drawPaper(invoice('A4', manyLines(3)), FONTS);
    const again = await drawPaper(JSON.parse(JSON.stringify(paper)) as PaperModel, FONTS);
    const elsewhere = await drawPaper(paper, freshFonts());
    expect(Buffer.compare(Buffer.from(first), Buffer.from(again))).toBe(0);
    expect(Buffer.compare(Buffer.from(first), Buffer.from(elsewhere))).toBe(0);
  });

  it.each(papers.map((paper) => [paper.kind, paper.paperSize, paper] as const))('%s on %s keeps every word inside its margins and clear of the next', (_kind, _size, paper) => {
    expect(misplaced(paper)).toEqual([]);
  });

  it('has the size of its sheet: A4 by ISO 216, Letter by ANSI, a label of 100 by 62 mm', async () => {
    const sizeOf = async (paper: PaperModel) => {
      const { width, height } = (await PDFDocument.load(await drawPaper(paper, FONTS))).getPage(0).getSize();
      return [width, height].map((points) => Math.round((points / 72) * 254) / 10);
    };
    expect(await sizeOf(quote('A4'))).toEqual([210, 297]);
    expect(await sizeOf(quote('Letter'))).toEqual([215.9, 279.4]);
    expect(await sizeOf(tag())).toEqual([100, 62]);
  });

  it('names itself, its shop and its moment of issue in the file', async () => {
    const file = await PDFDocument.load(await drawPaper(invoice(), FONTS), { updateMetadata: false });
    expect([file.getTitle(), file.getAuthor(), file.getCreationDate()?.toISOString()]).toEqual(['Invoice I-2026-0098', 'Ambach Rewinding Works', '2026-11-27T13:05:00.000Z']);
  });

  it('survives names that are too long, hostile or in no script it knows, and tells what it replaced', async () => {
    const customer = { ...JOB.customer, name: EVIL, addressLines: [EVIL, EVIL] };
    for (const paper of plainPapers('A4')) {
      const evil = (paper.kind === 'tag' ? { ...paper, customerName: EVIL, machineDescription: EVIL, serial: EVIL, part: EVIL, caution: EVIL, jobNumber: EVIL, jobUrl: EVIL } : { ...paper, customer }) as PaperModel;
      const drawn = await drawPaperReported(evil, FONTS);
      expect(drawn.replaced).toContain('漢');
      expect(misplaced(evil)).toEqual([]);
    }
  });

  it('prints the names of neighbours, Greek and Cyrillic, and every sign of the trade', async () => {
    const name = 'Łódź Ελλάδα Завод Çelik Ångström';
    const text = await written({ ...acknowledgement(), customer: { ...JOB.customer, name }, complaint: '≤ 5 MΩ ± 2 %, 40 °C, 3 µm, ≥ 10 €' });
    expect(text).toContain(name);
    expect(text).toContain('≤ 5 MΩ ± 2 %, 40 °C, 3 µm, ≥ 10 €');
  });

  it('says on the paper itself that a character could not be printed', async () => {
    const paper = { ...acknowledgement(), complaint: 'brummt 漢' };
    expect(await written(paper)).toContain('stands for a character this paper’s font does not have');
    expect(await written(acknowledgement())).not.toContain('stands for a character');
  });
});

describe('money on papers', () => {
  it('prints a currency without minor units and one with three exactly', async () => {
    const of = (currency: string, unitPriceMinor: number) => invoice('A4', sums([{ ...LINES[0]!, quantityThousandths: 1000, unitPriceMinor, netMinor: unitPriceMinor, taxMinor: 0, taxRateBasisPoints: 0 }], currency).lines, currency);
    const yen = await written(of('JPY', 500));
    expect(yen).toMatch(/^500$/m);
    expect(yen).not.toMatch(/500\.00|5\.00/);
    const dinar = await written(of('BHD', 5120));
    expect(dinar).toMatch(/^5\.120$/m);
  });

  it('prints tax by line and a sum for every rate', async () => {
    const text = await written(invoice());
    // 2837.30 at 19 % by line: 96.33 + 55.10 + 354.26 + 33.40 = 539.09; 18.50 at 7 % is 1.295, rounded half away from zero
    for (const words of ['96.33', '354.26', '539.09', '1.30', '0.00']) expect(text).toContain(words);
    expect(text).toMatch(/Tax 19.% on 2.837\.30/);
    expect(text).toMatch(/Tax 7.% on 18\.50/);
    expect(text).toMatch(/Tax 0.% on 240\.00/);
    expect(text).toMatch(/3.636\.19/);
  });

  it('carries a long invoice over pages with its head on each, and every position once', async () => {
    const pages = readTextBack(await drawPaper(invoice('Letter', manyLines(60)), FONTS));
    expect(pages.length).toBeGreaterThan(2);
    pages.forEach((page, index) => expect(page).toContain(`Page ${index + 1} of ${pages.length}`));
    for (const page of pages.slice(0, -1)) expect(page).toContain('Unit price');
    expect(pages.join('\n').match(/Position \d+:/g)).toHaveLength(60);
  });

  it('never breaks a large amount', async () => {
    const large = { ...LINES[0]!, unitPriceMinor: 99_999_999_999, netMinor: 99_999_999_999, taxMinor: 19_000_000_000 };
    expect(await written(invoice('Letter', [large]))).toMatch(/^999.999.999\.99$/m);
    expect(misplaced(invoice('Letter', [large]))).toEqual([]);
  });
});
