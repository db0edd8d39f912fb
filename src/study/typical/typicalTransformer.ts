import { formatNumber } from '../units/formatQuantity.ts';
import { impedanceSource, impedanceVoltages } from './impedanceVoltages.ts';
import { interpolate, isWithin, rangeOf } from './interpolate.ts';
import { type Typical, typicalOrigin } from './Typical.ts';
import { dryLosses, liquidLosses, lossSource } from './transformerLosses.ts';

export interface TransformerChoice {
  /** Tier 1 from July 2015, tier 2 from July 2021; 2 where not said. */
  tier?: 1 | 2;
  /** 'liquid' where not said. */
  filling?: 'liquid' | 'dry';
  frequencyHz?: 50 | 60;
  /** Rated volts, where known: the tables end at 24 kV and 1.1 kV. */
  hvV?: number;
  lvV?: number;
}

export interface TransformerValues {
  ukPercent: number;
  loadLossKW: number;
  noLoadLossKW: number;
  noLoadCurrentPercent: number;
}

const noLoadCurrent = {
  percent: 0.6,
  source: 'common practice, 0.3 to 1 % of the rated current for cores of today',
};

/**
 * Impedance voltage u_k in %, losses P_k and P_0 in kW and no-load current i_0 in % by rated kVA, for
 * medium to low voltage (U_m ≤ 24 kV / 1.1 kV). Losses are the highest allowed, linear between ratings;
 * u_k is the smallest recognised one (IEC 60076-5), the nameplate may be higher. Refuses ratings outside
 * the table with its range.
 */
export function typicalTransformer(kVA: number, choice: TransformerChoice = {}): Typical<TransformerValues> {
  const { tier = 2, filling = 'liquid', frequencyHz = 50 } = choice;
  const table = filling === 'liquid' ? liquidLosses : dryLosses;
  const kind = filling === 'liquid' ? 'liquid-filled' : 'dry-type';
  if ((choice.hvV ?? 0) > 24_000 || (choice.lvV ?? 0) > 1100)
    return {
      ok: false,
      error: `${lossSource} is read here for windings up to 24 kV and 1.1 kV; this one stands outside.`,
    };
  const ukPercent = typicalImpedance(kVA);
  if (!isWithin(table, kVA) || ukPercent === undefined) {
    const [low, high] = rangeOf(table);
    const asked = Number.isFinite(kVA) ? `${formatNumber(kVA)} kVA` : 'this rating';
    return {
      ok: false,
      error: `There is no ${kind} transformer of ${asked} in ${lossSource}; allowed is ${low} to ${formatNumber(high)} kVA.`,
    };
  }
  const between = table.some((row) => row[0] === kVA) ? '' : ', linear between ratings';
  const hertz = frequencyHz === 60 ? '; values for 50 Hz, taken for 60 Hz' : '';
  const lossWords = `${lossSource}, ${kind}, tier ${tier}, highest allowed${between}${hertz}`;
  return {
    ok: true,
    values: {
      ukPercent,
      loadLossKW: kilo(interpolate(table, tier === 1 ? 1 : 3, kVA)),
      noLoadLossKW: kilo(interpolate(table, tier === 1 ? 2 : 4, kVA)),
      noLoadCurrentPercent: noLoadCurrent.percent,
    },
    origins: {
      ukPercent: typicalOrigin(impedanceSource),
      loadLossKW: typicalOrigin(lossWords),
      noLoadLossKW: typicalOrigin(lossWords),
      noLoadCurrentPercent: typicalOrigin(noLoadCurrent.source),
    },
    source: `Losses: ${lossWords}. u_k: ${impedanceSource}. i_0: ${noLoadCurrent.source}.`,
  };
}

/** u_k in % of IEC 60076-5, Table 1 (from memory) by rated kVA, or undefined outside 25 to 100 000 kVA. */
function typicalImpedance(kVA: number): number | undefined {
  return kVA >= 25 ? impedanceVoltages.find(([upTo]) => kVA <= upTo)?.[1] : undefined;
}

/** W to kW, to the watt's tenth. */
function kilo(watts: number): number {
  return Math.round(watts * 10) / 10_000;
}
