export { type DrawnPaper, drawPaper, drawPaperReported, layoutPaper, type PaperModel } from './draw-paper.js';
export type { PaperFonts } from './press/typeface.js';
export type { PaperBase, JobPaperBase, ShopOnPaper, PartyOnPaper, MachineOnPaper, JobOnPaper, PaperSize, PaperUnits } from './papers/paper-model.js';
export type * from './papers/certificate-model.js';
export type * from './papers/money-papers-model.js';
export type * from './papers/counter-papers-model.js';
