/** The sign before the decimals; the other of the two then parts thousands. */
export type DecimalMark = '.' | ',';

const grouped = /^\d{1,3}(?:([ '])\d{3})(?:\1\d{3})*/;

/**
 * A number as a person writes it, starting at `from`: decimal comma or point, thousands parted by spaces or
 * apostrophes, exponent. With both marks the last is the decimal mark; one mark alone is decimal unless it
 * stands more than once in groups of three. Where the decimal mark is given, the other one parts thousands or
 * the text is no number. Returns value and end, or undefined where no number starts.
 */
export function readNumber(
  text: string,
  from: number,
  decimal?: DecimalMark,
): { value: number; end: number } | undefined {
  const match = /^[\d.,' ]*[\d.,]/.exec(text.slice(from));
  if (!match || !/\d/.test(match[0])) return undefined;
  const run = digitRun(match[0]);
  const plain = decimal === undefined ? decimalPoint(run) : markedPoint(run, decimal);
  if (plain === undefined) return undefined;
  const exponent = /^[eE][+-]?\d+/.exec(text.slice(from + run.length));
  const value = Number(plain + (exponent?.[0] ?? ''));
  return Number.isFinite(value) ? { value, end: from + run.length + (exponent?.[0].length ?? 0) } : undefined;
}

/** The longest leading part that is one number: spaces only inside groups of three digits. */
function digitRun(text: string): string {
  const group = grouped.exec(text);
  if (group) {
    const rest = /^[.,]\d*/.exec(text.slice(group[0].length));
    return group[0] + (rest?.[0] ?? '');
  }
  return /^[\d.,]+/.exec(text)?.[0] ?? '';
}

function decimalPoint(run: string): string | undefined {
  const digits = run.replace(/[ ']/g, '');
  const commas = digits.split(',').length - 1;
  const points = digits.split('.').length - 1;
  if (commas > 0 && points > 0) {
    const decimal = digits.lastIndexOf(',') > digits.lastIndexOf('.') ? ',' : '.';
    const thousands = decimal === ',' ? '.' : ',';
    if ((decimal === ',' ? commas : points) > 1) return undefined;
    const [whole = '', fraction = ''] = digits.split(decimal);
    return isGrouped(whole, thousands) ? `${whole.replaceAll(thousands, '')}.${fraction}` : undefined;
  }
  const mark = commas > 0 ? ',' : '.';
  if (commas + points > 1) return isGrouped(digits, mark) ? digits.replaceAll(mark, '') : undefined;
  const plain = digits.replace(',', '.');
  return plain === '.' ? undefined : plain;
}

/** The number with a point for its decimal mark, the other mark parting thousands. */
function markedPoint(run: string, decimal: DecimalMark): string | undefined {
  const [whole = '', fraction, more] = run.replace(/[ ']/g, '').split(decimal);
  if (more !== undefined) return undefined;
  const thousands = decimal === ',' ? '.' : ',';
  if (fraction?.includes(thousands)) return undefined;
  if (whole.includes(thousands) && !isGrouped(whole, thousands)) return undefined;
  const digits = whole.replaceAll(thousands, '');
  return digits === '' && !fraction ? undefined : `${digits}.${fraction ?? ''}`;
}

function isGrouped(text: string, mark: string): boolean {
  const [first = '', ...rest] = text.split(mark);
  return (
    first.length >= 1 && first.length <= 3 && rest.length > 0 && rest.every((part) => /^\d{3}$/.test(part))
  );
}
