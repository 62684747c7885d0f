import { sizeOf } from '../../lib/format.js';
import { t } from './text.js';

/** The server takes these, told by their first bytes; what the browser says of them only saves a useless trip. */
export const ACCEPT = 'image/png,image/jpeg,image/webp,application/pdf';
const MIMES = new Set(ACCEPT.split(','));
const MOST_BYTES = 15 * 1024 * 1024;

/** Why a file is not even sent, in words; null when it is. A browser that knows no type lets the server look. */
export function refusalBeforeSending({ type, size }: { readonly type: string; readonly size: number }): string | null {
  if (type !== '' && !MIMES.has(type)) return t('kindRefused');
  return size > MOST_BYTES ? t('tooLarge', { size: sizeOf(size) }) : null;
}
