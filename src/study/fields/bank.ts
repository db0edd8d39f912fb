import { boolean, choice, group, integer, list, number, opaque, pair } from './build.ts';
import type { Field } from './Field.ts';
import { lossWPerKvar, shuntFields, skin, starDelta } from './partFields.ts';

export const controllerFields: readonly Field[] = [
  number('kCT', 'current transformer ratio', '', 'k_CT = I_primary/I_secondary, e.g. 1500/5 = 300.', {
    above: 0,
  }),
  number('threshold', 'response threshold C/k', 'A', 'Secondary amperes; about 0.65·Q_step/(√3·U·k_CT).', {
    above: 0,
  }),
  number('connectDelayS', 'connection delay', 's', 'Between a demand and the step going in.', { min: 0 }),
  number('reconnectDelayS', 'reconnection delay', 's', 'A step stays out so long that it has discharged.', {
    min: 0,
  }),
];

export const stepFields: readonly Field[] = [
  number('kvar', 'rated kvar', 'kvar', 'At the rated voltage of the bank.', {
    required: true,
    above: 0,
    typical: '6.25, 12.5, 25, 50 kvar',
  }),
  boolean('on', 'switched in', 'A step that is off takes no part in the solution.', { default: true }),
];

export const bankFields: readonly Field[] = [
  ...shuntFields,
  list('steps', 'steps', 'steps', 'Q_N = Σ kvar of the steps that are on; X_c = U_N²/Q_N.', {
    required: true,
  }),
  number(
    'ratedV',
    'rated voltage of the capacitors',
    'V',
    'X_c = U_N²/Q_N; Q at the busbar = Q_N·(U/U_N)²/(1 − p).',
    { required: true, above: 0 },
  ),
  number('detuningPercent', 'detuning p', '%', 'X_L = p·X_c; tuned order 1/√p.', {
    default: 0,
    min: 0,
    below: 100,
    usual: '0, 5.67, 7, 14',
    typical: '0 plain, 5.67 %, 7 %, 14 %',
  }),
  number('reactorQ', 'reactor quality X_L/R_L', '', 'R_L = X_L/Q at the nominal frequency.', {
    default: 50,
    above: 0,
    rare: true,
  }),
  skin(0, 1, 'reactorSkin'),
  lossWPerKvar,
  starDelta,
  pair(
    'tolerance',
    'tolerancePercent',
    'capacitance tolerance',
    'Searched by the tolerance run; no part in the solution.',
    {
      default: [-5, 10],
      rare: true,
    },
  ),
  pair(
    'tolerance',
    'reactorTolerancePercent',
    'reactor tolerance',
    'Searched by the tolerance run; no part in the solution.',
    {
      default: [-3, 3],
      rare: true,
    },
  ),
  number('ageingPercent', 'capacitance lost by ageing', '%', 'n_max = n/√((1 − t_L)(1 − t_C)(1 − ageing)).', {
    min: 0,
    below: 100,
    rare: true,
    usual: '5',
    typical: '5 % (common practice)',
  }),
  number('ratedReactorA', 'rated reactor current, rms', 'A', 'Judged by the reactor-duty check.', {
    above: 0,
    rare: true,
  }),
  number('reactorLinearA', 'reactor linear up to', 'A', '(I1 + ΣI_h) against the linear range.', {
    above: 0,
    rare: true,
  }),
  number('dischargeOhm', 'discharge resistor', 'Ω', 'R ≤ t/(C·ln(√2·U_N/U_r)).', { above: 0, rare: true }),
  number('switchMakingA', 'making current of the switch, peak', 'A', 'Inrush peak against the switch.', {
    above: 0,
    rare: true,
  }),
  integer(
    'unitsPerPhase',
    'capacitor units in parallel',
    '',
    'Per phase (star) or branch (delta); one out leaves (n − 1)/n there. Left out: one a step.',
    { min: 1, rare: true },
  ),
  choice(
    'temperatureClass',
    'temperature class of the capacitors',
    'Highest air by IEC 60831-1: A 40, B 45, C 50, D 55 °C.',
    [
      { value: 'A', label: 'A, 40 °C' },
      { value: 'B', label: 'B, 45 °C' },
      { value: 'C', label: 'C, 50 °C' },
      { value: 'D', label: 'D, 55 °C' },
    ],
    { rare: true },
  ),
  number('cubicleAirC', 'hottest air in the cubicle', '°C', 'With all steps on, on the hottest day.', {
    min: -40,
    max: 120,
    rare: true,
  }),
  group('controller', 'controller', 'Settings of the power-factor regulator.', controllerFields),
  opaque('regulator', 'regulator', 'Settings of the stepped-bank run.'),
];
