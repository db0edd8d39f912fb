const THIN_SPACE = '\u2009';

/**
 * A nameplate number as printed: four significant digits, no trailing zeros, thin spaces between
 * thousands, a real minus sign. A value that is not finite prints as a dash.
 */
export function tradeNumber(value: number, digits = 4): string {
  if (!Number.isFinite(value)) return '–';
  const whole = Math.abs(value) >= 10 ** digits;
  const rounded = whole ? Math.round(value) : Number(value.toPrecision(digits));
  const [integer = '0', fraction] = Math.abs(rounded).toString().split('.');
  const grouped = integer.length > 3 ? integer.replace(/\B(?=(\d{3})+$)/g, THIN_SPACE) : integer;
  return `${rounded < 0 ? '−' : ''}${grouped}${fraction ? `.${fraction}` : ''}`;
}

/** Volts with V up to 1000 V and kV above, as written on a single-line diagram. */
export function tradeVolts(volts: number): string {
  return volts > 1000 ? `${tradeNumber(volts / 1000)} kV` : `${tradeNumber(volts)} V`;
}
