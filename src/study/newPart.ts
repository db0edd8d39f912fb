import type { ElementKind, ElementOf } from './types.ts';
import { typicalCapacitorV } from './typical/typicalCapacitor.ts';

/** Transformer loss at rated load in kW by rated kVA: Regulation (EU) 548/2014, Annex I, tier 2, liquid-filled. */
const loadLossKW: readonly [number, number][] = [
  [100, 1.25],
  [160, 1.75],
  [250, 2.35],
  [400, 3.25],
  [630, 4.6],
  [1000, 7.6],
  [1600, 12],
  [2500, 18.5],
];

/** Where a part is put: line-to-line volts at its (upper) busbar, nominal frequency, volts below if known. */
export interface PartPlace {
  nominalV: number;
  frequencyHz: 50 | 60;
  lowerV?: number | undefined;
}

type Values<K extends ElementKind> = Omit<ElementOf<K>, 'id' | 'kind' | 'name' | 'bus' | 'from' | 'to'>;

const isLow = (place: PartPlace) => place.nominalV <= 1000;

/** Volts below a transformer: 400 V or 480 V under medium voltage, the next system below otherwise. */
function lowerVolts({ nominalV, frequencyHz, lowerV }: PartPlace): number {
  if (lowerV !== undefined) return lowerV;
  if (nominalV > 1000) return frequencyHz === 60 ? 480 : 400;
  if (frequencyHz === 60) return nominalV > 208 ? 208 : 120;
  return nominalV > 400 ? 400 : 230;
}

/** Inductance in mH of a share of the base impedance U²/S at the nominal frequency, three digits. */
function shareOfBaseMH(place: PartPlace, share: number, kVA: number): number {
  const ohm = (share * place.nominalV ** 2) / (kVA * 1000);
  return Number(((1000 * ohm) / (2 * Math.PI * place.frequencyHz)).toPrecision(3));
}

function transformer(place: PartPlace): Values<'transformer'> {
  const ratedKVA = isLow(place) ? 100 : 1000;
  return {
    ratedKVA,
    hvV: place.nominalV,
    lvV: lowerVolts(place),
    ukPercent: isLow(place) ? 4 : 6,
    loadLossKW: loadLossKW.find(([kVA]) => kVA === ratedKVA)?.[1] ?? 7.6,
    vectorGroup: place.frequencyHz === 60 ? 'Dyn1' : 'Dyn11',
  };
}

/**
 * Low voltage: 240 mm² copper, 0.0754 Ω/km at 20 °C (IEC 60228 table 2, second-hand) times 1 + 0.00393·50 at
 * 70 °C. Medium voltage: 150 mm² aluminium, 0.206 Ω/km times 1 + 0.00403·70 at 90 °C; X and C from memory.
 */
function cable(place: PartPlace): Values<'cable'> {
  return isLow(place)
    ? { lengthM: 50, resistanceOhmPerKm: 0.0902, reactanceOhmPerKm: 0.08 }
    : { lengthM: 500, resistanceOhmPerKm: 0.264, reactanceOhmPerKm: 0.11, capacitanceNFPerKm: 300 };
}

function bank(place: PartPlace): Values<'bank'> {
  const steps = isLow(place)
    ? Array.from({ length: 6 }, () => ({ kvar: 25 }))
    : [{ kvar: 600 }, { kvar: 600 }];
  return { steps, ratedV: typicalCapacitorV(place.nominalV) };
}

const makers: { [K in ElementKind]: (place: PartPlace) => Values<K> } = {
  supply: (place) => ({ shortCircuitMVA: isLow(place) ? 25 : 250, xOverR: isLow(place) ? 5 : 10 }),
  generator: (place) => ({ ratedKVA: isLow(place) ? 500 : 2500, xdSubtransientPercent: 15 }),
  transformer,
  cable,
  reactor: (place) => ({ inductanceMH: shareOfBaseMH(place, 0.04, isLow(place) ? 250 : 2500) }),
  coupler: () => ({}),
  branch: (place) => ({
    arrangement: 'series',
    resistanceOhm: isLow(place) ? 0.01 : 0.1,
    inductanceMH: shareOfBaseMH(place, 0.04, isLow(place) ? 250 : 2500),
  }),
  load: (place) => ({ kW: isLow(place) ? 100 : 1000, powerFactor: 0.85 }),
  motor: (place) => ({ ratedKW: isLow(place) ? 55 : 500 }),
  converter: (place) => ({ kW: isLow(place) ? 100 : 1000, powerFactor: 0.95, spectrum: 'drive-reactance-3' }),
  bank,
  filter: (place) => ({
    type: 'single-tuned',
    kvar: isLow(place) ? 100 : 600,
    tunedOrder: 4.7,
    qFactor: 40,
    ratedV: Number((1.2 * place.nominalV).toPrecision(2)),
  }),
  shunt: () => ({ arrangement: 'series', resistanceOhm: 10, capacitanceUF: 10 }),
};

/**
 * Sensible values for a new part of a kind at a place, all of them typical and to be checked against the
 * nameplate. Values that follow from the place itself (a transformer's volts) are not typical; the caller
 * records the rest in `study.origins`.
 */
export function typicalValues<K extends ElementKind>(kind: K, place: PartPlace): Values<K> {
  return makers[kind](place);
}

/** Keys of typicalValues that follow from the place or are choices, not typical data. */
export const placeKeys: ReadonlySet<string> = new Set(['hvV', 'lvV', 'arrangement', 'type']);
