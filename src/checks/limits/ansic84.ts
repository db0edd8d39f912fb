import type { LimitSet } from './types.ts';

/** Steady voltage for 60 Hz systems: range A, service voltage ±5 %. From memory. */
export const ansiC84x1: LimitSet = {
  id: 'ansi-c84.1',
  label: 'ANSI C84.1 range A',
  document: 'ANSI C84.1',
  edition: '2020',
  note: 'A band for the steady voltage only; it holds no harmonic limits.',
  band: {
    lowPercent: 95,
    highPercent: 105,
    clause: 'Table 1, range A, service voltage',
    provenance: 'memory',
    note: 'Above 600 V the lower service limit of range A is tighter (97.5 %, memory): check it there.',
  },
};
