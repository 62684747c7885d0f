/** What was typed, as a LIKE pattern that means just that; the statement says ESCAPE '\\'. */
const escaped = (typed: string): string => typed.replace(/[\\%_]/g, (c) => `\\${c}`);

export const startsWith = (typed: string): string => `${escaped(typed)}%`;
export const contains = (typed: string): string => `%${escaped(typed)}%`;
