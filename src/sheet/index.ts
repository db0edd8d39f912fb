export * from './document/index.ts';
export { layoutPages } from './pages/layoutPages.ts';
export type { PageMark, SheetPage, SheetPages } from './pages/marks.ts';
