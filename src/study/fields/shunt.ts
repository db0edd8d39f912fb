import { boolean } from './build.ts';
import type { Field } from './Field.ts';
import { freeRLC, neutralUpTo1000V, shuntFields } from './partFields.ts';

export const shuntPartFields: readonly Field[] = [
  ...shuntFields,
  ...freeRLC,
  boolean('neutral', 'star point on the neutral', 'y0 = y1 with a neutral, otherwise 0.', {
    defaultFor: neutralUpTo1000V,
    rare: true,
    typical: 'with a neutral up to 1000 V',
  }),
];
