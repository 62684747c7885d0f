/** Only a path of our own is followed after signing in; anything that could lead elsewhere is dropped. */
export function safeNext(next: string | null): string | null {
  if (!next || !next.startsWith('/') || next.startsWith('//') || /[\\\s]/.test(next)) return null;
  return next;
}
