import { busById, elementById } from '../lookup.ts';
import { fullNameOf } from '../names.ts';
import type { Bank, Bus, Filter } from '../types.ts';
import { formatNumber, formatQuantity } from '../units/formatQuantity.ts';
import { type Said, type State, saidOfPart, setFields } from './Said.ts';
import { tuningFindings } from './tuning.ts';
import { volts } from './volts.ts';

/** Rated voltages capacitors are sold in, line to line: common practice. */
const usualRatedV = [
  230, 240, 260, 280, 300, 400, 415, 440, 460, 480, 525, 550, 600, 660, 690, 760, 800, 850, 900, 1000,
];

/** Rounding of nominal voltages is no mistake. */
const slack = 0.999;
/** Below this share of its nameplate kvar the nameplate was perhaps meant at the busbar's voltage. */
const suspectShare = 0.7;
const exactShare = 0.05;

/** What stands between a bank's or filter's rating and its busbar, its reactor and its tuning. */
export function capacitorFindings(state: State): Said[] {
  return state.here.elements.flatMap((part) => {
    if (part.kind !== 'bank' && part.kind !== 'filter') return [];
    const bus = busById(state.here, part.bus);
    if (!bus) return [];
    const own = part.kind === 'bank' ? bankFindings(state, part, bus) : filterFindings(state, part, bus);
    return [...own, ...tuningFindings(state, part, bus)];
  });
}

function bankFindings(state: State, bank: Bank, bus: Bus): Said[] {
  const p = (bank.detuningPercent ?? 0) / 100;
  return [
    ...(bank.steps.length === 0 ? [noSteps(bank)] : []),
    ...ratedVoltage(
      state,
      bank,
      bus,
      1 / (1 - p),
      p > 0 ? `its ${formatQuantity(100 * p, '%')} reactor` : '',
    ),
    ...deliveredKvar(state, bank, bus, p),
  ];
}

function noSteps(bank: Bank): Said {
  return saidOfPart(bank, 'steps', {
    code: 'no-steps',
    severity: 'warning',
    text: 'it has no steps and gives no kvar; allowed is one step or more',
    mend: 'add its steps, such as 6x25',
  });
}

/** At the fundamental a capacitor behind a reactor stands at U/(1 − p), in a filter at U·n²/(n² − 1). */
function filterFindings(state: State, filter: Filter, bus: Bus): Said[] {
  const n = filter.tunedOrder;
  const rise = filter.type === 'c-type' ? 1 : n ** 2 / (n ** 2 - 1);
  return ratedVoltage(state, filter, bus, rise, rise > 1 ? 'its reactor' : '');
}

function ratedVoltage(state: State, part: Bank | Filter, bus: Bus, rise: number, behind: string): Said[] {
  const across = bus.nominalV * rise;
  const belowBus = part.ratedV < bus.nominalV * slack;
  if (!belowBus && part.ratedV >= across * slack) return [];
  const chosen =
    usualRatedV.find((rated) => rated >= across * slack) ?? Number((1.1 * across).toPrecision(2));
  const words = `set the rated voltage of ${fullNameOf(part)} to ${volts(chosen)}`;
  const stands = behind ? `stand at ${volts(across)} behind ${behind}` : `stand at ${volts(across)}`;
  return [
    saidOfPart(part, 'ratedV', {
      code: 'capacitor-voltage',
      severity: belowBus ? 'error' : 'warning',
      text: `the capacitors are rated ${volts(part.ratedV)} and ${stands} at the ${volts(bus.nominalV)} busbar; allowed is a rated voltage of at least that, with room for harmonics and the highest supply voltage`,
      mend: `choose capacitors of ${volts(chosen)} or above${part.kind === 'bank' ? '; their nameplate kvar then count at that voltage' : ''}`,
      repair: setFields(state, part.id, { ratedV: chosen }, words),
    }),
  ];
}

/** Q at the busbar = Q_N·(U/U_N)²/(1 − p): nameplate kvar count at the rated voltage only. */
function deliveredKvar({ base }: State, bank: Bank, bus: Bus, p: number): Said[] {
  const share = (bus.nominalV / bank.ratedV) ** 2 / (1 - p);
  const nameplate = elementById(base, bank.id);
  const { steps } = nameplate?.kind === 'bank' ? nameplate : bank;
  const rated = steps.reduce((sum, { kvar }) => sum + kvar, 0);
  if (Math.abs(share - 1) <= exactShare || rated === 0 || bank.ratedV < bus.nominalV * slack) return [];
  const kvar = (value: number): string => formatQuantity(value, 'kvar', { digits: 3 });
  return [
    saidOfPart(bank, 'ratedV', {
      code: 'kvar-at-rated-voltage',
      severity: share < suspectShare ? 'warning' : 'note',
      text: `its ${kvar(rated)} are rated at ${volts(bank.ratedV)}; at ${volts(bus.nominalV)} all steps give ${kvar(rated * share)}, ${formatQuantity(100 * share, '%', { digits: 3 })} of the nameplate`,
      mend: `where the steps are meant at ${volts(bus.nominalV)}, enter the kvar they have at ${volts(bank.ratedV)}: ${formatNumber(1 / share, { digits: 3 })} times as much`,
    }),
  ];
}
