/** A code as it is typed or scanned: the whole address is taken too, and blanks and case do not matter. */
export function readCode(text: string): string | null {
  const last = text.trim().replace(/[?#].*$/, '').replace(/\/+$/, '').split('/').at(-1) ?? '';
  const code = last.replace(/[\s\u2010-\u2015]+/g, '-').toUpperCase();
  if (!/^[0-9A-Z-]{8,40}$/.test(code)) return null;
  const bare = code.replaceAll('-', '');
  // typed without its lines, it gets them back
  return /^[0-9A-Z]{16}$/.test(bare) ? bare.replace(/(.{4})(?=.)/g, '$1-') : code;
}
