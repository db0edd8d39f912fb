import type { Bank, Bus, Filter } from '../study/index.ts';
import { type BankSettings, otherBankSettings } from './bankSettings.ts';
import type { CheckContext } from './CheckContext.ts';
import { bankAdmittance } from './correctionBranch.ts';
import { figure } from './figure.ts';
import { admittanceOf, closestMeeting, type OrderCurve, parallelPeaks } from './parallelPeaks.ts';
import { type Content, presentOrders } from './presentOrders.ts';
import { type StepSums, stepSums } from './stepSums.ts';
import type { Working } from './types.ts';

/** Ratio of neighbouring orders in the search, fine against the 15 % asked; peaks are then refined. */
const GRID_RATIO = 1.02;
const COMBINATION_CAP = 256;
/** How far above the highest present order a peak could still lie too near to it, with room. */
const BEYOND = 1.3;

/** A peak beside a present order, and the state of the correction that puts it there. */
export interface Meeting {
  peak: number;
  order: number;
  distance: number;
  /** Of the bank searched; a filter's own net kvar. */
  kvar: number;
  content: Content;
  others: BankSettings;
}

export interface Search {
  worst: Meeting | null;
  anyPresent: boolean;
  remarks: string[];
  working: Working[];
}

/** One state of the part searched: what it adds to the network's admittance at its busbar. */
interface State {
  kvar: number;
  branch: (h: number) => { re: number; im: number };
}

/**
 * The parallel resonance nearest to a present order at the busbar of a bank or filter, over every
 * combination of the bank's steps and of the other banks'. The network without the bank is scanned once
 * per setting of the others; the bank's own states are added as admittances, so they cost no scan.
 */
export function searchResonances(
  context: CheckContext,
  part: Bank | Filter,
  bus: Bus,
  content: Content,
): Search {
  const present = presentOrders(context, bus.id, content, part.kind === 'bank' ? part : undefined);
  const highest = present.at(-1);
  if (highest === undefined) return { worst: null, anyPresent: false, remarks: [], working: [] };
  const { states, remarks: capped } = statesOf(part, bus);
  const others = otherBankSettings(context, part.id);
  let worst: Meeting | null = null;
  let inCase: { kvar: number; peaks: number[] }[] = [];
  for (const setting of others.settings) {
    const network = networkAround(context, part, content, setting, highest * BEYOND);
    if (!network) continue;
    const found = states.map(({ kvar, branch }) => ({ kvar, peaks: parallelPeaks(network, branch) }));
    if (setting.asInCase) inCase = found;
    for (const { kvar, peaks } of found) {
      const meeting = closestMeeting(peaks, present);
      if (meeting && (!worst || meeting.distance < worst.distance))
        worst = { ...meeting, kvar, content, others: setting };
    }
  }
  const working = listing(inCase, present, content);
  return { worst, anyPresent: true, remarks: [...others.remarks, ...capped], working };
}

/** A filter stands whole in the scanned network; a bank is added state by state. */
function statesOf(part: Bank | Filter, bus: Bus): { states: State[]; remarks: string[] } {
  if (part.kind === 'filter') {
    return { states: [{ kvar: part.kvar, branch: () => ({ re: 0, im: 0 }) }], remarks: [] };
  }
  const sums = stepSums(part.steps, COMBINATION_CAP);
  const states = sums.kvar.map((kvar) => ({ kvar, branch: bankAdmittance(part, bus, kvar) }));
  return { states, remarks: capRemark(sums) };
}

function capRemark(sums: StepSums): string[] {
  return sums.total > sums.kvar.length
    ? [`${sums.total} distinct step combinations; ${sums.kvar.length} spread evenly over them were searched.`]
    : [];
}

/** 1/Z at the part's busbar, a bank left out; null where the sequence has no path there. */
function networkAround(
  context: CheckContext,
  part: Bank | Filter,
  content: Content,
  setting: BankSettings,
  toOrder: number,
): OrderCurve | null {
  const fn = context.study.frequencyHz;
  const points = Math.ceil(Math.log(toOrder) / Math.log(GRID_RATIO)) + 1;
  const frequencyHz = Float64Array.from({ length: points }, (_, k) => fn * GRID_RATIO ** k);
  const out = new Set(setting.out);
  if (part.kind === 'bank') out.add(part.id);
  const scan = context.scan({ bus: part.bus, sequence: content, frequencyHz }, out, setting.kvar);
  return scan.error === undefined ? admittanceOf(scan.frequencyHz, scan.re, scan.im, fn) : null;
}

/** The engine's own refined resonance nearest to a meeting found on the grid. */
export function refineMeeting(context: CheckContext, part: Bank | Filter, meeting: Meeting): Meeting {
  const fn = context.study.frequencyHz;
  const span = {
    bus: part.bus,
    sequence: meeting.content,
    fromHz: (fn * meeting.peak) / GRID_RATIO ** 2,
    toHz: fn * meeting.peak * GRID_RATIO ** 2,
    points: 17,
  };
  const steps = new Map(meeting.others.kvar);
  if (part.kind === 'bank') steps.set(part.id, meeting.kvar);
  const scan = context.scan(span, meeting.others.out, steps);
  const peaks = scan.resonances.filter(({ kind }) => kind === 'parallel').map(({ order }) => order);
  const nearest = peaks.sort((a, b) => Math.abs(a - meeting.peak) - Math.abs(b - meeting.peak))[0];
  return nearest === undefined
    ? meeting
    : { ...meeting, peak: nearest, distance: Math.abs(nearest - meeting.order) / meeting.order };
}

function listing(
  found: readonly { kvar: number; peaks: number[] }[],
  present: readonly number[],
  content: Content,
): Working[] {
  const lines = found.flatMap(({ kvar, peaks }) => {
    const meeting = closestMeeting(peaks, present);
    return meeting ? [`${figure(kvar)} kvar: ${figure(meeting.peak, 3)}`] : [];
  });
  const shown = lines.length > 16 ? [...lines.slice(0, 8), '…', ...lines.slice(-8)] : lines;
  return [
    {
      equation: 'h present',
      numbers: `${present.join(', ')} (${content === 'zero' ? 'zero' : 'positive and negative'} sequence)`,
    },
    {
      equation: 'h_r nearest to a present order, by kvar on',
      numbers: shown.length > 0 ? shown.join('; ') : 'no peak',
    },
  ];
}
