/** Messages made from the API's own document: right in shape, then broken one place at a time. */
export interface JsonSchema {
  readonly type?: string;
  readonly properties?: Record<string, JsonSchema>;
  readonly required?: readonly string[];
  readonly items?: JsonSchema;
  readonly prefixItems?: readonly JsonSchema[];
  readonly minItems?: number;
  readonly enum?: readonly unknown[];
  readonly const?: unknown;
  readonly oneOf?: readonly JsonSchema[];
  readonly anyOf?: readonly JsonSchema[];
  readonly pattern?: string;
  readonly format?: string;
  readonly minimum?: number;
  readonly exclusiveMinimum?: number;
  readonly maximum?: number;
}
export type Random = () => number;

/** The same numbers for the same seed (mulberry32, public domain). */
export function seeded(seed: number): Random {
  let a = seed;
  return () => {
    a = (a + 0x6d2b79f5) | 0;
    let t = Math.imul(a ^ (a >>> 15), 1 | a);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}
export const pick = <T>(random: Random, from: readonly T[]): T => from[Math.floor(random() * from.length)]!;

/** A message that fits its schema; `known` are identifiers that exist, `words` what stands where text may stand. */
export function fitting(schema: JsonSchema, random: Random, known: readonly string[], words: readonly string[], name = ''): unknown {
  if ('const' in schema) return schema.const;
  if (schema.enum) return pick(random, schema.enum);
  const choices = schema.oneOf ?? schema.anyOf;
  if (choices) return fitting(pick(random, choices), random, known, words, name);
  switch (schema.type) {
    case 'object': {
      const required = schema.required ?? [];
      const entries = Object.entries(schema.properties ?? {}).filter(([key]) => required.includes(key) || random() < 0.6);
      return Object.fromEntries(entries.map(([key, s]) => [key, fitting(s, random, known, words, key)]));
    }
    case 'array':
      if (schema.prefixItems) return schema.prefixItems.map((s) => fitting(s, random, known, words, name));
      return Array.from({ length: Math.max(schema.minItems ?? 0, 1) }, () => fitting(schema.items ?? {}, random, known, words, name));
    case 'integer':
      return name.toLowerCase().includes('version') ? pick(random, [1, 2, 3]) : Math.max(schema.minimum ?? 0, Math.min(schema.maximum ?? 100, pick(random, [1, 2, 7, 48, 1000])));
    case 'number':
      return Math.max(schema.minimum ?? -1e9, pick(random, [0.5, 1, 3, 21, 400]));
    case 'boolean':
      return random() < 0.5;
    case 'null':
      return null;
    case 'string':
      return text(schema, random, known, words, name);
    default:
      return {};
  }
}

function text({ format, pattern }: JsonSchema, random: Random, known: readonly string[], words: readonly string[], name: string): string {
  if (name === 'password') return 'correct horse battery';
  if (format === 'email') return `someone${Math.floor(random() * 1e6)}@customers.test`;
  if (format === 'date') return pick(random, ['2026-03-20', '2026-02-28', '9999-12-31', '0001-01-01']);
  if (format === 'date-time') return pick(random, ['2026-03-02T09:00:00.000Z', '2026-03-02T23:59:59.999+14:00', '0001-01-01T00:00:00Z']);
  if (pattern?.includes('[0-9a-z-]{8,40}')) return pick(random, known);
  if (pattern === '^[A-Z]{2}$') return 'DE';
  return pick(random, words);
}

export type Path = readonly (string | number)[];
export function placesOf(value: unknown, path: Path = []): Path[] {
  if (typeof value !== 'object' || value === null) return [path];
  return [path, ...Object.entries(value).flatMap(([key, inner]) => placesOf(inner, [...path, Array.isArray(value) ? Number(key) : key]))];
}

/** A copy with another value at one place. */
export function withAt(value: unknown, path: Path, put: unknown): unknown {
  const [first, ...rest] = path;
  if (first === undefined) return put;
  if (Array.isArray(value)) return value.map((inner, at) => (at === first ? withAt(inner, rest, put) : inner));
  const from = value as Record<string, unknown>;
  return { ...from, [first]: withAt(from[first as string], rest, put) };
}
