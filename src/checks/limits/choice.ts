import type { Bank, Study } from '../../study/index.ts';
import { ansiC84x1 } from './ansic84.ts';
import { en50160 } from './en50160.ts';
import { limitSet } from './limitSets.ts';
import type { LimitSet } from './types.ts';

/** A chosen set, or the words that say why there is none. */
export type Choice = { set: LimitSet } | { missing: string };

function byId(id: string): Choice {
  const set = limitSet(id);
  return set ? { set } : { missing: `the limit set "${id}" is not known` };
}

/** The id that judges PCC busbars where the study names none: EN 50160 at 50 Hz, IEEE 519-2022 at 60 Hz. */
export function defaultPccSet(frequencyHz: 50 | 60): string {
  return frequencyHz === 60 ? 'ieee-519-2022' : 'en-50160';
}

/** Harmonic voltage set of a busbar: limits.pcc at the PCC, limits.internal elsewhere. */
export function voltageSetFor(study: Study, isPcc: boolean): Choice {
  return isPcc
    ? byId(study.limits?.pcc ?? defaultPccSet(study.frequencyHz))
    : byId(study.limits?.internal ?? 'iec-61000-2-4-class-2');
}

/**
 * Steady voltage band: ANSI C84.1 range A ±5 % at 60 Hz; at 50 Hz the study's own choice where that document
 * states one, else EN 50160 ±10 %. A harmonic set chosen at 60 Hz does not bring the band of 50 Hz systems.
 */
export function bandSetFor(study: Study, isPcc: boolean): LimitSet {
  if (study.frequencyHz === 60) return ansiC84x1;
  const chosen = isPcc ? study.limits?.pcc : study.limits?.internal;
  const set = chosen === undefined ? undefined : limitSet(chosen);
  if (set?.band) return set;
  return en50160;
}

/** Current set at the PCC: the study's choice, IEEE 519-2022 at 60 Hz; none by default at 50 Hz. */
export function currentSetFor(study: Study): Choice {
  const chosen = study.limits?.current;
  if (chosen !== undefined) return byId(chosen);
  if (study.frequencyHz === 60) return byId('ieee-519-2022');
  return {
    missing:
      'no current limit set is chosen; at 50 Hz the network operator states the emission limits (choose IEEE 519 to compare)',
  };
}

/** Capacitor set: the study's choice, IEEE 18 at 60 Hz, else IEC 60831-1 up to 1 kV and IEC 60871-1 above. */
export function capacitorSetFor(study: Study, capacitor: Pick<Bank, 'ratedV'>): Choice {
  const chosen = study.limits?.capacitor;
  if (chosen !== undefined) return byId(chosen);
  if (study.frequencyHz === 60) return byId('ieee-18');
  return byId(capacitor.ratedV <= 1000 ? 'iec-60831-1' : 'iec-60871-1');
}
