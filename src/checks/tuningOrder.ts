import { withDefaults } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { figure, ordinal } from './figure.ts';
import { type LiveBank, liveBanks } from './liveBanks.ts';
import { partRow } from './partRow.ts';
import { significantOrders } from './presentOrders.ts';
import type { Verdict, Working } from './types.ts';
import { judged, keptQuietly } from './verdict.ts';

/** Default loss of capacitance by ageing, per cent. */
const AGEING_PERCENT = 5;
/** Closer than this to the order is watched: n_max from 0.95·h_min. */
const WATCH_BELOW = 0.05;

/**
 * Highest series-resonance order of a detuned branch over tolerance and ageing:
 * n_max = (1/√p)/√((1 − t_L)(1 − t_C)(1 − ageing)); tolerances as the shares below nominal, 0 or more.
 * RangeError outside 0 < p < 1.
 */
export function highestTuning(p: number, lossOfL: number, lossOfC: number, ageing: number): number {
  if (!(p > 0 && p < 1)) throw new RangeError(`p ${p}: above 0 and below 1 is needed`);
  return 1 / Math.sqrt(p * (1 - lossOfL) * (1 - lossOfC) * (1 - ageing));
}

/** C/C0 at which a detuned branch resonates at order h: 1/(p·h²). */
export function crossingShare(p: number, h: number): number {
  return 1 / (p * h * h);
}

/**
 * Series resonance of each detuned bank over tolerance and ageing against the lowest significant
 * order at its busbar (tuning-order): at or above it fails, within 5 % below is watched. From there the branch is capacitive at
 * an order that is present and takes it up or raises it.
 */
export function tuningOrder(context: CheckContext): Verdict[] {
  return liveBanks(context).flatMap((live) => (live.p > 0 ? [atBank(context, live)] : []));
}

/** The share below nominal that a band [minus, plus] in per cent allows. */
const below = ([minus]: readonly [number, number]): number => Math.max(0, -minus) / 100;

function atBank(context: CheckContext, { bank, bus, p }: LiveBank): Verdict {
  const full = withDefaults(bank, bus);
  const lossOfL = below(full.reactorTolerancePercent);
  const lossOfC = below(full.tolerancePercent);
  const ageing = (bank.ageingPercent ?? AGEING_PERCENT) / 100;
  const value = highestTuning(p, lossOfL, lossOfC, ageing);
  const n = 1 / Math.sqrt(p);
  const row = partRow(context, bank.id, {
    check: 'tuning-order',
    title: 'tuning over tolerance and ageing',
    unit: 'h',
  });
  row.part = 'tuning';
  row.working.push({
    equation: 'n_max = n / √((1 − t_L)(1 − t_C)(1 − ageing)), n = 1/√p',
    numbers: `${figure(n)} / √((1 − ${figure(lossOfL)})(1 − ${figure(lossOfC)})(1 − ${figure(ageing)})) = ${figure(value)} (${figure(value * context.study.frequencyHz, 3)} Hz)`,
  });
  const contents =
    full.connection === 'star-earthed' ? (['positive', 'zero'] as const) : (['positive'] as const);
  const present = contents.flatMap((content) => significantOrders(context, bus, content));
  if (present.length === 0)
    return keptQuietly(row, 'No harmonic order reaches a tenth of its limit at this busbar.', value, null);
  const lowest = Math.min(...present);
  row.working.push(crossing(p, n, lowest));
  return judged({
    ...row,
    order: lowest,
    value,
    limit: lowest,
    watchBelow: WATCH_BELOW,
    mend: mendWords(lowest, lossOfL, lossOfC, ageing),
  });
}

function crossing(p: number, n: number, lowest: number): Working {
  const share = crossingShare(p, lowest);
  const words =
    n >= lowest
      ? `the branch is tuned above the ${ordinal(lowest)} from new`
      : `the ${ordinal(lowest)} is met when ${figure((1 - share) * 100, 3)} % of the capacitance is lost`;
  return {
    equation: 'crossing C/C0 = 1/(p · h²)',
    numbers: `1 / (${figure(p)} · ${lowest}²) = ${figure(share, 3)}: ${words}`,
  };
}

function mendWords(lowest: number, lossOfL: number, lossOfC: number, ageing: number): string {
  const p = 1 / ((0.95 * lowest) ** 2 * (1 - lossOfL) * (1 - lossOfC) * (1 - ageing));
  return p < 0.25
    ? `Choose p of at least ${figure(p * 100, 3)} %, so that the branch stays inductive at the ${ordinal(lowest)}; closer tolerances help a little.`
    : `No customary reactor lies below the ${ordinal(lowest)}: lower that order at its source or use a filter for it.`;
}
