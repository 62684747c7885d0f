/** Text that is already HTML. */
export class Markup {
  constructor(readonly text: string) {}
  toString(): string {
    return this.text;
  }
}

type Piece = Markup | string | number | null | undefined | false | readonly Piece[];

/** HTML with every inserted value escaped, unless it is markup itself. Lists are joined, nothing stands for nothing. */
export function html(parts: TemplateStringsArray, ...values: Piece[]): Markup {
  return new Markup(parts.map((part, at) => part + (at < values.length ? written(values[at]) : '')).join(''));
}

function written(value: Piece): string {
  if (value === null || value === undefined || value === false) return '';
  if (value instanceof Markup) return value.text;
  if (typeof value === 'object') return value.map(written).join('');
  return String(value).replace(/[&<>"']/g, (sign) => `&#${sign.charCodeAt(0)};`);
}
