import { escapeHtml } from '../mail/escape-html.js';

/** Whether somebody opened this address itself, as with a paper in a tab of its own, and not a page that asks for data. */
export const isOpenedByAPerson = (request: { method: string; headers: Record<string, unknown> }): boolean => request.method === 'GET' && request.headers['sec-fetch-dest'] === 'document';

/** What a person reads who opened a paper or photo that is not theirs, not there, or asks to sign in first. */
export const plainPage = (message: string, requestId: string): string => `<!doctype html>
<html lang="en">
<head><meta charset="utf-8"><meta name="viewport" content="width=device-width, initial-scale=1"><meta name="color-scheme" content="light dark"><title>Loopbay</title></head>
<body>
<main>
<h1>${escapeHtml(message)}</h1>
<p><a href="/">To the start</a></p>
<p>Request number ${escapeHtml(requestId)}</p>
</main>
</body>
</html>
`;
