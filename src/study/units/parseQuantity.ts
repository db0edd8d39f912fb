import { type DecimalMark, readNumber } from './readNumber.ts';
import type { Unit } from './unit.ts';
import { prefixes, unitOf } from './unitTable.ts';

export type ParsedQuantity =
  | {
      ok: true;
      /** In the field's unit. */
      value: number;
    }
  | { ok: false; error: string };

/** A number while it is being worked out: in the field's unit, or bare until it meets a unit. */
interface Term {
  value: number;
  bare: boolean;
}

class Refusal extends Error {}

/**
 * Reads a quantity as a person types it, in the unit of its field: decimal comma or point, thousands, SI
 * prefixes with or without the unit ("0,4 kV", "1.25k", "12.5 mΩ/km"), and arithmetic with + − * / × ·,
 * parentheses and sqrt ("3*55", "(2+3)*25", "400/sqrt(3)"). A bare prefix counts from the unprefixed unit,
 * so "1.6M" in a kVA field is 1600. In a sum, a bare number takes the unit of its neighbour. Where the decimal
 * mark of the text is known, the other mark parts thousands alone.
 */
export function parseQuantity(text: string, unit: Unit, decimal?: DecimalMark): ParsedQuantity {
  const typed = tidy(text);
  const plain = plainNumber(typed, decimal);
  if (plain !== undefined) return { ok: true, value: plain };
  if (typed === '') return { ok: false, error: `Give a number${unit ? ` in ${unit}` : ''}.` };
  try {
    const reader = new Reader(typed, unit, decimal);
    const term = reader.sum();
    reader.finish();
    if (!Number.isFinite(term.value)) throw new Refusal('The result is not a finite number.');
    return { ok: true, value: withoutRoundingDust(term.value) };
  } catch (refusal) {
    if (!(refusal instanceof Refusal)) throw refusal;
    return { ok: false, error: refusal.message };
  }
}

/** A number alone, kept to its last digit. */
function plainNumber(typed: string, decimal?: DecimalMark): number | undefined {
  const sign = typed.startsWith('-') ? 1 : 0;
  const number = readNumber(typed, sign, decimal);
  if (!number || number.end !== typed.length) return undefined;
  return sign ? -number.value : number.value;
}

/** Conversions multiply by powers of ten; a digit beyond the fifteenth is rounding, not data. */
function withoutRoundingDust(value: number): number {
  return Number(value.toPrecision(15));
}

function tidy(text: string): string {
  return text
    .replace(/[\u00a0\u2007\u2009\u202f]/g, ' ')
    .replace(/[\u2212\u2013]/g, '-')
    .replace(/\u03bc/g, 'µ')
    .replace(/\u2126/g, 'Ω')
    .replace(/\u2019/g, "'")
    .trim();
}

class Reader {
  private at = 0;

  constructor(
    private readonly text: string,
    private readonly unit: Unit,
    private readonly decimal: DecimalMark | undefined,
  ) {}

  finish(): void {
    this.space();
    if (this.at < this.text.length)
      throw new Refusal(`"${this.text.slice(this.at)}" was not understood; ${this.hint()}.`);
  }

  sum(): Term {
    let left = this.product();
    for (let sign = this.take('+-'); sign; sign = this.take('+-')) {
      const right = this.product();
      left = {
        value:
          sign === '+'
            ? this.shared(left, right) + this.shared(right, left)
            : this.shared(left, right) - this.shared(right, left),
        bare: left.bare && right.bare,
      };
    }
    return left;
  }

  /** A bare number beside one with a unit was read in the unit last met, which is the neighbour's. */
  private shared(term: Term, neighbour: Term): number {
    return term.bare && !neighbour.bare ? term.value * this.lastFactor : term.value;
  }

  private lastFactor = 1;

  private product(): Term {
    let left = this.factor();
    for (let sign = this.takeProductSign(); sign; sign = this.takeProductSign()) {
      const right = this.factor();
      if (sign === '*') {
        if (!left.bare && !right.bare)
          throw new Refusal('Two quantities with units cannot be multiplied here.');
        left = { value: left.value * right.value, bare: left.bare && right.bare };
      } else {
        if (right.value === 0) throw new Refusal('Division by zero.');
        if (left.bare && !right.bare)
          throw new Refusal('A number cannot be divided by a quantity with a unit here.');
        left = { value: left.value / right.value, bare: left.bare || !right.bare };
      }
    }
    return left;
  }

  private factor(): Term {
    if (this.take('-')) {
      const term = this.factor();
      return { ...term, value: -term.value };
    }
    if (this.take('+')) return this.factor();
    return this.withUnit(this.primary());
  }

  private primary(): number {
    this.space();
    const root = /^(sqrt|√)/.exec(this.text.slice(this.at));
    if (root) {
      this.at += root[0].length;
      const radicand = this.primary();
      if (radicand < 0) throw new Refusal('The root of a negative number does not exist here.');
      return Math.sqrt(radicand);
    }
    if (this.take('(')) {
      const term = this.sum();
      if (!this.take(')')) throw new Refusal('A closing parenthesis is missing.');
      if (!term.bare) {
        this.insideUnit = true;
      }
      return term.value;
    }
    const number = readNumber(this.text, this.at, this.decimal);
    if (!number)
      throw new Refusal(
        `${this.at < this.text.length ? `"${this.text.slice(this.at)}" is no number` : 'A number is missing'}; ${this.hint()}.`,
      );
    this.at = number.end;
    return number.value;
  }

  private insideUnit = false;

  private withUnit(value: number): Term {
    const inside = this.insideUnit;
    this.insideUnit = false;
    const written = this.takeUnit();
    if (written === undefined) return { value, bare: !inside };
    if (inside) throw new Refusal('A unit stands both inside and behind the parenthesis.');
    this.lastFactor = written;
    return { value: value * written, bare: false };
  }

  /** Factor from what is written behind a number to the field's unit; undefined where nothing is. */
  private takeUnit(): number | undefined {
    this.space();
    const match = /^(?:per unit|per cent|p\.u\.|°C|[%°]|[A-Za-zµΩ]+(?: ?\/ ?[A-Za-zµΩ]+)?)/.exec(
      this.text.slice(this.at),
    );
    if (!match || /^(x|X)(?=\s*[\d(])/.test(this.text.slice(this.at))) return undefined;
    const word = match[0].replace(/ ?\/ ?/, '/');
    const own = unitOf(this.unit);
    if (typeof own !== 'object')
      throw new RangeError(`the field's unit "${this.unit}" is not in the unit table`);
    const typed = unitOf(word);
    if (typeof typed === 'object' && typed.dimension === own.dimension) {
      this.at += match[0].length;
      return typed.factor / own.factor;
    }
    const prefix = prefixes[word];
    if (prefix !== undefined) {
      this.at += match[0].length;
      return prefix / ownPrefix(this.unit);
    }
    if (typeof typed === 'string') throw new Refusal(`${typed}.`);
    if (typed) throw new Refusal(`${word} does not measure this field; ${this.hint()}.`);
    throw new Refusal(`"${word}" is no unit known here; ${this.hint()}.`);
  }

  private take(signs: string): string | undefined {
    this.space();
    const sign = this.text.charAt(this.at);
    if (sign === '' || !signs.includes(sign)) return undefined;
    this.at += 1;
    return sign;
  }

  private takeProductSign(): '*' | '/' | undefined {
    const sign = this.take('*×·xX/÷:');
    if (sign === undefined) return undefined;
    return '/÷:'.includes(sign) ? '/' : '*';
  }

  private space(): void {
    while (this.text.charAt(this.at) === ' ') this.at += 1;
  }

  private hint(): string {
    return this.unit
      ? `give a number in ${this.unit}, such as ${examples[this.unit] ?? `12.5 ${this.unit}`}`
      : 'give a plain number, such as 0.95 or 3*55';
  }
}

const examples: Partial<Record<Unit, string>> = {
  V: '400, 0.4 kV',
  kVA: '1000, 1 MVA',
  kW: '55, 3*55, 0.4 MW',
  kvar: '50, 6*25',
  kWh: '180 000, 180 MWh',
  kvarh: '110 000, 110 Mvarh',
  'Ω/km': '0.12, 12.5 mΩ/km',
};

/** The prefix of the field's own unit: 1000 for kVA, 0.001 for mH, 1 for V and for ratios. */
function ownPrefix(unit: Unit): number {
  const [upper = ''] = unit.split('/');
  const bare = unitOf(upper.slice(1));
  const prefix = prefixes[upper.charAt(0)];
  return upper.length > 1 && prefix !== undefined && typeof bare === 'object' ? prefix : 1;
}
