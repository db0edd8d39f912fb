import { choice, number } from '../fields/build.ts';
import type { ChoiceField, NumberField } from '../fields/Field.ts';
import { driveKinds } from './driveKinds.ts';
import { assumedSite } from './SiteAnswers.ts';
import { siteSystems } from './siteSystems.ts';

/**
 * The fields of the quick start, in the catalogue's own form, so that the same controls read them. A default
 * that follows from other answers stands in figuresOf; every field may be left empty.
 */
export const answerFields = {
  system: choice(
    'system',
    'system',
    'Volts of the main board, frequency, and the volts of the intake above it.',
    siteSystems.map(({ id, label }) => ({ value: id, label })),
    { default: siteSystems[0].id },
  ),
  ratedKVA: number('ratedKVA', 'transformer', 'kVA', 'Rated power on the nameplate: |Z| = u_k/100 · U²/S.', {
    default: assumedSite.ratedKVA,
    min: 25,
    max: 3150,
  }),
  faultLevelMVA: number(
    'faultLevelMVA',
    'fault level',
    'MVA',
    'S_sc of the network at the intake, from the network operator. Empty: 100 and 500 MVA are both judged, the worse governs.',
    { min: 5, max: 10_000 },
  ),
  activeKWh: number('activeKWh', 'active energy', 'kWh', 'E of one bill: P = E/h.', { above: 0 }),
  reactiveKvarh: number('reactiveKvarh', 'reactive energy', 'kvarh', 'E_r of the same bill: tan φ = E_r/E.', {
    min: 0,
  }),
  peakKW: number(
    'peakKW',
    'peak, or hours of use',
    'kW',
    'Highest demand on the bill in kW; or hours of use in h: P = E/h.',
    { above: 0 },
  ),
  hours: number(
    'hours',
    'peak, or hours of use',
    'h',
    'Highest demand on the bill in kW; or hours of use in h: P = E/h.',
    { min: 1, max: 8784 },
  ),
  drivesPercent: number(
    'drivesPercent',
    'share of the load',
    '%',
    'Active power of all drives over that of the site.',
    {
      default: assumedSite.drivesPercent,
      min: 0,
      max: 100,
    },
  ),
  driveKind: choice(
    'driveKind',
    'kind of drives',
    'Decides their spectrum: how much of the 5th and 7th they draw.',
    Object.entries(driveKinds).map(([value, { label }]) => ({ value, label })),
    { default: assumedSite.driveKind },
  ),
  ukPercent: number('ukPercent', 'impedance voltage u_k', '%', '|Z| = u_k/100 · U²/S.', {
    min: 2.5,
    max: 20,
  }),
  targetPF: number('targetPF', 'target cos φ', '', 'Q = P·(tan φ1 − tan φ2).', {
    default: assumedSite.targetPF,
    min: 0.7,
    max: 1,
  }),
} as const satisfies Readonly<Record<string, NumberField | ChoiceField>>;

export type AnswerKey = keyof typeof answerFields;
