import { AppError } from './app-error.js';

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * A request that changes something must carry our own Origin, port included: cookies ignore ports.
 * Our own is the address the browser was pointed at (Host) or the public one behind a proxy.
 */
export function assertSameOrigin(request: { method: string; path: string; origin: string | undefined; host: string | undefined }, publicUrl: string, webhookPath: string): void {
  if (SAFE.has(request.method) || request.path === webhookPath) return;
  const own = new Set([new URL(publicUrl).host, ...(request.host ? [request.host] : [])]);
  if (request.origin && hostOf(request.origin) !== null && own.has(hostOf(request.origin)!)) return;
  throw new AppError('CROSS_SITE_REQUEST', 'This request did not come from this shop’s own pages.');
}

function hostOf(origin: string): string | null {
  try {
    return new URL(origin).host;
  } catch {
    return null;
  }
}
