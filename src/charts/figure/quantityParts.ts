/** A number ready to print and its unit, apart, because the unit is set in lighter ink. */
export interface QuantityParts {
  number: string;
  unit: string;
}

const PREFIXES = [
  { power: 6, letter: 'M' },
  { power: 3, letter: 'k' },
  { power: 0, letter: '' },
  { power: -3, letter: 'm' },
  { power: -6, letter: 'µ' },
] as const;

const THIN_SPACE = '\u2009';
const MINUS = '\u2212';

/** Fixed notation with at least `digits` significant digits, thin-space thousands and a true minus. */
export function plainNumber(value: number, digits = 3): string {
  if (!Number.isFinite(value)) return '—';
  const size = Math.abs(value);
  const whole = size === 0 ? 1 : Math.floor(Math.log10(Number(size.toPrecision(digits)))) + 1;
  return fixedNumber(value, Math.min(6, Math.max(0, digits - Math.max(whole, 1 - 6))));
}

/** A fixed number of decimals, thin-space thousands and a true minus; zero never carries a sign. */
export function fixedNumber(value: number, decimals: number): string {
  if (!Number.isFinite(value)) return '—';
  const [whole = '0', fraction] = Math.abs(value).toFixed(decimals).split('.');
  const grouped = whole.length > 3 ? whole.replace(/\B(?=(\d{3})+$)/g, THIN_SPACE) : whole;
  const text = fraction === undefined ? grouped : `${grouped}.${fraction}`;
  return value < 0 && /[1-9]/.test(text) ? MINUS + text : text;
}

/** Ohm with the prefix that leaves one to three digits before the point. */
export function ohmParts(ohm: number, digits = 3): QuantityParts {
  return prefixed(ohm, 'Ω', digits, -6);
}

/** Volts, in kV from 1000 V where `kilo` is wanted; volts of a low-voltage busbar stay volts. */
export function voltParts(volt: number, digits = 4): QuantityParts {
  const size = Math.abs(volt);
  if (size >= 2000) return { number: plainNumber(volt / 1000, digits), unit: 'kV' };
  return { number: size > 0 && size < 0.0005 ? '0.000' : plainNumber(volt, digits), unit: 'V' };
}

/** Amperes as an engineer reads them off a meter: whole amperes from 100 A, kA from 100 kA. */
export function ampereParts(ampere: number, digits = 3): QuantityParts {
  if (Math.abs(ampere) >= 100_000) return { number: plainNumber(ampere / 1000, digits), unit: 'kA' };
  return { number: plainNumber(ampere, digits), unit: 'A' };
}

function prefixed(value: number, unit: string, digits: number, lowest: number): QuantityParts {
  const size = Math.abs(Number(value.toPrecision(digits)));
  const fit = PREFIXES.find((prefix) => size >= 10 ** prefix.power && prefix.power >= lowest);
  const prefix = fit ?? PREFIXES[size === 0 ? 2 : 4];
  return { number: plainNumber(value / 10 ** prefix.power, digits), unit: prefix.letter + unit };
}

/** Number, thin space, unit. */
export function joinParts(parts: QuantityParts): string {
  return parts.unit === '' ? parts.number : `${parts.number}${THIN_SPACE}${parts.unit}`;
}
