import { figure } from '../../checks/index.ts';
import { type DimensionKind, type ToleranceSettings, toleranceSpace } from '../../sizing/index.ts';
import { casesOf, type Study } from '../../study/index.ts';

const names: Readonly<Record<DimensionKind, string>> = {
  capacitance: 'capacitance, ageing in it, each bank by itself',
  inductance: 'reactors of banks and filters',
  'transformer-impedance': 'uk of transformers not tested',
  'fault-level': 'fault level, smallest to largest',
  'supply-voltage': 'supply voltage',
  frequency: 'frequency',
  background: 'background distortion, none to all of it',
  motors: 'motors running or not',
};

/** One axis of the tolerance space as a line to tick. */
export interface ToleranceRow {
  kind: DimensionKind;
  words: string;
  /** "−9.8 to +10 %"; null where the site has nothing of the kind. */
  range: string | null;
}

/** Every kind of tolerance with the width it has on this site. */
export function toleranceRows(study: Study, settings: ToleranceSettings): ToleranceRow[] {
  const kinds = Object.keys(names) as DimensionKind[];
  const on = Object.fromEntries(kinds.map((kind) => [kind, true])) as ToleranceSettings['on'];
  const axes = casesOf(study).flatMap(({ id }) => toleranceSpace(study, id, { ...settings, on }));
  return kinds.map((kind) => {
    const own = axes.filter((axis) => axis.kind === kind);
    if (own.length === 0) return { kind, words: names[kind], range: null };
    if (kind === 'motors' || kind === 'background') return { kind, words: names[kind], range: '' };
    const low = Math.min(...own.map((axis) => axis.low));
    const high = Math.max(...own.map((axis) => axis.high));
    return { kind, words: names[kind], range: `${percent(low)} to ${percent(high)} %` };
  });
}

function percent(factor: number): string {
  const value = 100 * (factor - 1);
  return Math.abs(value) < 0.005 ? '0' : `${value > 0 ? '+' : ''}${figure(value, 3)}`;
}
