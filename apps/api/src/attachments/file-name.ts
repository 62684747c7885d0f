import { FILE_KINDS, type FileKind } from './file-kinds.js';

const LONGEST = 120;
/** Characters that break a header or a path, cannot be seen, or turn the reading direction. */
const UNSAFE = /[\u0000-\u001f\u007f-\u009f\u200b-\u200f\u2028-\u202e\u2060-\u2069\ufeff"*/:<>?\\|]/g;

/** Half a character, which no header can carry. */
const LONE_SURROGATE = /\p{Surrogate}/gu;

/** A name a person recognises: no folders, no tricks, and the ending of what the file really is. */
export function tidyFileName(given: string, kind: FileKind): string {
  const { extension, extensions } = FILE_KINDS[kind];
  const last = given.normalize('NFC').split(/[/\\]/).at(-1) ?? '';
  const clean = last.replace(UNSAFE, '').replace(/[\s.]+$/, '');
  const ending = extensions.find((e) => clean.toLowerCase().endsWith(`.${e}`));
  const stem = (ending ? clean.slice(0, -(ending.length + 1)) : clean).replace(/^[\s.]+|[\s.]+$/g, '');
  const short = [...(stem || 'file')].slice(0, LONGEST - 5).join('');
  return `${short}.${ending ?? extension}`;
}

/** Content-Disposition by RFC 6266, the name once in ASCII and once in full (RFC 8187, formerly 5987). */
export function disposition(how: 'inline' | 'attachment', name: string): string {
  const ascii = name.normalize('NFKD').replace(/[^\x20-\x7e]/g, '').replace(/["\\%]/g, '') || 'file';
  const full = encodeURIComponent(name.replace(LONE_SURROGATE, '\uFFFD')).replace(/['()*!]/g, (c) => `%${c.charCodeAt(0).toString(16).toUpperCase()}`);
  return `${how}; filename="${ascii}"; filename*=UTF-8''${full}`;
}
