import { formatNumber } from '../../study/index.ts';

/** Decimals that keep three digits, so that a live number does not jump in width. */
function decimalsOf(value: number): number {
  const size = Math.abs(value);
  if (size >= 99.95) return 0;
  return size >= 9.995 ? 1 : 2;
}

export function liveNumber(value: number): string {
  return Number.isFinite(value) ? formatNumber(value, { decimals: decimalsOf(value) }) : '–';
}

export function liveQuantity(value: number, unit: string): string {
  return `${liveNumber(value)}\u00a0${unit}`;
}

export function liveVolts(volts: number): string {
  if (!Number.isFinite(volts)) return '–';
  if (volts >= 1000) return `${formatNumber(volts / 1000, { decimals: volts >= 99_950 ? 1 : 2 })}\u00a0kV`;
  return `${formatNumber(volts, { decimals: volts >= 9.995 ? 1 : 2 })}\u00a0V`;
}

/** A share in per cent, without the sign. */
export function liveShare(perUnit: number): string {
  return liveNumber(perUnit * 100);
}

export function livePercent(perUnit: number): string {
  return liveQuantity(perUnit * 100, '%');
}

export function liveOhm(ohm: number): string {
  if (!Number.isFinite(ohm)) return '–';
  return ohm < 1 ? liveQuantity(ohm * 1000, 'mΩ') : liveQuantity(ohm, 'Ω');
}
