import type { Skin } from '../../study/index.ts';
import { type PartLaw, writeInverse } from './PartLaw.ts';
import { skinFactor } from './skinFactor.ts';

export interface SourceImpedance {
  /** |Z1| at the fundamental, ohm. */
  ohm: number;
  xOverR: number;
  z0OverZ1: number;
  neutral: boolean;
  skin: Skin;
}

/** |Z1| = U²/Ssc of a supply, ohm. */
export function supplyOhm(nominalV: number, shortCircuitMVA: number): number {
  return (nominalV * nominalV) / (shortCircuitMVA * 1e6);
}

/** |Z1| = x″d/100·U²/S of a generator, ohm. */
export function generatorOhm(nominalV: number, xdSubtransientPercent: number, ratedKVA: number): number {
  return ((xdSubtransientPercent / 100) * nominalV * nominalV) / (ratedKVA * 1e3);
}

/**
 * Source impedance of a supply or generator: R = |Z1|/√(1 + (X/R)²), X = R·(X/R), Z(h) = R(h) + jhX,
 * Z2 = Z1, Z0 = z0OverZ1·Z1; without a neutral zero sequence is open.
 */
export function sourceLaw(source: SourceImpedance): PartLaw {
  const resistance = source.ohm / Math.sqrt(1 + source.xOverR * source.xOverR);
  const reactance = resistance * source.xOverR;
  const { skin, neutral, z0OverZ1 } = source;
  return (h, out, at) => {
    writeInverse(resistance * skinFactor(h, skin), h * reactance, out, at + 2);
    out[at] = neutral ? (out[at + 2] as number) / z0OverZ1 : 0;
    out[at + 1] = neutral ? (out[at + 3] as number) / z0OverZ1 : 0;
  };
}
