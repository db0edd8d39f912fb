import type { DrawnItem, Study, SymbolSet } from './types.ts';

/** What the drawing can show beside its symbols, in the order it is offered. */
export const drawnItems: readonly DrawnItem[] = [
  'current',
  'power',
  'powerFactor',
  'voltages',
  'nameplates',
  'dials',
  'direction',
  'widths',
];

/** What each item is called, in the plural, lower case. */
export const drawnWords: Readonly<Record<DrawnItem, string>> = {
  current: 'currents',
  power: 'powers',
  powerFactor: 'power factors',
  voltages: 'voltages',
  nameplates: 'nameplates',
  dials: 'phasor dials',
  direction: 'directions of power',
  widths: 'line widths by current',
};

export const symbolSetWords: Readonly<Record<SymbolSet, string>> = {
  iec60617: 'IEC 60617',
  ieee315: 'IEEE 315',
};

export const symbolSets: readonly SymbolSet[] = ['iec60617', 'ieee315'];

/** Items this study's drawing shows: all but those its view hides. */
export function drawnOf(study: Study): ReadonlySet<DrawnItem> {
  const hidden = study.view?.hidden ?? [];
  return new Set(drawnItems.filter((item) => !hidden.includes(item)));
}

/** The symbols the study is drawn with: IEC 60617 unless its view says otherwise. */
export function symbolSetOf(study: Study): SymbolSet {
  return study.view?.symbols === 'ieee315' ? 'ieee315' : 'iec60617';
}
