/** What a typed order or frequency means: an order, or one sentence on what is allowed. */
export type OrderEntry = { order: number } | { problem: string };

const PATTERN = /^h?\s*=?\s*([0-9]+(?:[.,][0-9]*)?|[.,][0-9]+)\s*(k?hz|h)?$/i;

/**
 * Reads `7`, `7,2`, `h 7.18`, `350 Hz` or `0.35 kHz`. A bare number above the highest order is taken as
 * hertz, since no order can be meant. Limits are orders.
 */
export function readOrderEntry(
  text: string,
  frequencyHz: number,
  limits: { low: number; high: number },
): OrderEntry {
  const match = PATTERN.exec(text.trim());
  const digits = match?.[1];
  if (!match || digits === undefined) {
    return { problem: 'Type an order such as 7 or a frequency such as 350 Hz.' };
  }
  const number = Number(digits.replace(',', '.'));
  const unit = (match[2] ?? '').toLowerCase();
  const order = inOrders(number, unit, frequencyHz, limits.high);
  if (order >= limits.low && order <= limits.high) return { order };
  const low = limits.low.toPrecision(3).replace(/\.?0+$/, '');
  return {
    problem: `Allowed are orders ${low} to ${Math.floor(limits.high)}, that is up to ${Math.floor(limits.high * frequencyHz)} Hz.`,
  };
}

function inOrders(number: number, unit: string, frequencyHz: number, highest: number): number {
  if (unit === 'khz') return (number * 1000) / frequencyHz;
  if (unit === 'hz') return number / frequencyHz;
  return unit === '' && number > highest ? number / frequencyHz : number;
}
