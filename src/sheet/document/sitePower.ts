import type { CaseSolution } from '../../engine/index.ts';
import { elementById, type Study } from '../../study/index.ts';
import { significant } from './formatNumber.ts';
import { readTerminal } from './readings.ts';

/** What the sources deliver to the site at the fundamental. */
export interface SitePower {
  kW: number;
  kvar: number;
  /** P/√(P² + Q²), unsigned; absent where the site draws nothing. */
  cosPhi?: number;
}

/** P and Q of all supplies and generators together, positive into the site; undefined without a source. */
export function sitePower(study: Study, solution: CaseSolution): SitePower | undefined {
  const sources = solution.terminals.flatMap(({ element }, index) => {
    const kind = elementById(study, element)?.kind;
    return kind === 'supply' || kind === 'generator' ? [index] : [];
  });
  if (!solution.converged || sources.length === 0) return undefined;
  const readings = sources.map((index) => readTerminal(solution, index));
  const kW = -readings.reduce((sum, reading) => sum + reading.kW, 0);
  const kvar = -readings.reduce((sum, reading) => sum + reading.kvar, 0);
  const kVA = Math.hypot(kW, kvar);
  return kVA < 1e-9 ? { kW, kvar } : { kW, kvar, cosPhi: Math.abs(kW) / kVA };
}

/**
 * Lagging or leading in words, from powers with load sign: kvar > 0 is inductive. Feeding in is said,
 * as "lagging" has no meaning there without a convention.
 */
export function senseOf(kW: number, kvar: number): string {
  const kVA = Math.hypot(kW, kvar);
  if (kVA === 0) return 'idle';
  const reactive = kvar > 0 ? 'absorbs kvar' : 'delivers kvar';
  if (Math.abs(kW) < 0.02 * kVA) return kvar > 0 ? 'inductive' : 'capacitive';
  if (Math.abs(kvar) < 0.002 * kVA) return kW < 0 ? 'feeds in' : 'unity';
  if (kW < 0) return `feeds in, ${reactive}`;
  return kvar > 0 ? 'lagging' : 'leading';
}

/** e.g. "cos φ 0.970 lagging". */
export function cosPhiInWords(power: SitePower): string {
  if (power.cosPhi === undefined) return 'no power drawn';
  return `cos φ ${significant(power.cosPhi, 3)} ${senseOf(power.kW, power.kvar)}`;
}
