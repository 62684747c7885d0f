import { describe, expect, it } from 'vitest';
import { disposition, tidyFileName } from './file-name.js';

describe('the name of a file', () => {
  it.each([
    ['plate.png', 'image/png', 'plate.png'],
    ['Photo.JPEG', 'image/jpeg', 'Photo.jpeg'],
    ['scan', 'application/pdf', 'scan.pdf'],
    ['picture.png', 'image/jpeg', 'picture.png.jpg'],
    ['C:\\Users\\mara\\plate.png', 'image/png', 'plate.png'],
    ['../../etc/passwd', 'application/pdf', 'passwd.pdf'],
    ['.png', 'image/png', 'file.png'],
    ['', 'image/webp', 'file.webp'],
    ['a\r\nset-cookie: x=1.png', 'image/png', 'aset-cookie x=1.png'],
    ['invoice\u202egnp.pdf', 'application/pdf', 'invoicegnp.pdf'],
  ] as const)('%j of a file that is %s becomes %j', (given, kind, tidy) => {
    expect(tidyFileName(given, kind)).toBe(tidy);
  });

  it('is at most 120 characters, and no character is cut in half', () => {
    const name = tidyFileName(`${'🔧'.repeat(200)}.png`, 'image/png');
    expect([...name].length).toBeLessThanOrEqual(120);
    expect(name).not.toMatch(/\p{Surrogate}/u);
    expect(name.endsWith('.png')).toBe(true);
  });
});

describe('the name in the header of an answer', () => {
  it('stands once in plain letters and once in full', () => {
    // the euro sign and its encoding are the example of RFC 8187 section 3.2.3
    expect(disposition('attachment', '€ rates.pdf')).toBe(`attachment; filename=" rates.pdf"; filename*=UTF-8''%E2%82%AC%20rates.pdf`);
  });

  it('cannot end the header or the quotes, whatever it holds', () => {
    for (const name of ['a"; filename="evil.exe', "it's (1)*.png", 'a\\b', '\ud800', 'x%22y']) {
      const header = disposition('inline', name);
      expect(header).toMatch(/^inline; filename="[^"\\\r\n]*"; filename\*=UTF-8''[A-Za-z0-9%._~-]*$/);
    }
  });
});
