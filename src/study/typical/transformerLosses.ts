/** Rated kVA, then load loss P_k and no-load loss P_0 in W of tier 1 and of tier 2. */
export type LossRow = readonly [kVA: number, pk1: number, p01: number, pk2: number, p02: number];

/** Regulation (EU) 548/2014, Annex I; tier 1 from 1 July 2015, tier 2 from 1 July 2021. Read in its full text. */
export const lossSource = 'Regulation (EU) 548/2014, Annex I';

/** Table I.1: three-phase, liquid-filled, one winding with U_m ≤ 24 kV, the other with U_m ≤ 1.1 kV, 50 Hz. */
export const liquidLosses: readonly LossRow[] = [
  [25, 900, 70, 600, 63],
  [50, 1100, 90, 750, 81],
  [100, 1750, 145, 1250, 130],
  [160, 2350, 210, 1750, 189],
  [250, 3250, 300, 2350, 270],
  [315, 3900, 360, 2800, 324],
  [400, 4600, 430, 3250, 387],
  [500, 5500, 510, 3900, 459],
  [630, 6500, 600, 4600, 540],
  [800, 8400, 650, 6000, 585],
  [1000, 10500, 770, 7600, 693],
  [1250, 11000, 950, 9500, 855],
  [1600, 14000, 1200, 12000, 1080],
  [2000, 18000, 1450, 15000, 1305],
  [2500, 22000, 1750, 18500, 1575],
  [3150, 27500, 2200, 23000, 1980],
];

/** Table I.2: the same of dry-type transformers. */
export const dryLosses: readonly LossRow[] = [
  [50, 1700, 200, 1500, 180],
  [100, 2050, 280, 1800, 252],
  [160, 2900, 400, 2600, 360],
  [250, 3800, 520, 3400, 468],
  [400, 5500, 750, 4500, 675],
  [630, 7600, 1100, 7100, 990],
  [800, 8000, 1300, 8000, 1170],
  [1000, 9000, 1550, 9000, 1395],
  [1250, 11000, 1800, 11000, 1620],
  [1600, 13000, 2200, 13000, 1980],
  [2000, 16000, 2600, 16000, 2340],
  [2500, 19000, 3100, 19000, 2790],
  [3150, 22000, 3800, 22000, 3420],
];
