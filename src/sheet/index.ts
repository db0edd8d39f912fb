export * from './document/index.ts';
export type { ExportOptions, ExportProgress } from './ExportOptions.ts';
export { exportStudySheet, sheetFileName } from './exportStudySheet.ts';
export { layoutPages } from './pages/layoutPages.ts';
export type { PageMark, SheetPage } from './pages/marks.ts';
export { mountFigure } from './pdf/mountFigure.ts';
export { SheetPlace, type SheetPlaceProps } from './SheetPlace.tsx';
