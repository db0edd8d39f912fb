import { ansiC84x1 } from './ansic84.ts';
import { iec60831x1, iec60871x1, ieee18 } from './capacitorSets.ts';
import { en50160 } from './en50160.ts';
import { iec61000x2x2, iec61000x2x12 } from './iec61000-2-2.ts';
import { iec61000x2x4 } from './iec61000-2-4.ts';
import { iec61000x3x6 } from './iec61000-3-6.ts';
import { ieee519 } from './ieee519.ts';
import type { LimitSet } from './types.ts';

/** Every shipped document, in the order a choice shows them. */
export const limitSets: readonly LimitSet[] = [
  en50160,
  iec61000x2x2,
  iec61000x2x12,
  ...iec61000x2x4,
  iec61000x3x6,
  ...ieee519,
  ansiC84x1,
  iec60831x1,
  iec60871x1,
  ieee18,
];

/** The set of this id, or undefined where no such set is shipped. */
export function limitSet(id: string): LimitSet | undefined {
  return limitSets.find((set) => set.id === id);
}

/** The four choices a study holds in `limits`. */
export type LimitUse = 'pcc' | 'internal' | 'current' | 'capacitor';

/** The sets that can serve a choice, with the words a list shows. */
export function limitChoices(use: LimitUse): { id: string; label: string }[] {
  const serves = (set: LimitSet): boolean => {
    if (use === 'current') return set.current !== undefined;
    if (use === 'capacitor') return set.capacitor !== undefined;
    return set.voltage !== undefined || set.band !== undefined;
  };
  return limitSets.filter(serves).map(({ id, label }) => ({ id, label }));
}
