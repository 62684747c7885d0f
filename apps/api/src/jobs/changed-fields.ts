/** What a change changed, from what to what: only the fields that differ. */
export function changedFields<T extends object>(before: T, after: Partial<T>): { from: Partial<T>; to: Partial<T> } | null {
  const keys = (Object.keys(after) as (keyof T)[]).filter((key) => JSON.stringify(before[key]) !== JSON.stringify(after[key]));
  if (keys.length === 0) return null;
  const pick = (of: Partial<T>): Partial<T> => Object.fromEntries(keys.map((key) => [key, of[key]])) as Partial<T>;
  return { from: pick(before), to: pick(after) };
}
