import { number } from './build.ts';
import type { Field } from './Field.ts';
import { seriesFields, skin } from './partFields.ts';

export const reactorFields: readonly Field[] = [
  ...seriesFields,
  number('inductanceMH', 'inductance', 'mH', 'Z = R(h) + jhω_n L, the same in all sequences.', {
    required: true,
    above: 0,
  }),
  number('resistanceOhm', 'resistance', 'Ω', 'Z = R(h) + jhω_n L.', { default: 0, min: 0 }),
  skin(0, 1),
];
