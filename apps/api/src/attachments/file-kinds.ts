import { fileTypeFromBuffer } from 'file-type';

/** What the shop takes: photos and scanned papers. */
export const FILE_KINDS = {
  'image/png': { extension: 'png', extensions: ['png'], picture: true },
  'image/jpeg': { extension: 'jpg', extensions: ['jpg', 'jpeg'], picture: true },
  'image/webp': { extension: 'webp', extensions: ['webp'], picture: true },
  'application/pdf': { extension: 'pdf', extensions: ['pdf'], picture: false },
} as const;
export type FileKind = keyof typeof FILE_KINDS;
/** Enough of the beginning for the magic bytes of any of them. */
export const SNIFFED_BYTES = 4100;

/** Told by its first bytes; the name and what the browser says count for nothing. */
export async function kindOf(beginning: Uint8Array): Promise<FileKind | null> {
  const found = (await fileTypeFromBuffer(beginning))?.mime;
  return found !== undefined && found in FILE_KINDS ? (found as FileKind) : null;
}

export const isPicture = (mime: string): boolean => mime in FILE_KINDS && FILE_KINDS[mime as FileKind].picture;
