/** Numbers as the sheet prints them: a fixed decimal point, thin spaces between thousands, a true minus. */

const THIN = '\u202f';
const MINUS = '\u2212';

function grouped(digits: string): string {
  const [whole = '', fraction] = digits.split('.');
  const spaced = whole.length < 5 ? whole : whole.replace(/\B(?=(\d{3})+$)/g, THIN);
  return fraction === undefined ? spaced : `${spaced}.${fraction}`;
}

/** A number with so many decimals; what rounds to nothing carries no sign. Throws RangeError unless finite. */
export function fixed(value: number, decimals: number): string {
  if (!Number.isFinite(value)) throw new RangeError(`cannot print ${value}: a finite number is needed`);
  const digits = Math.abs(value).toFixed(decimals);
  return `${value < 0 && Number(digits) !== 0 ? MINUS : ''}${grouped(digits)}`;
}

/** Below this a result in trade units is the rounding noise of the solution. */
const NOISE = 1e-7;

/**
 * A number with so many significant digits, never in powers of ten; rounding noise prints as 0.
 * Throws RangeError unless finite.
 */
export function significant(value: number, digits = 3): string {
  if (Math.abs(value) < NOISE) return '0';
  const exponent = Math.floor(Math.log10(Number(Math.abs(value).toPrecision(digits))));
  return fixed(value, Math.min(9, Math.max(0, digits - 1 - exponent)));
}

/** As `significant`, with trailing noughts after the point dropped: for data as entered. */
export function entered(value: number): string {
  const rounded = Number(value.toPrecision(7));
  const text = String(Math.abs(rounded));
  if (text.includes('e')) return significant(value, 4);
  return `${rounded < 0 ? MINUS : ''}${grouped(text)}`;
}

/** A number with its sign always shown, as margins are. */
export function signed(value: number, decimals: number): string {
  const text = fixed(value, decimals);
  return text.startsWith(MINUS) ? text : `+${text}`;
}
