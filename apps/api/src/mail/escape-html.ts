const ENTITIES: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };

/** Text as it may stand inside an element or a quoted attribute: names and notes come from people. */
export const escapeHtml = (text: string): string => text.replace(/[&<>"']/g, (letter) => ENTITIES[letter]!);
