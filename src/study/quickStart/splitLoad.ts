import { typicalTransformer } from '../typical/typicalTransformer.ts';
import { driveKinds } from './driveKinds.ts';
import { type SiteFigures, tanOf } from './SiteAnswers.ts';

export interface Share {
  kW: number;
  /** Lagging. */
  kvar: number;
}

/** The site's load below its transformer, in three lumps. */
export interface LoadShares {
  /** What the transformer itself takes of the power at the intake. */
  transformer: Share;
  drives: Share;
  motors: Share;
  /** Heating and lighting, cos φ 1. */
  others: Share;
}

/** Usual cos φ of motors as they run, part-loaded: common practice. */
const motorPF = 0.8;
/** No group of motors runs below this; what the bill shows beyond it is laid on the drives. */
const lowestMotorPF = 0.5;

/**
 * Splits P and Q of the intake so that the drawn site draws the bill's power again:
 *
 *   transformer  P = P_0 + P_k·β², Q = S·(i_0 + u_x·β²), β = load/S, u_x = √(u_k² − (P_k/S)²)
 *   drives       their share of the rest, at the cos φ of their kind or better where the bill is better
 *   motors       the kvar that are left, at cos φ 0.80; at a lower one where the kW do not suffice
 *   others       the kW that are left, at cos φ 1
 */
export function splitLoad(figures: SiteFigures): LoadShares {
  const transformer = transformerShare(figures);
  const kW = figures.kW - transformer.kW;
  const kvar = Math.max(0, figures.kvar - transformer.kvar);
  const drivesKW = (kW * figures.drivesPercent) / 100;
  const restKW = kW - drivesKW;
  const usual = drivesKW * tanOf(driveKinds[figures.driveKind].powerFactor);
  const atMost = (kvar * figures.drivesPercent) / 100;
  const atLeast = kvar - restKW * tanOf(lowestMotorPF);
  const drivesKvar = Math.max(Math.min(usual, atMost), atLeast, 0);
  const restKvar = kvar - drivesKvar;
  const motorsKW = Math.min(restKW, restKvar / tanOf(motorPF));
  return {
    transformer,
    drives: { kW: drivesKW, kvar: drivesKvar },
    motors: { kW: motorsKW, kvar: restKvar },
    others: { kW: restKW - motorsKW, kvar: 0 },
  };
}

/** Loss and kvar of the transformer at the intake's load, by the usual formula with the voltage at 1. */
function transformerShare({ ratedKVA, ukPercent, kW, kvar }: SiteFigures): Share {
  const typical = typicalTransformer(ratedKVA);
  if (!typical.ok) throw new RangeError(typical.error);
  const { loadLossKW, noLoadLossKW, noLoadCurrentPercent } = typical.values;
  const loading2 = (kW ** 2 + kvar ** 2) / ratedKVA ** 2;
  const ux = Math.sqrt(Math.max(0, (ukPercent / 100) ** 2 - (loadLossKW / ratedKVA) ** 2));
  return {
    kW: noLoadLossKW + loadLossKW * loading2,
    kvar: ratedKVA * (noLoadCurrentPercent / 100 + ux * loading2),
  };
}
