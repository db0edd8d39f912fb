import { type ElementKind, seriesKinds } from '../../study/index.ts';

/** What the tray offers: every kind of part, and a busbar to begin with. */
export type TrayKind = ElementKind | 'bus';

export function isSeriesKind(kind: TrayKind): boolean {
  return kind !== 'bus' && seriesKinds.includes(kind);
}

/** Names on the tray. */
export const trayNames: Record<TrayKind, string> = {
  supply: 'supply',
  generator: 'generator',
  transformer: 'transformer',
  cable: 'cable',
  reactor: 'reactor',
  coupler: 'coupler',
  motor: 'motor',
  converter: 'drive',
  load: 'load',
  bank: 'bank',
  filter: 'filter',
  branch: 'R-L-C, series',
  shunt: 'R-L-C, to neutral',
  bus: 'busbar',
};
