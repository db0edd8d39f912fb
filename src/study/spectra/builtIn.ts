import type { HarmonicRow, Spectrum } from '../types.ts';

/** How far a built-in spectrum can be trusted: theory (computed from a formula) or a typical table. */
export type SpectrumProvenance = 'theory' | 'published' | 'second-hand' | 'memory';

export interface BuiltInSpectrum extends Spectrum {
  name: string;
  origin: string;
  provenance: SpectrumProvenance;
  /** Where an angle is absent the checks take it as unknown. */
  anglesKnown: boolean;
}

/** Highest order of the ideal spectra before the study's own maxOrder cuts them. */
const highestOrder = 100;

/**
 * Fourier series of a 120° block centred on the fundamental's peak: h = 6k ± 1, 100/h per cent,
 * 180° for h = 6k − 1 and 0° for h = 6k + 1; a pulse number of 12 keeps h = 12k ± 1 of the two bridges.
 */
function idealRows(pulses: 6 | 12): HarmonicRow[] {
  const rows: HarmonicRow[] = [];
  for (let centre = pulses; centre - 1 <= highestOrder; centre += pulses) {
    for (const h of [centre - 1, centre + 1]) {
      if (h <= highestOrder) rows.push({ h, percent: 100 / h, angleDeg: sixPulseAngle(h) });
    }
  }
  return rows;
}

function sixPulseAngle(h: number): number {
  return h % 6 === 5 ? 180 : 0;
}

/** Orders, per cent and degrees against the fundamental current at 0°. */
const industrialDrive: readonly [number, number, number][] = [
  [5, 18.24, -55.68],
  [7, 11.9, -84.11],
  [11, 5.73, -143.56],
  [13, 4.01, -175.58],
  [17, 1.93, 111.39],
  [19, 1.39, 68.3],
];

function magnitudes(percentByOrder: Readonly<Record<number, number>>): HarmonicRow[] {
  return Object.entries(percentByOrder).map(([h, percent]) => ({ h: Number(h), percent }));
}

const overlapTable: readonly [number, Readonly<Record<number, number>>][] = [
  [
    10,
    {
      5: 19.596858911585784,
      7: 13.71446917748608,
      11: 8.204123312778405,
      13: 6.658923525592867,
      17: 4.582574073873976,
      19: 3.845434996454973,
      23: 2.728962221577686,
      25: 2.299435990990737,
    },
  ],
  [
    20,
    {
      5: 18.42320160491252,
      7: 12.105903715803436,
      11: 5.954074584930429,
      13: 4.2235175242095595,
      17: 2.09211582286943,
      19: 1.4975144837381187,
      23: 0.9550907138823685,
      25: 0.8627898032105442,
    },
  ],
  [
    30,
    {
      5: 16.583268655406037,
      7: 9.75752978534247,
      11: 3.418847126242356,
      13: 2.0663361752014215,
      17: 1.257472090749004,
      19: 1.1160017438025398,
      23: 0.7432236361396426,
      25: 0.5785741290563978,
    },
  ],
  [
    40,
    {
      5: 14.24118911770947,
      7: 7.113833185333267,
      11: 2.007228026495327,
      13: 1.6256621491102452,
      17: 1.023999568766003,
      19: 0.7329681123798759,
      23: 0.5431394475989115,
      25: 0.47399893395937076,
    },
  ],
];

/** The rows of h = 11 and 13 at 1, 1.5 and 2 % and most of 5 % are recalled least surely. */
const reactanceTable: readonly [number, Readonly<Record<number, number>>][] = [
  [0.5, { 5: 80, 7: 60, 11: 18, 13: 10, 17: 7.3, 19: 6 }],
  [1, { 5: 60, 7: 37, 11: 12, 13: 8, 17: 5, 19: 4.2 }],
  [1.5, { 5: 51, 7: 28, 11: 10, 13: 6.5, 17: 4, 19: 3.3 }],
  [2, { 5: 46, 7: 22, 11: 9, 13: 6, 17: 3.6, 19: 3 }],
  [3, { 5: 40, 7: 16, 11: 7.3, 13: 4.9, 17: 3, 19: 2.2 }],
  [5, { 5: 32, 7: 12, 11: 5.8, 13: 3.9, 17: 2.2, 19: 1.7 }],
];

/** Spectra that come with the programme. Their ids cannot be redefined by a study. */
export const builtInSpectra: readonly BuiltInSpectrum[] = [
  {
    id: 'six-pulse-ideal',
    name: 'Six-pulse bridge, ideal',
    orders: idealRows(6),
    origin: 'Fourier series of a 120° block: h = 6k ± 1, 100/h %',
    provenance: 'theory',
    anglesKnown: true,
  },
  {
    id: 'twelve-pulse-ideal',
    name: 'Twelve-pulse rectifier, ideal',
    orders: idealRows(12),
    origin: 'two six-pulse bridges shifted by 30°: h = 12k ± 1, 100/h %',
    provenance: 'theory',
    anglesKnown: true,
  },
  ...overlapTable.map(
    ([degrees, percents]): BuiltInSpectrum => ({
      id: `six-pulse-overlap-${degrees}`,
      name: `Six-pulse bridge, overlap ${degrees}°`,
      orders: magnitudes(percents),
      origin: `closed form of line commutation, firing angle 0°, overlap ${degrees}°; orders to 25, angles left open`,
      provenance: 'theory',
      anglesKnown: false,
    }),
  ),
  {
    id: 'six-pulse-typical',
    name: 'Six-pulse converter, typical',
    orders: magnitudes({ 5: 17.5, 7: 11, 11: 4.5, 13: 2.9, 17: 1.5, 19: 1, 23: 0.9, 25: 0.8 }),
    origin: 'IEEE 519-1992, typical six-pulse values; from memory',
    provenance: 'memory',
    anglesKnown: false,
  },
  {
    id: 'six-pulse-drive-angles',
    name: 'Six-pulse drive, with angles',
    orders: industrialDrive.map(([h, percent, angleDeg]) => ({ h, percent, angleDeg })),
    origin: 'drive of the 13-busbar industrial test system, IEEE task force 1999, orders to 19; from memory',
    provenance: 'memory',
    anglesKnown: true,
  },
  ...reactanceTable.map(
    ([percent, percents]): BuiltInSpectrum => ({
      id: `drive-reactance-${percent}`,
      name: `Drive, ${percent} % input reactance`,
      orders: magnitudes(percents),
      origin: `typical diode-bridge drive with ${percent} % total input reactance at full load; from memory`,
      provenance: 'memory',
      anglesKnown: false,
    }),
  ),
  {
    id: 'single-phase-electronics',
    name: 'Single-phase electronics',
    orders: magnitudes({ 3: 81, 5: 60.6, 7: 37, 9: 15.7, 11: 2.4, 13: 6.3, 15: 7.9 }),
    origin: 'typical switched-mode supply without power-factor correction; from memory',
    provenance: 'memory',
    anglesKnown: false,
  },
];

const byId = new Map(builtInSpectra.map((spectrum) => [spectrum.id, spectrum]));

/** The built-in spectrum of that id, or undefined. */
export function builtInSpectrum(id: string): BuiltInSpectrum | undefined {
  return byId.get(id);
}
