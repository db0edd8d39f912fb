import { clampOrder, type OrderDomain } from './orderAxis.ts';
import { fineOrderStep, listedOrderStep, wholeOrderStep } from './orderSteps.ts';
import { type RailPeak, steppedPeak } from './railPeaks.ts';

/** What a key means on the rail: a new order, the small entry opened with what was typed, or nothing. */
export type RailKeyAction =
  | { kind: 'order'; order: number }
  | { kind: 'entry'; text: string }
  | { kind: 'zoom'; factor: number };

export interface RailKeyState {
  order: number;
  full: OrderDomain;
  maxOrder: number;
  peaks: readonly RailPeak[];
  injectedOrders: readonly number[];
}

/**
 * Keys of the rail: arrows step whole orders (Shift: hundredths), Page keys the injected orders, P and
 * Shift+P the peaks, Home and Escape the fundamental, End the highest order, digits open the entry,
 * + and − zoom. null leaves the key to the page.
 */
export function railKeyAction(key: string, shift: boolean, state: RailKeyState): RailKeyAction | null {
  const target = orderForKey(key, shift, state);
  if (target !== null) return { kind: 'order', order: clampOrder(target, state.full) };
  if (/^[0-9]$/.test(key)) return { kind: 'entry', text: key };
  if (key === '+') return { kind: 'zoom', factor: 0.7 };
  if (key === '-') return { kind: 'zoom', factor: 1 / 0.7 };
  return null;
}

function orderForKey(key: string, shift: boolean, state: RailKeyState): number | null {
  const step = shift ? fineOrderStep : wholeOrderStep;
  switch (key) {
    case 'ArrowRight':
    case 'ArrowUp':
      return step(state.order, 1);
    case 'ArrowLeft':
    case 'ArrowDown':
      return shift ? step(state.order, -1) : Math.max(1, step(state.order, -1));
    case 'PageUp':
      return listedOrderStep(state.injectedOrders, state.order, 1);
    case 'PageDown':
      return listedOrderStep(state.injectedOrders, state.order, -1);
    case 'p':
    case 'P':
      return steppedPeak(state.peaks, state.order, shift ? -1 : 1)?.order ?? null;
    case 'Home':
    case 'Escape':
      return 1;
    case 'End':
      return state.maxOrder;
    default:
      return null;
  }
}
