import { choice, integer, number } from './build.ts';
import type { Field } from './Field.ts';
import { shuntFields } from './partFields.ts';

export const motorFields: readonly Field[] = [
  ...shuntFields,
  number('ratedKW', 'rated shaft power, each', 'kW', 'P = P_N · number of motors · (load/100)/η.', {
    required: true,
    above: 0,
  }),
  integer('count', 'number of motors', '', 'P = P_N · number of motors · (load/100)/η.', {
    default: 1,
    min: 1,
  }),
  number('loadPercent', 'load', '%', 'P = P_N · number of motors · (load/100)/η.', {
    default: 75,
    min: 0,
    max: 200,
    usual: '50…90',
    typical: '50 to 90 % (common practice)',
  }),
  number('powerFactor', 'power factor cos φ', '', 'Q = P·tan(arccos cos φ), lagging.', {
    default: 0.85,
    above: 0,
    max: 1,
    usual: '0.8…0.9',
    typical: '0.8 to 0.9 near rated load, lower below half (common practice)',
  }),
  number('efficiency', 'efficiency η', '', 'P = P_N · number of motors · (load/100)/η.', {
    default: 0.94,
    above: 0,
    max: 1,
    usual: '0.90…0.96',
    typical: '0.90 to 0.96 from 11 to 200 kW (Regulation (EU) 2019/1781, IE3)',
  }),
  number(
    'lockedRotorRatio',
    'starting current ratio I_A/I_N',
    '',
    '|Z_lr| = U²/(S·ratio); Z(h) = R·√h + jhX.',
    {
      default: 6,
      above: 0,
      max: 20,
      rare: true,
      usual: '5…8',
      typical: '5 to 8 (common practice)',
    },
  ),
  number('lockedRotorPowerFactor', 'locked-rotor power factor', '', 'R = |Z_lr|·pf, X = √(|Z_lr|² − R²).', {
    default: 0.3,
    above: 0,
    max: 1,
    rare: true,
  }),
  number('noLoadCurrentRatio', 'no-load current ratio I_0/I_N', '', 'Self-excitation: Q_c ≤ 0.9·√3·U·I_0.', {
    default: 0.35,
    above: 0,
    max: 1,
    usual: '0.25…0.5',
    rare: true,
    typical: '0.25 to 0.5, larger for small and slow motors (common practice)',
  }),
  choice(
    'voltageFactorDesign',
    'harmonic voltage factor',
    'HVF = √Σ(U_h²/h) against the limit of the design (IEC 60034-1, from memory).',
    [
      { value: 'N', label: 'design N, 0.03' },
      { value: 'general', label: 'other three-phase, 0.02' },
      { value: 'NEMA', label: 'NEMA MG 1, odd orders, 0.03' },
    ],
    { rare: true },
  ),
];
