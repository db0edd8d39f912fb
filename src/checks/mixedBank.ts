import { nameOf } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { figure, ordinal } from './figure.ts';
import { galvanic } from './galvanic.ts';
import { type LiveBank, liveBanks } from './liveBanks.ts';
import { closestMeeting } from './parallelPeaks.ts';
import { partRow } from './partRow.ts';
import { presentOrders } from './presentOrders.ts';
import type { Verdict } from './types.ts';
import { judged, keptQuietly, unknown } from './verdict.ts';

const LIMIT = 0.15;
const BEYOND = 1.3;

/**
 * Screening (mixed-bank): a plain bank on busbars galvanically common with a detuned bank or a filter. Above
 * its tuning the detuned branch is inductive, and a parallel peak arises between the two; its distance to the
 * present orders is asked as in resonance-distance. The bank's duty decides.
 */
export function mixedBank(context: CheckContext): Verdict[] {
  const banks = liveBanks(context);
  return banks.flatMap((plain) => {
    if (plain.p > 0) return [];
    const reach = galvanic(context.study, plain.bus.id);
    const tuned = tunedOrders(context, banks, reach);
    return tuned.length > 0 ? [atBank(context, plain, tuned)] : [];
  });
}

interface Tuned {
  name: string;
  order: number;
}

function tunedOrders(context: CheckContext, banks: readonly LiveBank[], reach: ReadonlySet<string>): Tuned[] {
  const detuned = banks
    .filter(({ p, bus }) => p > 0 && reach.has(bus.id))
    .map(({ bank, p }) => ({ name: nameOf(bank), order: 1 / Math.sqrt(p) }));
  const filters = context.study.elements.flatMap((part) =>
    part.kind === 'filter' && context.correction.has(part.id) && reach.has(part.bus)
      ? [{ name: nameOf(part), order: part.tunedOrder }]
      : [],
  );
  return [...detuned, ...filters].sort((a, b) => a.order - b.order);
}

function atBank(context: CheckContext, { bank, bus }: LiveBank, tuned: readonly Tuned[]): Verdict {
  const row = partRow(context, bank.id, {
    check: 'mixed-bank',
    title: 'plain bank beside detuned',
    unit: 'p.u.',
    part: 'between',
  });
  row.screening = true;
  row.remarks = ['Screening only: distortion and duty decide; see bank-current of the plain bank.'];
  const from = tuned[0]?.order ?? 1;
  const present = presentOrders(context, bus.id, 'positive', bank);
  const highest = Math.max(0, ...present) * BEYOND;
  if (highest <= from)
    return keptQuietly(row, 'No order above the tuning is present at this busbar.', null, LIMIT);
  const fn = context.study.frequencyHz;
  const points = Math.ceil(Math.log(highest / from) / Math.log(1.01)) + 2;
  const frequencyHz = Float64Array.from(
    { length: points },
    (_, k) => fn * from * (highest / from) ** (k / (points - 1)),
  );
  const scan = context.scan({ bus: bus.id, sequence: 'positive', frequencyHz });
  if (scan.error !== undefined) return unknown(row, scan.error);
  const peaks = scan.resonances.filter(({ kind }) => kind === 'parallel').map(({ order }) => order);
  const meeting = closestMeeting(peaks, present);
  if (!meeting)
    return keptQuietly(row, 'No peak is seen between the plain bank and the detuned branch.', null, LIMIT);
  return judged({
    ...row,
    order: meeting.peak,
    value: meeting.distance,
    limit: LIMIT,
    sense: 'lower',
    working: [
      {
        equation: '|h_r − h| / h, peaks above the tuning, banks as they stand',
        numbers: `peaks at ${peaks.map((peak) => figure(peak, 3)).join(', ')} beside ${tuned.map(({ name, order }) => `${name} tuned to ${figure(order, 3)}`).join(', ')}: |${figure(meeting.peak)} − ${meeting.order}| / ${meeting.order} = ${figure(meeting.distance)}`,
      },
    ],
    mend: `Detune ${nameOf(bank)} as well, or take it out: the peak between the branches lies near the ${ordinal(meeting.order)}.`,
  });
}
