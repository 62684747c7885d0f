import { invalid } from './api-error.js';

export type Json = string | number | boolean | null | undefined | Json[] | { [key: string]: Json };
export type Lookup = (id: string) => unknown;
/** Parts that are left out unless asked for, such as the line items of a session. */
export type Hidden = (object: { [key: string]: Json }, name: string) => unknown;

const DEEPEST = 4;

/** Put whole objects in the place of their ids, along paths such as `payment_intent.latest_charge` or `data.customer`. */
export function expandInto(value: unknown, paths: readonly string[], find: Lookup, hidden: Hidden): unknown {
  if (paths.length === 0) return value;
  const copy = asJson(value);
  paths.forEach((path, at) => {
    const steps = path.split('.');
    if (steps.length > DEEPEST + (steps[0] === 'data' ? 1 : 0)) throw invalid(`You cannot expand more than ${DEEPEST} levels of a property. Property: ${path}`, { param: `expand[${at}]` });
    walk(copy, steps, path, find, hidden);
  });
  return copy;
}

function walk(here: Json, steps: readonly string[], path: string, find: Lookup, hidden: Hidden): void {
  const [name, ...rest] = steps;
  if (name === undefined || here === null || here === undefined) return;
  if (Array.isArray(here)) {
    for (const item of here) walk(item, steps, path, find, hidden);
    return;
  }
  if (typeof here !== 'object') throw notExpandable(path);
  const there = here[name];
  if (typeof there === 'string') {
    const found = find(there);
    if (found === undefined) throw notExpandable(path);
    here[name] = asJson(found);
  } else if (there === undefined) {
    const extra = hidden(here, name);
    if (extra === undefined) throw notExpandable(path);
    here[name] = asJson(extra);
  } else if (typeof there !== 'object') {
    throw notExpandable(path);
  }
  walk(here[name], rest, path, find, hidden);
}

const notExpandable = (path: string) => invalid(`This property cannot be expanded (${path}).`, { param: 'expand' });

function asJson(value: unknown): Json {
  const copy: Json = JSON.parse(JSON.stringify(value));
  return copy;
}
