import { invalid } from './api-error.js';

/** Metadata after a change: an empty value takes a key away, an empty whole takes everything away. */
export function mergedMetadata(before: Record<string, string> | null, change: '' | Record<string, string> | undefined): Record<string, string> {
  if (change === undefined) return before ?? {};
  if (change === '') return {};
  const merged = Object.fromEntries(Object.entries({ ...before, ...change }).filter(([, value]) => value !== ''));
  if (Object.keys(merged).length > 50) throw invalid('You can have up to 50 metadata keys.', { param: 'metadata' });
  return merged;
}
