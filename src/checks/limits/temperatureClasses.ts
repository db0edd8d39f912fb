import type { Source } from '../types.ts';

/** Highest air temperature beside a capacitor, °C, at any time, as a mean over a day and over a year. */
export interface TemperatureClass {
  highestC: number;
  dayMeanC: number;
  yearMeanC: number;
}

export const temperatureSource: Source = {
  document: 'IEC 60831-1',
  clause: 'temperature categories',
  provenance: 'memory',
};

/** Upper categories of IEC 60831-1 (from memory). */
export const temperatureClasses: Readonly<Record<'A' | 'B' | 'C' | 'D', TemperatureClass>> = {
  A: { highestC: 40, dayMeanC: 30, yearMeanC: 20 },
  B: { highestC: 45, dayMeanC: 35, yearMeanC: 25 },
  C: { highestC: 50, dayMeanC: 40, yearMeanC: 30 },
  D: { highestC: 55, dayMeanC: 45, yearMeanC: 35 },
};
