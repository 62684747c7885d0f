/** Inks are names of the identity's tokens; screen and paper each know their own colours for them. */
export type Ink = 'text' | 'muted' | 'line' | 'hair' | 'card' | 'ground' | 'copper' | 'steel' | 'conforms' | 'fails' | 'unsure' | 'invalid';
/** One ink, or two mixed: `share` 0 is all `from`, 1 is all `to`. */
export type Paint = Ink | { readonly from: Ink; readonly to: Ink; readonly share: number };

interface Marked {
  /** what the shape stands for, such as `slot-12`: screens answer to a tap on it */
  readonly mark?: string;
}
export interface PathShape extends Marked {
  readonly kind: 'path';
  /** absolute M, L, A, C and Z only, so that every painter can follow it */
  readonly d: string;
  readonly fill?: Paint;
  readonly stroke?: Paint;
  readonly strokeWidth?: number;
  readonly dash?: readonly number[];
  readonly cap?: 'butt' | 'round';
  readonly opacity?: number;
  readonly evenOdd?: boolean;
}
export interface CircleShape extends Marked {
  readonly kind: 'circle';
  readonly cx: number;
  readonly cy: number;
  readonly r: number;
  readonly fill?: Paint;
  readonly stroke?: Paint;
  readonly strokeWidth?: number;
}
export interface RectShape extends Marked {
  readonly kind: 'rect';
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
  readonly radius?: number;
  readonly fill?: Paint;
  readonly stroke?: Paint;
  readonly strokeWidth?: number;
}
export interface TextShape extends Marked {
  readonly kind: 'text';
  readonly x: number;
  readonly y: number;
  readonly text: string;
  readonly size: number;
  readonly weight: 400 | 600 | 700;
  readonly anchor: 'start' | 'middle' | 'end';
  readonly ink: Paint;
}
/** A rectangle of slanted lines: the zone beyond a limit. */
export interface HatchShape extends Marked {
  readonly kind: 'hatch';
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
  readonly ink: Ink;
}
export type Shape = PathShape | CircleShape | RectShape | TextShape | HatchShape;

/** A picture computed once and painted twice, on screen and on paper. */
export interface Drawing {
  readonly width: number;
  readonly height: number;
  readonly title: string;
  /** what the picture says, for whoever cannot see it */
  readonly description: string;
  readonly shapes: readonly Shape[];
  /** the figures behind it, row by row */
  readonly table?: { readonly columns: readonly string[]; readonly rows: readonly (readonly string[])[] };
}
