import { invalid, missingRef } from './api-error.js';

export interface PageRequest {
  limit?: number | undefined;
  starting_after?: string | undefined;
  ending_before?: string | undefined;
}
export interface ListPage<T> {
  object: 'list';
  data: T[];
  has_more: boolean;
  url: string;
}
export type Created = number | { gt?: number | undefined; gte?: number | undefined; lt?: number | undefined; lte?: number | undefined } | undefined;

/** One page of a list that stands newest first. `ending_before` gives the page just above that item, in the same order. */
export function listPage<T extends { id: string }>(items: readonly T[], request: PageRequest, url: string, kind: string): ListPage<T> {
  const limit = request.limit ?? 10;
  if (request.starting_after && request.ending_before) throw invalid('You may only specify one of these parameters: starting_after, ending_before.', { code: 'parameters_exclusive' });
  const placeOf = (id: string, param: string) => {
    const place = items.findIndex((item) => item.id === id);
    if (place < 0) throw missingRef(kind, id, param);
    return place;
  };
  if (request.ending_before) {
    const end = placeOf(request.ending_before, 'ending_before');
    const start = Math.max(0, end - limit);
    return { object: 'list', data: items.slice(start, end), has_more: start > 0, url };
  }
  const start = request.starting_after ? placeOf(request.starting_after, 'starting_after') + 1 : 0;
  return { object: 'list', data: items.slice(start, start + limit), has_more: start + limit < items.length, url };
}

export function createdFits(created: number, wanted: Created): boolean {
  if (wanted === undefined) return true;
  if (typeof wanted === 'number') return created === wanted;
  const { gt, gte, lt, lte } = wanted;
  return (gt === undefined || created > gt) && (gte === undefined || created >= gte) && (lt === undefined || created < lt) && (lte === undefined || created <= lte);
}
