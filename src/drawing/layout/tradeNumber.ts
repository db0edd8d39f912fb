import { formatNumber } from '../../study/index.ts';

/** A nameplate number as printed; a value that is not finite prints as a dash, never as a figure. */
export function tradeNumber(value: number): string {
  return Number.isFinite(value) ? formatNumber(value) : '–';
}

/** Volts with V up to 1000 V and kV above, as written on a single-line diagram. */
export function tradeVolts(volts: number): string {
  if (!Number.isFinite(volts)) return '–';
  return volts > 1000 ? `${tradeNumber(volts / 1000)}\u00a0kV` : `${tradeNumber(volts)}\u00a0V`;
}
