type Params<T extends string> = T extends `${string}{${infer Name}}${infer Rest}` ? Name | Params<Rest> : never;
type Values<T extends string> = Record<Params<T>, string | number>;

/**
 * A catalogue of words. `t('late', { days: 3 })` fills `{days}`; a key or a value that is missing fails the compile.
 * Every feature brings its own `text.ts`; nothing is written out in a component.
 */
export function defineText<const C extends Record<string, string>>(catalogue: C) {
  return function t<K extends keyof C & string>(key: K, ...values: [Params<C[K]>] extends [never] ? [] : [Values<C[K]>]): string {
    const given = (values[0] ?? {}) as Record<string, string | number>;
    return catalogue[key]!.replace(/\{(\w+)\}/g, (_, name: string) => String(given[name]));
  };
}
