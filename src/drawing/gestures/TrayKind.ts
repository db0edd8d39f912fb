import { type ElementKind, seriesKinds, shortKindWords } from '../../study/index.ts';

/** What the tray offers: every kind of part, and a busbar to begin with. */
export type TrayKind = ElementKind | 'bus';

export function isSeriesKind(kind: TrayKind): boolean {
  return kind !== 'bus' && seriesKinds.includes(kind);
}

/** Names on the tray. */
export const trayNames: Record<TrayKind, string> = { ...shortKindWords, bus: 'busbar' };
