import type { Drawing, Shape, TextShape } from './drawing.js';

/** Letters of the product's sans serif are 0.53 of their size wide on average, bold ones 0.58: for the specs of this library only. */
export const textExtent = (t: TextShape): { left: number; right: number; top: number; bottom: number } => {
  const width = [...t.text].length * t.size * (t.weight >= 600 ? 0.58 : 0.53);
  const left = t.anchor === 'start' ? t.x : t.anchor === 'end' ? t.x - width : t.x - width / 2;
  return { left, right: left + width, top: t.y - t.size * 0.75, bottom: t.y + t.size * 0.2 };
};

export const textsOf = (drawing: Drawing): TextShape[] => drawing.shapes.filter((s): s is TextShape => s.kind === 'text');
export const wordsOf = (drawing: Drawing): string[] => textsOf(drawing).map((t) => t.text);

export const outOfFrame = (drawing: Drawing): string[] =>
  textsOf(drawing)
    .filter((t) => {
      const e = textExtent(t);
      return e.left < -0.5 || e.right > drawing.width + 0.5 || e.top < -0.5 || e.bottom > drawing.height + 0.5;
    })
    .map((t) => t.text);

/** Anything in a shape that is no finite number, or a path command that not every painter knows. */
export function faultsOf(shapes: readonly Shape[]): string[] {
  return shapes.flatMap((shape) => {
    const bad = Object.entries(shape).filter(([, value]) => typeof value === 'number' && !Number.isFinite(value));
    const path = shape.kind === 'path' && !/^(?:[MLACZ](?:-?\d+\.?\d*(?: (?=-?\d))?)*)+$/.test(shape.d) ? [shape.d] : [];
    return [...bad.map(([key]) => `${shape.kind}.${key}`), ...path];
  });
}

/** Distances from a centre of all end points of a path. */
export function radiiOf(d: string, centre: { x: number; y: number }): number[] {
  return [...d.matchAll(/([MLA])([^MLACZ]*)/g)].map(([, , body]) => {
    const [x, y] = body!.trim().split(' ').map(Number).slice(-2) as [number, number];
    return Math.hypot(x - centre.x, y - centre.y);
  });
}
