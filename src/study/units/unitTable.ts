/** Base units with their dimension name; quantities of one dimension convert into each other. */
export interface BaseUnit {
  dimension: string;
  /** Factor to the coherent unit of the dimension. */
  factor: number;
  /** Whether SI prefixes go with it. */
  prefixed: boolean;
}

const bases: readonly [string, BaseUnit][] = [
  ['V', { dimension: 'V', factor: 1, prefixed: true }],
  ['A', { dimension: 'A', factor: 1, prefixed: true }],
  ['W', { dimension: 'W', factor: 1, prefixed: true }],
  ['VA', { dimension: 'VA', factor: 1, prefixed: true }],
  ['var', { dimension: 'var', factor: 1, prefixed: true }],
  ['Wh', { dimension: 'Wh', factor: 1, prefixed: true }],
  ['varh', { dimension: 'varh', factor: 1, prefixed: true }],
  // The mechanical horsepower of 550 ft·lbf/s, common on 60 Hz nameplates.
  ['hp', { dimension: 'W', factor: 745.6998715822702, prefixed: false }],
  ['Ω', { dimension: 'Ω', factor: 1, prefixed: true }],
  ['H', { dimension: 'H', factor: 1, prefixed: true }],
  ['F', { dimension: 'F', factor: 1, prefixed: true }],
  ['m', { dimension: 'm', factor: 1, prefixed: true }],
  ['ft', { dimension: 'm', factor: 0.3048, prefixed: false }],
  ['Hz', { dimension: 'Hz', factor: 1, prefixed: true }],
  ['s', { dimension: 's', factor: 1, prefixed: true }],
  ['min', { dimension: 's', factor: 60, prefixed: false }],
  ['h', { dimension: 's', factor: 3600, prefixed: false }],
  ['°', { dimension: 'angle', factor: 1, prefixed: false }],
  ['°C', { dimension: 'temperature', factor: 1, prefixed: false }],
  ['rad', { dimension: 'angle', factor: 180 / Math.PI, prefixed: false }],
  ['%', { dimension: '', factor: 0.01, prefixed: false }],
  ['pu', { dimension: '', factor: 1, prefixed: false }],
];

/** Spellings people type, brought to the table's own. */
const spellings: readonly [RegExp, string][] = [
  [/^(ohms?|R)$/i, 'Ω'],
  [/^(var|VAr|VAR)$/, 'var'],
  [/^(wh)$/i, 'Wh'],
  [/^(varh)$/i, 'varh'],
  [/^(va)$/i, 'VA'],
  [/^(v)$/i, 'V'],
  [/^(w)$/i, 'W'],
  [/^(a|amps?|amperes?)$/i, 'A'],
  [/^(hz)$/i, 'Hz'],
  [/^(deg|degrees?)$/i, '°'],
  [/^(p\.u\.|per unit)$/i, 'pu'],
  [/^(percent|per cent)$/i, '%'],
  [/^(feet|foot)$/i, 'ft'],
  [/^(hours?|hrs?)$/i, 'h'],
  [/^(sec|seconds?)$/i, 's'],
  [/^(minutes?)$/i, 'min'],
  [/^(metres?|meters?)$/i, 'm'],
];

export const prefixes: Readonly<Record<string, number>> = {
  p: 1e-12,
  n: 1e-9,
  µ: 1e-6,
  u: 1e-6,
  m: 1e-3,
  k: 1e3,
  K: 1e3,
  M: 1e6,
  G: 1e9,
};

const table = new Map(bases);

function baseOf(text: string): BaseUnit | undefined {
  const exact = table.get(text);
  if (exact) return exact;
  const spelling = spellings.find(([pattern]) => pattern.test(text));
  return spelling ? table.get(spelling[1]) : undefined;
}

const powers = new Set(['W', 'VA', 'var', 'Wh', 'varh']);

function simpleUnit(text: string): BaseUnit | string | undefined {
  const whole = baseOf(text);
  if (whole) return whole;
  const prefix = prefixes[text.charAt(0)];
  const base = prefix === undefined ? undefined : baseOf(text.slice(1));
  if (prefix === undefined || !base?.prefixed) return undefined;
  if (prefix < 1 && powers.has(base.dimension)) {
    return `"${text}" would be milli or less; write a capital M for mega, as in M${text.slice(1)}`;
  }
  return { ...base, factor: base.factor * prefix };
}

/**
 * A unit as typed or as the catalogue names it: prefix, base, and one "per". Returns its dimension ("Ω/m",
 * "V", "") and factor to the coherent unit, a sentence where it can only be a slip, undefined where unknown.
 */
export function unitOf(text: string): { dimension: string; factor: number } | string | undefined {
  if (text === '') return { dimension: '', factor: 1 };
  const [upper = '', lower, more] = text.split('/');
  if (more !== undefined) return undefined;
  const top = simpleUnit(upper);
  if (typeof top === 'string' || top === undefined || lower === undefined) return top;
  const bottom = simpleUnit(lower);
  if (typeof bottom === 'string' || bottom === undefined) return bottom;
  return { dimension: `${top.dimension}/${bottom.dimension}`, factor: top.factor / bottom.factor };
}
