import { escapeHtml } from './escape-html.js';

export interface MailContent {
  readonly shopName: string;
  readonly heading: string;
  /** plain text; a line break inside stays a line break */
  readonly paragraphs: readonly string[];
  readonly link?: { readonly label: string; readonly url: string };
}

/** One look for all of the shop's mail: plain, readable without pictures, the same words as text and as HTML. */
export function mailLayout({ shopName, heading, paragraphs, link }: MailContent): { text: string; html: string } {
  const safeLink = link && webAddress(link.url) ? link : undefined;
  return { text: asText(shopName, heading, paragraphs, safeLink), html: asHtml(shopName, heading, paragraphs, safeLink) };
}

function asText(shopName: string, heading: string, paragraphs: readonly string[], link: MailContent['link']): string {
  return [heading, ...paragraphs, ...(link ? [`${link.label}:\n${link.url}`] : []), `-- \n${shopName}`].join('\n\n') + '\n';
}

function asHtml(shopName: string, heading: string, paragraphs: readonly string[], link: MailContent['link']): string {
  const body = paragraphs.map((p) => `<p style="margin:0 0 14px">${escapeHtml(p).replace(/\n/g, '<br>')}</p>`);
  const button = link ? [`<p style="margin:22px 0"><a href="${escapeHtml(link.url)}" style="color:#0b4f6c;font-weight:bold">${escapeHtml(link.label)}</a></p>`] : [];
  return [
    '<!doctype html><html lang="en"><head><meta charset="utf-8"></head>',
    '<body style="margin:0;padding:24px;font:16px/1.5 Arial,Helvetica,sans-serif;color:#1c2127;background:#ffffff">',
    `<h1 style="margin:0 0 18px;font-size:20px">${escapeHtml(heading)}</h1>`,
    ...body,
    ...button,
    `<p style="margin:26px 0 0;padding-top:12px;border-top:1px solid #c5cbd3;color:#404854;font-size:14px">${escapeHtml(shopName)}</p>`,
    '</body></html>',
  ].join('\n');
}

/** Only an address of the web becomes a link. */
function webAddress(url: string): boolean {
  try {
    return ['http:', 'https:'].includes(new URL(url).protocol);
  } catch {
    return false;
  }
}
