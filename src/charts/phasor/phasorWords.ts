import { type PhaseNames, phaseLabelSets } from '../../study/index.ts';
import { ampereParts, fixedNumber, joinParts, voltParts } from '../figure/quantityParts.ts';
import { angleDeg, magnitude, type ThreePhasors } from './phasorSpectrum.ts';

export type { PhaseNames };

export const PHASE_NAMES: PhaseNames = phaseLabelSets.L123;

/** All phasors in words: "fundamental: L1 230 V at 0°, 18.5 A at −34°; …". */
export function phasorSummary(
  voltage: ThreePhasors | null,
  current: ThreePhasors | null,
  order: number,
  names: PhaseNames = PHASE_NAMES,
): string {
  const phases = names.map((name, k) => {
    const parts = [
      voltage?.[k] &&
        `${joinParts(voltParts(magnitude(voltage[k])))} at ${fixedNumber(angleDeg(voltage[k]), 0)}°`,
      current?.[k] &&
        `${joinParts(ampereParts(magnitude(current[k])))} at ${fixedNumber(angleDeg(current[k]), 0)}°`,
    ];
    return `${name} ${parts.filter(Boolean).join(', ')}`;
  });
  return `Phasors, ${order === 1 ? 'fundamental' : `order ${order}`}: ${phases.join('; ')}`;
}
