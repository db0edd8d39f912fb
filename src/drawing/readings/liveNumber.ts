import { tradeNumber } from '../layout/index.ts';

/** A live number to three digits, whole above 100, its decimals kept so that it does not jump in width. */
export function liveNumber(value: number): string {
  const size = Math.abs(value);
  if (!Number.isFinite(value)) return '–';
  if (size >= 99.95) return tradeNumber(Math.round(value), 6);
  const decimals = size >= 9.995 ? 1 : 2;
  return value.toFixed(decimals).replace('-', '−');
}

/** kW, kvar or kVA, in the mega unit from ten thousand. */
export function livePower(kilo: number, unit: 'W' | 'var' | 'VA'): string {
  return Math.abs(kilo) >= 10_000 ? `${liveNumber(kilo / 1000)} M${unit}` : `${liveNumber(kilo)} k${unit}`;
}

export function liveVolts(volts: number): string {
  if (volts >= 1000) return `${(volts / 1000).toFixed(volts >= 99_950 ? 1 : 2)} kV`;
  return `${volts >= 9.995 ? volts.toFixed(1) : volts.toFixed(2)} V`;
}

export function livePercent(perUnit: number): string {
  return `${liveNumber(perUnit * 100)} %`;
}
