import { boolean, choice, number } from './build.ts';
import type { Field } from './Field.ts';
import { connection, leading, neutralUpTo1000V, shuntFields } from './partFields.ts';

export const loadFields: readonly Field[] = [
  ...shuntFields,
  number('kW', 'active power, total', 'kW', 'P of all phases together.', { required: true, min: 0 }),
  number('powerFactor', 'power factor cos φ', '', 'Q = P·tan(arccos cos φ), lagging unless said otherwise.', {
    required: true,
    above: 0,
    max: 1,
    usual: '0.7…0.98',
    typical: '0.7 to 0.98',
  }),
  leading('Q turns negative: the load gives kvar.'),
  choice(
    'model',
    'behaviour with voltage',
    'Constant power P + jQ, or constant impedance from the nominal voltage; harmonics see G ∥ jB either way.',
    [
      { value: 'power', label: 'constant power' },
      { value: 'impedance', label: 'constant impedance' },
    ],
    { default: 'power', rare: true },
  ),
  connection,
  boolean(
    'neutral',
    'with neutral',
    'Three-phase only: y0 = y1 with a neutral, otherwise a three-wire load.',
    {
      defaultFor: neutralUpTo1000V,
      rare: true,
      typical: 'with a neutral up to 1000 V',
    },
  ),
];
