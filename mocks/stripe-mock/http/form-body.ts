/** A decoded form: the leaves are text, because a form knows nothing else. */
export type FormValue = string | FormValue[] | { [key: string]: FormValue };
export type FormObject = { [key: string]: FormValue };

const MAX_DEPTH = 8;
const MAX_PAIRS = 2_000;

export class BadForm extends Error {}

/**
 * Decode `line_items[0][price_data][currency]=usd&expand[]=customer` into nested values. Objects have no prototype, so a
 * key such as `__proto__` is a key like any other.
 */
export function decodeForm(text: string): FormObject {
  const pairs = [...new URLSearchParams(text)];
  if (pairs.length > MAX_PAIRS) throw new BadForm('Too many parameters.');
  const root: FormObject = Object.create(null);
  for (const [name, value] of pairs) put(root, keysOf(name), value);
  return Object.fromEntries(Object.entries(root).map(([key, value]) => [key, listsIn(value)]));
}

function keysOf(name: string): string[] {
  const head = name.split('[', 1)[0] ?? '';
  const tail = name.slice(head.length);
  const inner = [...tail.matchAll(/\[([^[\]]*)\]/g)].map((match) => match[1] ?? '');
  if (head === '' || inner.map((key) => `[${key}]`).join('') !== tail) throw new BadForm(`Invalid parameter name: ${name}`);
  if (inner.length > MAX_DEPTH) throw new BadForm(`Parameter nested too deeply: ${head}`);
  return [head, ...inner];
}

function put(target: FormObject, keys: string[], value: string): void {
  let here = target;
  keys.forEach((key, depth) => {
    const name = key === '' ? String(Object.keys(here).length) : key;
    if (depth === keys.length - 1) {
      if (typeof here[name] === 'object') throw new BadForm(`Parameter ${keys[0]} is both a value and an object.`);
      here[name] = value;
      return;
    }
    const next = here[name];
    if (next === undefined) here = here[name] = Object.create(null) as FormObject;
    else if (typeof next === 'object' && !Array.isArray(next)) here = next;
    else throw new BadForm(`Parameter ${keys[0]} is both a value and an object.`);
  });
}

/** An object whose keys are 0, 1, 2 ... is a list. */
function listsIn(value: FormValue): FormValue {
  if (typeof value === 'string') return value;
  if (Array.isArray(value)) return value.map(listsIn);
  const entries = Object.entries(value);
  if (entries.length > 0 && entries.every(([key]) => /^\d+$/.test(key))) {
    return entries.sort(([a], [b]) => Number(a) - Number(b)).map(([, item]) => listsIn(item));
  }
  const object: FormObject = Object.create(null);
  for (const [key, item] of entries) object[key] = listsIn(item);
  return object;
}
