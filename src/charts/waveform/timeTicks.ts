/** Marks under a waveform: round milliseconds and every quarter turn. */
export interface TimeTick {
  /** Share of the drawn stretch, 0…1. */
  share: number;
  label: string;
}

const MS_STEPS = [1, 2, 2.5, 4, 5, 10, 20];

/** Milliseconds at round steps, at most `most` labels over the stretch. */
export function millisecondTicks(frequencyHz: number, periods: number, most: number): TimeTick[] {
  const stretch = (1000 / frequencyHz) * periods;
  const step = MS_STEPS.find((one) => stretch / one <= most) ?? 20;
  const count = Math.floor(stretch / step + 1e-9);
  return Array.from({ length: count + 1 }, (_, i) => ({
    share: (i * step) / stretch,
    label: String(i * step),
  }));
}

/** Degrees of the fundamental every 90° (180° where there is little room). */
export function degreeTicks(periods: number, most: number): TimeTick[] {
  const stretch = 360 * periods;
  const step = [90, 180, 360].find((one) => stretch / one <= most) ?? 360;
  return Array.from({ length: stretch / step + 1 }, (_, i) => ({
    share: (i * step) / stretch,
    label: `${i * step}°`,
  }));
}
