import type { DecimalMark } from '../units/readNumber.ts';

export interface FoundMark {
  /** The mark of all numbers; undefined where none has decimals, or where they disagree. */
  decimal: DecimalMark | undefined;
  /** "1,250" could be either: how it is read is a guess. */
  guessed: boolean;
  /** Some numbers have a comma for sure, others a point: each is read by itself. */
  mixed: boolean;
}

/** Which mark the decimals of a table have, from all its cells together: "1,250" beside "0,85" is 1.25. */
export function decimalMark(cells: readonly string[]): FoundMark {
  const votes = { '.': 0, ',': 0 };
  let open = false;
  for (const cell of cells) {
    const [number] = /^[-+−]?[\d.,\s'’\u00a0\u2007\u2009\u202f]*\d/.exec(cell.trim()) ?? [''];
    const vote = number === '' ? null : markOf(number);
    if (vote === '?') open = true;
    else if (vote) votes[vote] += 1;
  }
  const mixed = votes['.'] > 0 && votes[','] > 0;
  const sure = mixed ? undefined : votes['.'] > 0 ? '.' : votes[','] > 0 ? ',' : undefined;
  return { decimal: sure, guessed: open && sure === undefined && !mixed, mixed };
}

/** The decimal mark of one number for sure, "?" where it could be thousands, null where it has neither mark. */
function markOf(number: string): DecimalMark | '?' | null {
  const marks = [...number].filter((sign) => sign === ',' || sign === '.') as DecimalMark[];
  const last = marks.at(-1);
  if (last === undefined) return null;
  const others = marks.filter((mark) => mark !== last).length;
  if (others > 0) return last;
  const other: DecimalMark = last === ',' ? '.' : ',';
  if (marks.length > 1) return other;
  const [whole = '', fraction = ''] = number.replace(/^[-+−]/, '').split(last);
  const couldBeThousands = /^[1-9]\d{0,2}$/.test(whole) && /^\d{3}$/.test(fraction);
  return couldBeThousands ? '?' : last;
}
