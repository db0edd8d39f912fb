import type { Unit } from './unit.ts';

/** U+2009, between groups of three digits and between number and unit. */
export const thinSpace = '\u2009';

/** U+2212. */
export const minusSign = '\u2212';

export interface NumberStyle {
  /** Significant digits, 4 by default; whole digits are never rounded away. */
  digits?: number;
  /** Decimals instead of significant digits. */
  decimals?: number;
  /** Keep trailing zeros, as columns of results do. */
  fixed?: boolean;
  decimalMark?: '.' | ',';
}

/**
 * A number in fixed trade formatting: thin-space thousands from four digits, a true minus, no exponent but
 * ·10ⁿ outside 10⁻⁴…10⁷. Throws RangeError for a number that is not finite: absence is said, not drawn.
 */
export function formatNumber(value: number, style: NumberStyle = {}): string {
  if (!Number.isFinite(value)) throw new RangeError(`${value} cannot be shown; only finite numbers can`);
  const { digits = 4, decimalMark = '.' } = style;
  const magnitude = Math.abs(value);
  if (magnitude !== 0 && style.decimals === undefined && (magnitude < 1e-4 || magnitude >= 1e7))
    return scientific(value, style);
  const wholeDigits =
    magnitude < 1
      ? magnitude === 0
        ? 1
        : Math.floor(Math.log10(magnitude)) + 1
      : Math.floor(Math.log10(magnitude)) + 1;
  const decimals = style.decimals ?? Math.min(12, Math.max(0, digits - wholeDigits));
  const [whole = '0', fraction = ''] = magnitude.toFixed(decimals).split('.');
  const kept = style.fixed || style.decimals !== undefined ? fraction : fraction.replace(/0+$/, '');
  const isZero = /^0*$/.test(whole + kept);
  const grouped = whole.length > 3 ? whole.replace(/\B(?=(\d{3})+$)/g, thinSpace) : whole;
  return `${value < 0 && !isZero ? minusSign : ''}${grouped}${kept ? decimalMark + kept : ''}`;
}

const raised = '⁰¹²³⁴⁵⁶⁷⁸⁹';

function scientific(value: number, style: NumberStyle): string {
  const [mantissa = '0', exponent = '0'] = value
    .toExponential(Math.max(0, (style.digits ?? 4) - 1))
    .split('e');
  const power = Number(exponent);
  const digits = [...String(Math.abs(power))].map((digit) => raised.charAt(Number(digit))).join('');
  return `${formatNumber(Number(mantissa), style)}·10${power < 0 ? '⁻' : ''}${digits}`;
}

/** A number and its unit: "1 250 kVA", "−3.5 %", "30°". A ratio stands without a unit. */
export function formatQuantity(value: number, unit: Unit | (string & {}), style: NumberStyle = {}): string {
  const number = formatNumber(value, style);
  if (unit === '') return number;
  return unit === '°' ? `${number}°` : `${number}${thinSpace}${unit}`;
}

/** The value as it stands in a text field: shortest form that reads back equal, no thousands, plain marks. */
export function editText(value: number): string {
  return String(value);
}
