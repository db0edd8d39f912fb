/**
 * A number as the working shows it: four significant digits (or as asked), whole numbers kept whole, no
 * exponent, no trailing zeros, the minus sign U+2212. RangeError for a number that is not finite.
 */
export function figure(value: number, digits = 4): string {
  if (!Number.isFinite(value)) throw new RangeError(`${value} cannot be shown: a finite number is needed`);
  const size = Math.abs(value);
  const text = size >= 10 ** (digits - 1) ? String(Math.round(size)) : fraction(size, digits);
  return value < 0 && text !== '0' ? `−${text}` : text;
}

function fraction(size: number, digits: number): string {
  if (size === 0) return '0';
  if (size >= 1e-6) {
    // An integer over a power of ten is the double nearest to that decimal, so it prints without a tail.
    const scale = 10 ** (digits - 1 - Math.floor(Math.log10(size)));
    return String(Math.round(size * scale) / scale);
  }
  const text = size.toFixed(12).replace(/0+$/, '');
  return text === '0.' ? '0' : text;
}

/** "2nd", "3rd", "5th", "21st", "11th". */
export function ordinal(h: number): string {
  const tens = h % 100;
  if (tens >= 11 && tens <= 13) return `${h}th`;
  return `${h}${['th', 'st', 'nd', 'rd'][h % 10] ?? 'th'}`;
}
