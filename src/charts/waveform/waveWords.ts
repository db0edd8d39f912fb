import type { WaveSettings } from './waveModel.ts';

/** What stands in the way of a waveform, or what must be said beside it. */
export interface WaveDoubt {
  /** No curve may be drawn; the words say why. */
  refused: boolean;
  words: string;
}

/**
 * Under the IEC 61000-3-6 summation the orders above the fundamental carry no angle, so nothing but the
 * fundamental has a course in time. Unknown angles are drawn as 0 and said to be so, briefly in a card.
 */
export function waveDoubt(
  summation: 'phasor' | 'alpha',
  anglesUnknown: boolean,
  settings: Pick<WaveSettings, 'content'>,
  brief = false,
): WaveDoubt | null {
  if (settings.content === 'fundamental') return null;
  if (summation === 'alpha') {
    return {
      refused: true,
      words:
        'No waveform: the IEC 61000-3-6 summation gives magnitudes without angles. The fundamental alone can be drawn.',
    };
  }
  if (!anglesUnknown) return null;
  return { refused: false, words: brief ? 'unknown angles as 0' : 'drawn with unknown angles taken as 0' };
}

/** "fundamental alone", "orders 1 to 25", "all orders to 50". */
export function contentWords(
  settings: Pick<WaveSettings, 'content'>,
  highest: number,
  maxOrder: number,
): string {
  if (settings.content === 'fundamental') return 'fundamental alone';
  return highest === maxOrder ? `all orders to ${maxOrder}` : `orders 1 to ${highest}`;
}
