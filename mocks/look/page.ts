import { html, Markup } from './html.js';

/** A slotted ring with a heavy loop of cable through its bore: the mark of the product these pages belong to. */
const MARK = ((): Markup => {
  const point = (radius: number, turn: number) => `${(radius * Math.sin(turn * 2 * Math.PI)).toFixed(2)} ${(-radius * Math.cos(turn * 2 * Math.PI)).toFixed(2)}`;
  const slots = Array.from({ length: 12 }, (_, at) => {
    const [from, to, next] = [(at - 0.17) / 12, (at + 0.17) / 12, (at + 0.83) / 12];
    return `${at === 0 ? 'M' : 'L'}${point(19, from)}L${point(27, from)}L${point(27, to)}L${point(19, to)}A19 19 0 0 1 ${point(19, next)}`;
  }).join('');
  const front = 'M5.6 -1C6 16 14 27 30 27C45 27 53 15 52 -1';
  return new Markup(
    `<svg viewBox="-42 -42 104 84" width="45" height="36" aria-hidden="true"><path d="M6 3C4 -14 14 -25 30 -25C47 -25 54 -12 52 3" fill="none" stroke="var(--copper)" stroke-width="9"/><path d="M0 -38A38 38 0 1 1 0 38A38 38 0 1 1 0 -38Z${slots}Z" fill="var(--text)" fill-rule="evenodd"/><path d="${front}" fill="none" stroke="var(--card)" stroke-width="14"/><path d="${front}" fill="none" stroke="var(--copper)" stroke-width="9"/></svg>`,
  );
})();

export interface PageParts {
  title: string;
  /** What this page is part of, beside the mark. */
  name: string;
  /** A plain statement across the top. */
  strip?: string;
  links?: readonly { href: string; text: string }[];
  wide?: boolean;
  body: Markup;
}

export function page(parts: PageParts): string {
  return html`<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>${parts.title}</title>
<link rel="stylesheet" href="/_look/style.css">
<link rel="icon" href="data:,">
</head>
<body>
<header>${MARK}<strong>${parts.name}</strong>${parts.links && html`<nav>${parts.links.map((link) => html`<a href="${link.href}">${link.text}</a>`)}</nav>`}</header>
${parts.strip && html`<aside class="strip" aria-label="About this page">${parts.strip}</aside>`}
<main class="${parts.wide ? 'wide' : ''}">
${parts.body}
</main>
</body>
</html>
`.text;
}

/** Nothing may run on these pages and nothing may be fetched from elsewhere. */
export const PAGE_HEADERS = {
  'content-security-policy': "default-src 'none'; style-src 'self'; font-src 'self'; img-src data:; frame-src 'self'; base-uri 'none'; frame-ancestors 'none'",
  'x-content-type-options': 'nosniff',
  'referrer-policy': 'same-origin',
  'cache-control': 'no-store',
} as const;
