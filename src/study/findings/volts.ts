import { formatQuantity } from '../units/formatQuantity.ts';

/** Volts as they are spoken of: "400 V", "12.47 kV". */
export function volts(value: number): string {
  return value >= 1000 ? formatQuantity(value / 1000, 'kV') : formatQuantity(value, 'V', { digits: 3 });
}
