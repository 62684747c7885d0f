export { burnoutCurveDrawing, type BurnoutChannel, type BurnoutCurveInput, type BurnoutCurvePoint } from './burnout-curve-drawing.js';
export type { CircleShape, Drawing, HatchShape, Ink, Paint, PathShape, RectShape, Shape, TextShape } from './drawing.js';
export { ovenChartDrawing, type OvenChartInput, type OvenChartPoint } from './oven-chart-drawing.js';
export { ringDrawing, type RingDrawingInput } from './ring-drawing.js';
export { separationDrawing, type SeparationDrawingInput } from './separation-drawing.js';
export { spineDrawing, spinePlaces, type SheetPlace, type SpineDrawingInput, type SpineSheet } from './spine-drawing.js';
export { stripDrawing, type StripBar, type StripDrawingInput } from './strip-drawing.js';
export { unrolledBoreDrawing, type UnrolledBoreInput } from './unrolled-bore-drawing.js';
