import { FLOOR_SORTS, floorQuerySchema, type FloorQuery } from '@shared/jobs';

/** The floor's list as its address says it. What the address cannot mean is left out, so that an old link still opens. */
export type FloorFilter = Partial<Pick<FloorQuery, 'step' | 'state' | 'late' | 'q' | 'sort' | 'order' | 'page'>>;

const KEYS = ['step', 'state', 'late', 'q', 'sort', 'order', 'page'] as const;

export function filterOf(params: URLSearchParams): FloorFilter {
  const filter: Record<string, unknown> = {};
  for (const key of KEYS) {
    const value = params.get(key);
    if (value === null || value.trim() === '') continue;
    const parsed = floorQuerySchema.shape[key].safeParse(value);
    if (parsed.success) filter[key] = parsed.data;
  }
  return filter as FloorFilter;
}

/** As the server and the CSV export take it, in one order, so that the same list has one address. */
export function paramsOf(filter: FloorFilter, more: Record<string, string> = {}): string {
  const params = new URLSearchParams();
  for (const key of KEYS) if (filter[key] !== undefined) params.set(key, String(filter[key]));
  for (const [key, value] of Object.entries(more)) params.set(key, value);
  return params.toString();
}

export const csvAddress = ({ page: _page, ...filter }: FloorFilter): string => {
  const params = paramsOf(filter);
  return `/api/jobs.csv${params === '' ? '' : `?${params}`}`;
};

export const isFiltered = ({ step, state, late, q }: FloorFilter): boolean => Boolean(step ?? state ?? late ?? q);

export { FLOOR_SORTS };
