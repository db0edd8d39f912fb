import { cellOf, type FigureValues } from '../figure/FigureValues.ts';
import type { SpectrumBar } from './spectrumBars.ts';

/** Every order with the worst phase's share, its value and the limit of the order. */
export function spectrumValues(
  bars: readonly SpectrumBar[],
  quantity: 'voltage' | 'current',
  baseWords = 'of fundamental',
): FigureValues {
  return [
    ['order', `% ${baseWords}`, quantity === 'voltage' ? 'U, V' : 'I, A', 'limit, %'],
    ...bars.map(({ h, percent, value, limit }) => [String(h), cellOf(percent), cellOf(value), cellOf(limit)]),
  ];
}
