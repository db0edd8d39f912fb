import { formatQuantity } from './formatQuantity.ts';
import { parseQuantity } from './parseQuantity.ts';
import type { Unit } from './unit.ts';

/** Larger and smaller units a value of a field is spoken of in, with their size in the field's unit. */
const spokenUnits: Partial<Record<Unit, readonly (readonly [unit: string, size: number])[]>> = {
  V: [['kV', 1e3]],
  A: [['kA', 1e3]],
  kW: [
    ['MW', 1e3],
    ['W', 1e-3],
  ],
  kVA: [
    ['MVA', 1e3],
    ['VA', 1e-3],
  ],
  kvar: [
    ['Mvar', 1e3],
    ['var', 1e-3],
  ],
  MVA: [
    ['GVA', 1e3],
    ['kVA', 1e-3],
  ],
  Ω: [['mΩ', 1e-3]],
  'Ω/km': [['mΩ/km', 1e-3]],
  mH: [
    ['H', 1e3],
    ['µH', 1e-3],
  ],
  m: [['km', 1e3]],
};

/**
 * What a text being typed is taken for, where that is not plain from the text itself: "= 400 V" for "0,4 kV",
 * "= 20 kV" for "20000", "= 165 kW" for "3*55". Null for a plain number, and for what cannot be read.
 */
export function understoodAs(typed: string, unit: Unit): string | null {
  const parsed = parseQuantity(typed, unit);
  if (!parsed.ok) return null;
  const plain = /^\s*-?\d+(\.\d+)?\s*$/.test(typed);
  const own = plain ? [] : [formatQuantity(parsed.value, unit, { digits: 6 })];
  const shown = [...own, ...spokenSize(parsed.value, unit)];
  return shown.length === 0 ? null : `= ${shown.join(' = ')}`;
}

/** The value in a unit that brings it between 1 and 1000, where its own leaves it far outside. */
function spokenSize(value: number, unit: Unit): string[] {
  const size = Math.abs(value);
  if (size === 0 || (size >= 0.1 && size < 1000)) return [];
  const better = spokenUnits[unit]?.find(([, own]) => size / own >= 1 && size / own < 1000);
  return better ? [formatQuantity(value / better[1], better[0], { digits: 6 })] : [];
}
