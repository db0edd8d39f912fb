import type { HarmonicRow } from '../types.ts';

/** What a site's drives are like as a whole: displacement power factor and spectrum. */
export interface DriveKindData {
  label: string;
  /** cos φ1 of the bridge. */
  powerFactor: number;
  /** A built-in spectrum, or rows with the words that say where they come from. */
  spectrum: string | { rows: readonly HarmonicRow[]; origin: string };
  /** Whether the drives count as harmonic loads in the screening for plain or detuned. */
  harmonic: boolean;
}

const practice = 'common practice';

/** THD 4 %, inside the 3 to 5 % makers state for active front ends. */
const lowHarmonicRows: readonly HarmonicRow[] = [
  { h: 5, percent: 3 },
  { h: 7, percent: 2 },
  { h: 11, percent: 1.5 },
  { h: 13, percent: 1 },
];

export const driveKinds = {
  'no-choke': {
    label: 'without chokes',
    powerFactor: 0.95,
    spectrum: 'drive-reactance-1',
    harmonic: true,
  },
  choke: {
    label: 'with chokes, 3 %',
    powerFactor: 0.96,
    spectrum: 'drive-reactance-3',
    harmonic: true,
  },
  'low-harmonic': {
    label: 'low-harmonic',
    powerFactor: 0.99,
    spectrum: { rows: lowHarmonicRows, origin: `active front end, THD(I) 4 %: ${practice}, 3 to 5 %` },
    harmonic: false,
  },
} as const satisfies Readonly<Record<string, DriveKindData>>;

export type DriveKind = keyof typeof driveKinds;
