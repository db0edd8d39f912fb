import { aluminium, type ConductorRow, conductorSource, copper } from './conductorResistances.ts';
import { type Typical, typicalOrigin } from './Typical.ts';

export type Conductor = 'copper' | 'aluminium';
export type CableLaying = 'multicore' | 'flat' | 'spaced';

export interface CableValues {
  resistanceOhmPerKm: number;
  reactanceOhmPerKm: number;
}

/** Reactance at 50 Hz in Ω/km: common practice, from memory. */
const reactances: Readonly<Record<CableLaying, { ohmPerKm: number; words: string }>> = {
  multicore: { ohmPerKm: 0.08, words: 'multicore or trefoil' },
  flat: { ohmPerKm: 0.09, words: 'single cores flat, touching' },
  spaced: { ohmPerKm: 0.13, words: 'single cores, spaced' },
};

const coldest = -20;
const hottest = 120;

const tables: Readonly<Record<Conductor, readonly ConductorRow[]>> = { copper, aluminium };

/** Cross-sections of IEC 60228 class 2 that have a typical resistance, in mm². */
export function cableSizes(conductor: Conductor): number[] {
  return tables[conductor].map(([mm2]) => mm2);
}

/**
 * Resistance and reactance in Ω/km by cross-section: R(T) = R20·(1 + 0.004·(T − 20)), R20 of IEC 60228
 * class 2, T in °C, 0.004 of the usual correction tables for both metals; X grows with the frequency from
 * its 50 Hz value. Refuses sizes and temperatures outside the tables, with what they allow. What a cable may
 * carry depends on how it is laid and is not guessed.
 */
export function typicalCable(
  mm2: number,
  conductor: Conductor,
  temperatureC: number,
  choice: { laying?: CableLaying; frequencyHz?: 50 | 60 } = {},
): Typical<CableValues> {
  const { laying = 'multicore', frequencyHz = 50 } = choice;
  const cold = tables[conductor].find(([size]) => size === mm2)?.[1];
  if (cold === undefined)
    return {
      ok: false,
      error: `${mm2} mm² is no ${conductor} cross-section of IEC 60228 class 2; allowed is ${cableSizes(conductor).join(', ')} mm².`,
    };
  if (!(temperatureC >= coldest && temperatureC <= hottest))
    return {
      ok: false,
      error: `${temperatureC} °C is no operating temperature of a conductor; allowed is ${coldest} to ${hottest} °C.`,
    };
  const { ohmPerKm, words } = reactances[laying];
  const resistance = `${conductorSource}, ${mm2} mm² ${conductor} at ${temperatureC} °C with 1 + 0.004·(T − 20)`;
  const reactance = `common practice, ${words}, ${ohmPerKm} Ω/km at 50 Hz`;
  return {
    ok: true,
    values: {
      resistanceOhmPerKm: rounded(cold * (1 + 0.004 * (temperatureC - 20))),
      reactanceOhmPerKm: rounded((ohmPerKm * frequencyHz) / 50),
    },
    origins: {
      resistanceOhmPerKm: typicalOrigin(resistance),
      reactanceOhmPerKm: typicalOrigin(reactance),
    },
    source: `R: ${resistance}. X: ${reactance}. The rated current is left to be given.`,
  };
}

function rounded(ohmPerKm: number): number {
  return Number(ohmPerKm.toPrecision(4));
}
