export { FrequencyRail, type FrequencyRailProps } from './rail/FrequencyRail.tsx';
export type { Injection } from './rail/injections.ts';
export type { OrderDomain } from './rail/orderAxis.ts';
export { RailFigure, type RailFigureProps } from './rail/RailFigure.tsx';
export type { PeakVerdict, RailBand, RailScan } from './rail/railModel.ts';
export type { Probe } from './rail/railWords.ts';
