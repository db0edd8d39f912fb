/** What the live readings show: the fundamental, rms over all orders, or the order at the rail's handle. */
export type ReadingMode = 'fundamental' | 'rms' | 'order';

/** The integer order a reading speaks of when the handle stands at h, within 1…maxOrder. */
export function readOrder(h: number, maxOrder: number): number {
  return Math.min(Math.max(Math.round(h), 1), maxOrder);
}

const SUBSCRIPT = '₀₁₂₃₄₅₆₇₈₉';

export function subscript(order: number): string {
  return [...String(order)].map((digit) => SUBSCRIPT[Number(digit)] ?? digit).join('');
}

export function modeWords(mode: ReadingMode, order: number): string {
  if (mode === 'fundamental') return 'readings: fundamental';
  return mode === 'rms' ? 'readings: rms of all orders' : `readings: order ${order}`;
}
