/** IEC 60076-5:2006, Table 1: recognised minimum short-circuit impedance of two-winding transformers; from memory. */
export const impedanceSource = 'IEC 60076-5:2006, Table 1, minimum, from memory';

/** Rated power up to this many kVA, then u_k in %. */
export const impedanceVoltages: readonly (readonly [upToKVA: number, ukPercent: number])[] = [
  [630, 4],
  [1250, 5],
  [2500, 6],
  [6300, 7],
  [25_000, 8],
  [40_000, 10],
  [63_000, 11],
  [100_000, 12.5],
];
