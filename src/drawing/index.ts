export { type Palette, printPalette, screenPalette } from './glyphs/Palette.ts';
export * from './layout/index.ts';
export { type BusFigure, type Figures, figuresOf, type PartFigure } from './readings/figures.ts';
export type { ReadingMode } from './readings/ReadingMode.ts';
export { StaticDrawing, type StaticDrawingProps } from './StaticDrawing.tsx';
export type { Primitive, SymbolShape } from './symbols/primitives.ts';
export { symbolPaths, symbolShape } from './symbols/symbolShape.ts';
