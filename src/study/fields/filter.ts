import { choice, number } from './build.ts';
import type { Field } from './Field.ts';
import { lossWPerKvar, shuntFields, starDelta } from './partFields.ts';

export const filterFields: readonly Field[] = [
  ...shuntFields,
  choice(
    'type',
    'filter type',
    'Single-tuned: series L-C. High-pass: R across L. C-type: no fundamental current in R.',
    [
      { value: 'single-tuned', label: 'single-tuned' },
      { value: 'high-pass', label: 'high-pass, second order' },
      { value: 'c-type', label: 'C-type' },
    ],
    { required: true },
  ),
  number('kvar', 'net kvar at the busbar', 'kvar', 'X_c = U²/Q·n²/(n² − 1); C-type X_c1 = U²/Q.', {
    required: true,
    above: 0,
  }),
  number('tunedOrder', 'tuned order n', '', 'X_L = X_c/n²; C-type X_c1/(n² − 1).', {
    required: true,
    above: 1,
    usual: '4.7 for the 5th',
    typical: '4.7 to 4.8 for the 5th',
  }),
  number('qFactor', 'quality q', '', 'Single-tuned R = n·X_L/q; high-pass and C-type R = q·n·X_L.', {
    required: true,
    above: 0,
    usual: '30…80',
    typical: '30 to 80 single-tuned, 0.5 to 5 high-pass',
  }),
  number('ratedV', 'rated voltage of the capacitors', 'V', 'Rating only: judged by the duty checks.', {
    required: true,
    above: 0,
  }),
  lossWPerKvar,
  starDelta,
];
