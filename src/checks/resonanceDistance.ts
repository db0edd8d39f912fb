import type { Bank, Bus } from '../study/index.ts';
import { busById, isOn, nameOf, withDefaults } from '../study/index.ts';
import { type BankSettings, otherBankSettings } from './bankSettings.ts';
import type { CheckContext } from './CheckContext.ts';
import { bankAdmittance, kvarOn } from './correctionBranch.ts';
import { figure, ordinal } from './figure.ts';
import { admittanceOf, closestMeeting, type OrderCurve, parallelPeaks } from './parallelPeaks.ts';
import { type Content, presentOrders } from './presentOrders.ts';
import { commonPractice } from './source.ts';
import { type StepSums, stepSums } from './stepSums.ts';
import type { Verdict, Working } from './types.ts';
import { judged, keptQuietly, type Row, unknown } from './verdict.ts';

const LIMIT = 0.15;
/** Ratio of neighbouring orders in the search, fine against the 15 % asked; peaks are then refined. */
const GRID_RATIO = 1.02;
const COMBINATION_CAP = 256;

/**
 * Screening (resonance-distance): min |h_r − h|/h ≥ 0.15 between the parallel resonances seen at a bank's
 * busbar and the orders present there, over every combination of its steps and of the other banks'.
 * Positive-sequence peaks meet positive- and negative-sequence content, zero-sequence peaks the zero one.
 */
export function resonanceDistance(context: CheckContext): Verdict[] {
  return context.study.elements.flatMap((part) =>
    part.kind === 'bank' && isOn(part) ? [atBank(context, part)] : [],
  );
}

interface Meeting {
  peak: number;
  order: number;
  distance: number;
  kvar: number;
  content: Content;
  others: BankSettings;
}

function atBank(context: CheckContext, bank: Bank): Verdict {
  const row: Row = {
    check: 'resonance-distance',
    title: 'resonance near a present order',
    subject: { kind: 'element', id: bank.id },
    caseId: context.caseId,
    unit: 'p.u.',
    source: commonPractice,
    working: [],
    screening: true,
  };
  const bus = busById(context.study, bank.bus);
  if (!bus || !context.solved.energised(bank.bus)) {
    return unknown(row, `the busbar of ${nameOf(bank)} has no path to a source in this case`);
  }
  const contents: Content[] =
    withDefaults(bank, bus).connection === 'star-earthed' ? ['positive', 'zero'] : ['positive'];
  const searches = contents.map((content) => search(context, bank, bus, content));
  const meetings = searches.flatMap(({ worst }) => (worst ? [worst] : []));
  const remarks = [...new Set(searches.flatMap((found) => found.remarks))];
  const worst = meetings.sort((a, b) => a.distance - b.distance)[0];
  if (!worst)
    return quiet(
      { ...row, remarks },
      searches.some(({ anyPresent }) => anyPresent),
    );
  return asVerdict(
    row,
    bank,
    refined(context, bank, worst),
    remarks,
    searches.flatMap(({ working }) => working),
  );
}

function quiet(row: Row, anyPresent: boolean): Verdict {
  const words = anyPresent
    ? 'No parallel resonance is seen at the busbar in the range searched.'
    : 'No harmonic order is present at this busbar.';
  return keptQuietly(row, words, null, LIMIT);
}

interface Search {
  worst: Meeting | null;
  anyPresent: boolean;
  remarks: string[];
  working: Working[];
}

function search(context: CheckContext, bank: Bank, bus: Bus, content: Content): Search {
  const present = presentOrders(context, bank.bus, content, bank);
  const highest = present.at(-1);
  if (highest === undefined) return { worst: null, anyPresent: false, remarks: [], working: [] };
  const sums = stepSums(bank.steps, COMBINATION_CAP);
  const others = otherBankSettings(context, bank.id);
  const remarks = [...others.remarks, ...capRemark(sums)];
  let worst: Meeting | null = null;
  let inCase: { kvar: number; peaks: number[] }[] = [];
  for (const setting of others.settings) {
    const network = networkWithout(context, bank, content, setting, highest * (1 + 2 * LIMIT));
    if (!network) continue;
    const found = sums.kvar.map((kvar) => ({
      kvar,
      peaks: parallelPeaks(network, bankAdmittance(bank, bus, kvar)),
    }));
    if (setting.asInCase) inCase = found;
    for (const { kvar, peaks } of found) {
      const meeting = closestMeeting(peaks, present);
      if (meeting && (!worst || meeting.distance < worst.distance))
        worst = { ...meeting, kvar, content, others: setting };
    }
  }
  return { worst, anyPresent: true, remarks, working: listing(inCase, present, content) };
}

function capRemark(sums: StepSums): string[] {
  return sums.total > sums.kvar.length
    ? [`${sums.total} distinct step combinations; ${sums.kvar.length} spread evenly over them were searched.`]
    : [];
}

/** 1/Z at the bank's busbar without this bank; null where the sequence has no path there. */
function networkWithout(
  context: CheckContext,
  bank: Bank,
  content: Content,
  setting: BankSettings,
  toOrder: number,
): OrderCurve | null {
  const fn = context.study.frequencyHz;
  const points = Math.ceil(Math.log(toOrder) / Math.log(GRID_RATIO)) + 1;
  const frequencyHz = Float64Array.from({ length: points }, (_, k) => fn * GRID_RATIO ** k);
  const span = { bus: bank.bus, sequence: content, frequencyHz };
  const scan = context.scan(span, new Set([bank.id, ...setting.out]), setting.kvar);
  return scan.error === undefined ? admittanceOf(scan.frequencyHz, scan.re, scan.im, fn) : null;
}

/** The engine's own refined resonance nearest to the one found on the grid. */
function refined(context: CheckContext, bank: Bank, meeting: Meeting): Meeting {
  const fn = context.study.frequencyHz;
  const span = {
    bus: bank.bus,
    sequence: meeting.content,
    fromHz: (fn * meeting.peak) / GRID_RATIO ** 2,
    toHz: fn * meeting.peak * GRID_RATIO ** 2,
    points: 17,
  };
  const steps = new Map(meeting.others.kvar).set(bank.id, meeting.kvar);
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

function asVerdict(row: Row, bank: Bank, worst: Meeting, remarks: string[], working: Working[]): Verdict {
  const total = bank.steps.reduce((sum, step) => sum + step.kvar, 0);
  const state = `${figure(worst.kvar)} of ${figure(total)} kvar on${worst.others.words}`;
  const now = Math.abs(kvarOn(bank) - worst.kvar) < 1e-6 && worst.others.asInCase;
  return judged({
    ...row,
    title: `resonance at order ${figure(worst.peak, 3)} near the ${ordinal(worst.order)}`,
    order: worst.peak,
    value: worst.distance,
    limit: LIMIT,
    sense: 'lower',
    working: [
      {
        equation: '|h_r − h| / h, smallest over all step combinations',
        numbers: `|${figure(worst.peak)} − ${worst.order}| / ${worst.order} = ${figure(worst.distance)} with ${state}`,
      },
      ...working,
    ],
    remarks: [
      `Governing combination: ${state}${now ? ', as in this case' : ''}.`,
      'Screening only: distortion and duty decide.',
      ...remarks,
    ],
    mend: `Detune the bank so that its resonance lies below the lowest present order, or choose step sizes that leave the ${ordinal(worst.order)} clear.`,
  });
}
