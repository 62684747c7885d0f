export type { CircleShape, Drawing, HatchShape, Ink, Paint, PathShape, RectShape, Shape, TextShape } from './drawing.js';
export { ringDrawing, type RingDrawingInput } from './ring-drawing.js';
export { spineDrawing, spinePlaces, type SheetPlace, type SpineDrawingInput, type SpineSheet } from './spine-drawing.js';
export { stripDrawing, type StripBar, type StripDrawingInput } from './strip-drawing.js';
