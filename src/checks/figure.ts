/**
 * A number as the working shows it: four significant digits (or as asked), no exponent, trailing
 * zeros kept off, the minus sign U+2212. RangeError for a number that is not finite.
 */
export function figure(value: number, digits = 4): string {
  if (!Number.isFinite(value)) throw new RangeError(`${value} cannot be shown: a finite number is needed`);
  if (value === 0) return '0';
  const magnitude = Math.floor(Math.log10(Math.abs(value)));
  const decimals = Math.max(0, Math.min(12, digits - 1 - magnitude));
  const text = Math.abs(value).toFixed(decimals);
  const short = text.includes('.') ? text.replace(/\.?0+$/, '') : text;
  return value < 0 && Number(short) !== 0 ? `−${short}` : short;
}

/** "2nd", "3rd", "5th", "21st", "11th". */
export function ordinal(h: number): string {
  const tens = h % 100;
  if (tens >= 11 && tens <= 13) return `${h}th`;
  return `${h}${['th', 'st', 'nd', 'rd'][h % 10] ?? 'th'}`;
}
