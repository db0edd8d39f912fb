/** Usual rated voltages of capacitors up to 1000 V: common practice, from memory. */
const usualVolts: readonly number[] = [
  240, 260, 280, 400, 415, 440, 460, 480, 500, 525, 550, 600, 660, 690, 720, 760, 800, 830, 900, 1000,
];

/** The supply stands a tenth above nominal at its highest (EN 50160, second-hand). */
const highestSupply = 1.1;

/** A rating this little below what is needed is still taken: 525 V on 480 V systems. */
const rounding = 0.99;

/**
 * Rated voltage in V of capacitors at a busbar of `nominalV` behind a reactor that raises their voltage by
 * `rise` (1/(1 − p), or n²/(n² − 1) of a filter): the next usual one above 1.1·U·rise, above 1000 V the next
 * hundred.
 */
export function typicalCapacitorV(nominalV: number, rise = 1): number {
  const needed = highestSupply * nominalV * rise;
  return usualVolts.find((volts) => volts >= rounding * needed) ?? 100 * Math.ceil((rounding * needed) / 100);
}

/** In one sentence where that voltage comes from. */
export function capacitorVoltsSource(raised: string): string {
  return `next usual rated voltage above ${raised} with the supply at +10 % (common practice)`;
}
