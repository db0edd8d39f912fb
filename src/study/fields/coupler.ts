import { number } from './build.ts';
import type { Field } from './Field.ts';
import { seriesFields } from './partFields.ts';

export const couplerFields: readonly Field[] = [
  ...seriesFields,
  number('resistanceMOhm', 'resistance', 'mΩ', 'Z = R + jhX; closed when in service.', {
    default: 0.02,
    min: 0,
    rare: true,
  }),
  number('reactanceMOhm', 'reactance', 'mΩ', 'Z = R + jhX; closed when in service.', {
    default: 0.1,
    min: 0,
    rare: true,
  }),
];
