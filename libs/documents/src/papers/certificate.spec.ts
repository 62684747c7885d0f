import { describe, expect, it } from 'vitest';
import { FONTS, freshFonts } from '../../test/paper-fonts.js';
import { readTextBack } from '../../test/read-text-back.js';
import { certificate12, certificate3, certificate7 } from '../../test/sample-certificates.js';
import { drawPaper, setPaper } from '../draw-paper.js';
import type { CertificateModel } from './certificate-model.js';

/** Words in reading order, hard spaces as plain ones. */
const written = async (model: CertificateModel) => readTextBack(await drawPaper(model, FONTS)).join('\n').replaceAll('\u00a0', ' ');
const papers = [certificate12('A4'), certificate12('Letter'), certificate3('A4'), certificate3('Letter'), certificate7('A4'), certificate7('Letter')];

describe('the certificate', () => {
  it('states the increase with its interval, and that it cannot tell', async () => {
    // The figures of machine 12 as the sample shop's table computes them: +18.6 %, between 16.2 and 21.0.
    const text = await written(certificate12());
    expect(text).toContain('+18.6 %');
    expect(text).toContain('between +16.2 % and +21.0 %');
    expect(text).toContain('inconclusive');
    expect(text).toMatch(/8\.096\n V/);
    expect(text).toMatch(/3\.70\n ± 0\.26\n W\/kg/);
    expect(text).toContain('Released although inconclusive');
    expect(text).toContain('Go on, and note it on the certificate.');
  });

  it('says that the increase is not established where there was no core test before', async () => {
    const text = await written(certificate7());
    expect(text).toContain('increase not established');
    expect(text).toContain('The machine came in stripped.');
    expect(text).toContain('Signed: Hanne Ruoff, manager');
    expect(text).not.toMatch(/[+−]\d+\.\d %\nbetween/);
  });

  it('keeps a hot spot apart from the increase, and shows the tests between', async () => {
    const text = await written(certificate3('A4'));
    // machine 3: −5.7 % after the repair; hot spot 24.3, 22.8 and 4.4 K over the mean
    expect(text).toContain('after strip');
    expect(text).toContain('does not conform');
    expect(text).toContain('−5.7 %');
    expect(text).toMatch(/22\.8/);
  });

  it('prints inch-pound where the person reads it: 3.160 W/kg is 1.43 W/lb, 1.32 T is 85.2 kilolines', async () => {
    // 0.45359237 kg to the pound and 64 516 lines to the square inch and tesla: NIST SP 811, appendix B
    const text = await written(certificate3('Letter'));
    expect(text).toMatch(/1\.43\n ± 0\.10\n W\/lb/);
    expect(text).toMatch(/85\.2\n kl\/in²/);
    expect(text).not.toContain('W/kg\n');
  });

  it('says on its face that another issue stands in its place, and which it replaced itself', async () => {
    expect(await written(certificate3())).toContain('Superseded by certificate C-2026-0091 of 28 November 2026. This issue is no longer in force.');
    expect(await written(certificate12())).toContain('Replaces certificate C-2026-0085 of 26 November 2026. Reason: the serial number was misread');
  });

  it('carries its number, its code and its page on every page', async () => {
    const pages = readTextBack(await drawPaper(certificate12(), FONTS));
    expect(pages.length).toBeGreaterThan(1);
    pages.forEach((page, index) => {
      expect(page).toContain('Certificate C-2026-0088 · Code K7QX-3MNP-V2RT-8HWD');
      expect(page).toContain(`Page ${index + 1} of ${pages.length}`);
    });
  });

  it('names who signed, when, and the first twelve digits of what was signed', async () => {
    const text = await written(certificate12());
    expect(text).toContain('technician, 26 November 2026, 16:40');
    expect(text).toContain('signed content a3f09c1e77b2');
  });

  it('shows an instrument without calibration as such', async () => {
    expect(await written(certificate12())).toContain('no calibration recorded');
  });

  it('gives every verdict its own shape beside its word', () => {
    const shapes = (model: CertificateModel, ink: string) =>
      setPaper(model, FONTS).pages.flatMap((page) => page.marks.flatMap((mark) => (mark.kind === 'path' && (mark.fill === ink || mark.stroke === ink) ? [mark.d] : [])));
    const seen = [shapes(certificate12(), 'conforms'), shapes(certificate3(), 'does-not-conform'), shapes(certificate12(), 'inconclusive')].map((paths) => paths[0]);
    expect(seen.every((path) => path !== undefined)).toBe(true);
    expect(new Set(seen).size).toBe(3);
  });

  it.each(papers.map((model) => [model.number, model.paperSize, model] as const))('%s on %s stays inside its margins and prints to the same bytes again', async (_number, _size, model) => {
    const { paper, pages } = setPaper(model, FONTS);
    for (const { marks } of pages) {
      for (const mark of marks) {
        if (mark.kind !== 'text') continue;
        expect(mark.x, mark.text).toBeGreaterThanOrEqual(paper.frame.marginPt.left - 0.5);
        expect(mark.x + mark.widthPt, mark.text).toBeLessThanOrEqual(paper.frame.widthPt - paper.frame.marginPt.right + 0.5);
        expect(mark.y, mark.text).toBeLessThan(paper.frame.heightPt);
      }
    }
    const again = JSON.parse(JSON.stringify(model)) as CertificateModel;
    expect(Buffer.compare(Buffer.from(await drawPaper(model, FONTS)), Buffer.from(await drawPaper(again, freshFonts())))).toBe(0);
  });
});
