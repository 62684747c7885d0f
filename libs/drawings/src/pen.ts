/** Numbers in a path are written with two decimals; a value that is no number is a mistake of the caller and shows at once. */
export function digits(value: number): string {
  if (!Number.isFinite(value)) throw new RangeError('A drawing was asked for with a figure that is no number.');
  const text = value.toFixed(2);
  return text === '-0.00' ? '0.00' : text;
}

export interface Point {
  readonly x: number;
  readonly y: number;
}

/** A point at radius r, the angle counted clockwise from the top. */
export const polar = (centre: Point, r: number, angle: number): Point => ({ x: centre.x + r * Math.sin(angle), y: centre.y - r * Math.cos(angle) });

export const moveTo = (p: Point) => `M${digits(p.x)} ${digits(p.y)}`;
export const lineTo = (p: Point) => `L${digits(p.x)} ${digits(p.y)}`;
export const arcTo = (r: number, p: Point, clockwise: boolean, large = false) => `A${digits(r)} ${digits(r)} 0 ${large ? 1 : 0} ${clockwise ? 1 : 0} ${digits(p.x)} ${digits(p.y)}`;

export function circlePath(centre: Point, r: number): string {
  const top = polar(centre, r, 0);
  const bottom = polar(centre, r, Math.PI);
  return `${moveTo(top)}${arcTo(r, bottom, true)}${arcTo(r, top, true)}Z`;
}

/** The wedge of a ring between two radii and two angles. */
export function sectorPath(centre: Point, inner: number, outer: number, from: number, to: number): string {
  return [
    moveTo(polar(centre, inner, from)),
    lineTo(polar(centre, outer, from)),
    arcTo(outer, polar(centre, outer, to), true),
    lineTo(polar(centre, inner, to)),
    arcTo(inner, polar(centre, inner, from), false),
    'Z',
  ].join('');
}
