import { busById, isOn } from '../lookup.ts';
import { fullNameOf, nameOf } from '../names.ts';
import { spectrumOf } from '../spectra/spectrumOf.ts';
import type { Bank, Bus, Converter, Filter, Study } from '../types.ts';
import { formatNumber, formatQuantity } from '../units/formatQuantity.ts';
import { type Said, type State, saidOfPart, setFields } from './Said.ts';

/** A branch tuned this close to an order is a filter for it. */
const nearOrder = 0.03;
/** An order injected with less than this share of the bank's rated current is left to the tuning verdict. */
const presentShare = 0.02;
/** √(I1² + I2²)/I of a single-phase injection: a third of it in each sequence. */
const unbalancedPart = Math.SQRT2 / 3;
/** Detuned up to 14 % in use; from 20 % on the tuning falls to h = 2.2: common practice. */
const highestCustomary = 20;
/** A single-tuned filter lies 3 to 10 % below its order, so that ageing cannot lift it above: common practice. */
const filterBelow = 0.94;
const filterAbove = 1.08;

/** Detuning and tuning against the orders that the site injects. */
export function tuningFindings(state: State, part: Bank | Filter, bus: Bus): Said[] {
  return part.kind === 'bank' ? detuning(state, part, bus) : filterTuning(state, part);
}

function detuning({ here }: State, bank: Bank, bus: Bus): Said[] {
  const percent = bank.detuningPercent ?? 0;
  if (percent < 1) return [];
  const n = 1 / Math.sqrt(percent / 100);
  if (percent >= highestCustomary) return [tooLow(bank, percent, n)];
  const met = injectedOrders(here, bank, bus).find(({ h }) => n >= h * (1 - nearOrder));
  return met ? [tunedToOrder(bank, n, met)] : [];
}

function tooLow(bank: Bank, percent: number, n: number): Said {
  return saidOfPart(bank, 'detuningPercent', {
    code: 'detuning-range',
    severity: 'warning',
    text: `p = ${formatQuantity(percent, '%')} tunes it to h ${formatNumber(n, { digits: 3 })} and puts its capacitors at ${formatQuantity(100 / (1 - percent / 100), '%', { digits: 3 })} of the busbar; customary are 5.67, 7 and 14 %`,
    mend: 'give p as the share of the reactance X_L/X_C in per cent',
  });
}

function tunedToOrder(bank: Bank, n: number, { h, from }: Injected): Said {
  const close = Math.abs(n / h - 1) <= nearOrder;
  const needed = 100 / (0.9 * h) ** 2;
  return saidOfPart(bank, 'detuningPercent', {
    code: 'tuned-order-present',
    severity: 'warning',
    text: `it is tuned to h ${formatNumber(n, { digits: 3 })}, ${close ? 'on' : 'above'} the order ${h} that ${from} injects; ${close ? 'it draws that current as a filter would' : 'below its tuning it is a capacitor and raises that order'}; allowed is a tuning below every order present`,
    mend:
      h > 2 && needed < highestCustomary
        ? `choose p of ${formatQuantity(Math.ceil(needed * 10) / 10, '%')} or more, as customary ${needed <= 5.67 ? '5.67' : needed <= 7 ? '7' : '14'} %`
        : 'lower that order at its source, or use a filter made for it',
  });
}

interface Injected {
  h: number;
  from: string;
}

/** Orders injected with at least 2 % of the bank's rated current, by the converter that injects most; ascending. */
function injectedOrders(study: Study, bank: Bank, bus: Bus): Injected[] {
  const ratedKVA = bank.steps.reduce((sum, { kvar }) => sum + kvar, 0);
  const most = new Map<number, { share: number; from: string }>();
  for (const part of study.elements) {
    if (part.kind !== 'converter' || !isOn(part) || !busById(study, part.bus)) continue;
    for (const { h, percent } of spectrumOf(study, part.spectrum)) {
      if (h % 3 === 0 && !meetsTriplens(part, bank)) continue;
      const kVA = ((percent / 100) * Math.abs(part.kW)) / part.powerFactor;
      const share = ((isThreePhase(part) ? 1 : unbalancedPart) * kVA) / ratedKVA;
      if (share >= presentShare * (bus.nominalV / bank.ratedV) && share > (most.get(h)?.share ?? 0))
        most.set(h, { share, from: nameOf(part) });
    }
  }
  return [...most].map(([h, { from }]) => ({ h, from })).sort((a, b) => a.h - b.h);
}

/** Triplen orders of a three-phase converter are zero sequence: only an earthed star on its own busbar meets them. */
function meetsTriplens(converter: Converter, bank: Bank): boolean {
  if (!isThreePhase(converter)) return true;
  return bank.connection === 'star-earthed' && converter.wires === 4 && converter.bus === bank.bus;
}

function isThreePhase({ connection = 'L1L2L3' }: Converter): boolean {
  return connection === 'L1L2L3';
}

/** A sharp filter tuned at or above its order: the network's parallel peak below it meets that order. */
function filterTuning(state: State, filter: Filter): Said[] {
  if (filter.type === 'high-pass') return [];
  const order = Math.floor(filter.tunedOrder);
  const above = filter.tunedOrder / order;
  if (order < 2 || above <= 1 || above > filterAbove) return [];
  const chosen = Number((filterBelow * order).toFixed(2));
  const words = `tune ${fullNameOf(filter)} to ${formatNumber(chosen)}`;
  return [
    saidOfPart(filter, 'tunedOrder', {
      code: 'filter-above-order',
      severity: 'warning',
      text: `it is tuned to h ${formatNumber(filter.tunedOrder)}, above the order ${order}; the parallel peak just below its tuning falls on that order, and ageing moves both up; customary is 3 to 10 % below`,
      mend: `${words}, ${formatQuantity(100 * (1 - filterBelow), '%', { digits: 1 })} below the order ${order}`,
      repair: setFields(state, filter.id, { tunedOrder: chosen }, words),
    }),
  ];
}
