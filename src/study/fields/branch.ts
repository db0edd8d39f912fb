import type { Field } from './Field.ts';
import { freeRLC, seriesFields } from './partFields.ts';

export const branchFields: readonly Field[] = [...seriesFields, ...freeRLC];
