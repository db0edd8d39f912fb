export { keepPlaces } from './keepPlaces.ts';
export { layoutStudy } from './layoutStudy.ts';
export * as measures from './measures.ts';
export { nameplate, nominalVoltage } from './nameplate.ts';
export { type OutlineNode, outlineWords, siteOutline } from './siteOutline.ts';
export { textWidth } from './textWidth.ts';
export { tradeNumber, tradeVolts } from './tradeNumber.ts';
export type { Box, BusPlace, Hang, Layout, PartEnd, PartPlace, Point } from './types.ts';
