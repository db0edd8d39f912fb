/** What IEEE C57.110 needs of a load current spectrum. */
export interface HarmonicLoss {
  /** Σ (I_h/I)²·h² / Σ (I_h/I)². */
  lossFactor: number;
  /** K = Σ h²·(I_h/I_R)², I_R the rated rms current (UL 1561). */
  kFactor: number;
  rmsA: number;
}

/** F_HL and K factor of amperes[h − 1] at orders 1…n; ratedA > 0. null without current. */
export function harmonicLoss(amperes: ArrayLike<number>, ratedA: number): HarmonicLoss | null {
  if (!(ratedA > 0)) throw new RangeError(`rated current ${ratedA} A: above 0 is needed`);
  let squares = 0;
  let weighted = 0;
  for (let h = 1; h <= amperes.length; h++) {
    const square = (amperes[h - 1] ?? 0) ** 2;
    squares += square;
    weighted += h * h * square;
  }
  if (squares === 0) return null;
  return { lossFactor: weighted / squares, kFactor: weighted / ratedA ** 2, rmsA: Math.sqrt(squares) };
}

/**
 * Permissible rms load, per unit of rated: √((1 + P_EC)/(1 + F_HL·P_EC)), other stray losses left out.
 * P_EC per unit of the I²R loss at rated current. IEEE C57.110 (equation second-hand).
 */
export function permissibleLoad(lossFactor: number, eddyLossShare: number): number {
  if (!(lossFactor >= 1 - 1e-9)) throw new RangeError(`F_HL ${lossFactor}: at least 1 is possible`);
  if (!(eddyLossShare >= 0)) throw new RangeError(`P_EC-R ${eddyLossShare}: zero or more is allowed`);
  return Math.sqrt((1 + eddyLossShare) / (1 + lossFactor * eddyLossShare));
}
