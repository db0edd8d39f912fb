import type { Source } from '../types.ts';

/** How a motor document forms and limits the harmonic voltage factor √Σ(U_h²/h), U_h per unit of U_N. */
export interface MotorLimit {
  label: string;
  value: number;
  /** Odd orders alone are counted; else even ones too. Multiples of 3 never are. */
  oddOnly: boolean;
  source: Source;
}

const iec: Source = {
  document: 'IEC 60034-1',
  clause: 'harmonic voltage factor (HVF)',
  provenance: 'memory',
};

const designs: Record<'N' | 'general' | 'NEMA', MotorLimit> = {
  N: { label: 'design N', value: 0.03, oddOnly: false, source: iec },
  general: { label: 'three-phase motors other than design N', value: 0.02, oddOnly: false, source: iec },
  NEMA: {
    label: 'NEMA MG 1, no derating',
    value: 0.03,
    oddOnly: true,
    source: { document: 'NEMA MG 1', clause: 'harmonic voltage factor, part 30', provenance: 'memory' },
  },
};

/** The rule of a motor's design; where none is entered, NEMA MG 1 at 60 Hz and IEC's general rule at 50 Hz. */
export function motorLimit(design: string | undefined, frequencyHz: 50 | 60): MotorLimit {
  if (design === 'N' || design === 'general' || design === 'NEMA') return designs[design];
  return frequencyHz === 60 ? designs.NEMA : designs.general;
}
