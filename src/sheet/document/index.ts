export { buildDocument } from './buildDocument.ts';
export type { SheetCase, SheetInput, SheetScan } from './input.ts';
export type {
  Block,
  Cell,
  Column,
  DrawingWindow,
  Figure,
  FigureBlock,
  FigureRequest,
  PaperName,
  Row,
  Section,
  SheetDocument,
  TableBlock,
  TitleBlock,
} from './model.ts';
