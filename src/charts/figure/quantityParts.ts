import { formatNumber } from '../../study/index.ts';

/** A number ready to print and its unit, apart, because the unit is set in lighter ink. */
export interface QuantityParts {
  number: string;
  unit: string;
}

const PREFIXES = [
  { factor: 1e6, letter: 'M' },
  { factor: 1e3, letter: 'k' },
  { factor: 1, letter: '' },
  { factor: 1e-3, letter: 'm' },
  { factor: 1e-6, letter: 'µ' },
] as const;

/** What stands where a number could not be computed. */
export const ABSENT = '—';

/** `digits` significant digits with trailing zeros, whole digits never rounded away. */
export function plainNumber(value: number, digits = 3): string {
  return Number.isFinite(value) ? formatNumber(value, { digits, fixed: true }) : ABSENT;
}

/** A fixed number of decimals. */
export function fixedNumber(value: number, decimals: number): string {
  return Number.isFinite(value) ? formatNumber(value, { decimals }) : ABSENT;
}

/** Ohm with the prefix that leaves one to three digits before the point. */
export function ohmParts(ohm: number, digits = 3): QuantityParts {
  const size = Math.abs(Number(ohm.toPrecision(digits)));
  const prefix = PREFIXES.find((one) => size >= one.factor) ?? PREFIXES[size === 0 ? 2 : 4];
  return { number: plainNumber(ohm / prefix.factor, digits), unit: `${prefix.letter}Ω` };
}

/** Volts, in kV from 2000 V; volts of a low-voltage busbar stay volts. */
export function voltParts(volt: number, digits = 4): QuantityParts {
  if (Math.abs(volt) >= 2000) return { number: plainNumber(volt / 1000, digits), unit: 'kV' };
  return { number: plainNumber(tinyIsZero(volt), digits), unit: 'V' };
}

/** Amperes as an engineer reads them off a meter: whole amperes from 100 A, kA from 100 kA. */
export function ampereParts(ampere: number, digits = 3): QuantityParts {
  if (Math.abs(ampere) >= 100_000) return { number: plainNumber(ampere / 1000, digits), unit: 'kA' };
  return { number: plainNumber(tinyIsZero(ampere), digits), unit: 'A' };
}

/** Rounding residue of a solution is not a reading. */
function tinyIsZero(value: number): number {
  return Math.abs(value) < 1e-4 ? 0 : value;
}

/** Between number and unit: a thin space is lost at 11 px. */
const UNIT_SPACE = '\u00a0';

/** Number, no-break space, unit. */
export function joinParts(parts: QuantityParts): string {
  return parts.unit === '' ? parts.number : `${parts.number}${UNIT_SPACE}${parts.unit}`;
}
