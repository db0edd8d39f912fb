import type { Bank, Filter } from '../study/index.ts';
import { busById, isOn, nameOf, withDefaults } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { kvarOn } from './correctionBranch.ts';
import { figure, ordinal } from './figure.ts';
import type { Content } from './presentOrders.ts';
import { type Meeting, refineMeeting, searchResonances } from './resonanceSearch.ts';
import { commonPractice } from './source.ts';
import type { Verdict, Working } from './types.ts';
import { judged, keptQuietly, type Row, unknown } from './verdict.ts';

const LIMIT = 0.15;

/**
 * Screening (resonance-distance): min |h_r − h|/h ≥ 0.15 between the parallel resonances seen at the busbar
 * of a bank and the orders present there, over every combination of its steps and of the other banks'. A
 * filter on a busbar without a bank is searched alike. Positive-sequence peaks meet positive- and
 * negative-sequence content, zero-sequence peaks the zero one.
 */
export function resonanceDistance(context: CheckContext): Verdict[] {
  const inService = context.study.elements.filter(isOn);
  const banks = inService.filter((part) => part.kind === 'bank');
  const covered = new Set(banks.map((bank) => bank.bus));
  const filters = inService.filter((part) => part.kind === 'filter').filter(({ bus }) => !covered.has(bus));
  const oneAtEachBus = filters.filter(
    (part, index) => filters.findIndex(({ bus }) => bus === part.bus) === index,
  );
  return [...banks, ...oneAtEachBus].map((part) => atPart(context, part));
}

function atPart(context: CheckContext, part: Bank | Filter): Verdict {
  const row: Row = {
    check: 'resonance-distance',
    title: 'resonance near a present order',
    subject: { kind: 'element', id: part.id },
    caseId: context.caseId,
    unit: 'p.u.',
    source: commonPractice,
    working: [],
    screening: true,
  };
  const bus = busById(context.study, part.bus);
  if (!bus || !context.solved.energised(part.bus)) {
    return unknown(row, `the busbar of ${nameOf(part)} has no path to a source in this case`);
  }
  const connection = withDefaults(part, bus).connection;
  const contents: Content[] = connection === 'star-earthed' ? ['positive', 'zero'] : ['positive'];
  const searches = contents.map((content) => searchResonances(context, part, bus, content));
  const remarks = [...new Set(searches.flatMap((found) => found.remarks))];
  const worst = searches
    .flatMap((found) => (found.worst ? [found.worst] : []))
    .sort((a, b) => a.distance - b.distance)[0];
  if (!worst) {
    const words = searches.some(({ anyPresent }) => anyPresent)
      ? 'No parallel resonance is seen at the busbar in the range searched.'
      : 'No harmonic order is present at this busbar.';
    return keptQuietly({ ...row, remarks }, words, null, LIMIT);
  }
  const working = searches.flatMap((found) => found.working);
  return asVerdict(row, part, refineMeeting(context, part, worst), remarks, working);
}

function stateWords(part: Bank | Filter, worst: Meeting): string {
  if (part.kind === 'filter') return `the filters as they stand${worst.others.words}`;
  const total = part.steps.reduce((sum, step) => sum + step.kvar, 0);
  return `${figure(worst.kvar)} of ${figure(total)} kvar on${worst.others.words}`;
}

function asVerdict(
  row: Row,
  part: Bank | Filter,
  worst: Meeting,
  remarks: string[],
  working: Working[],
): Verdict {
  const state = stateWords(part, worst);
  const asOwn = part.kind === 'filter' || Math.abs(kvarOn(part) - worst.kvar) < 1e-6;
  const order = ordinal(worst.order);
  return judged({
    ...row,
    title: `resonance at order ${figure(worst.peak, 3)} near the ${order}`,
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
      `Governing combination: ${state}${asOwn && worst.others.asInCase ? ', as in this case' : ''}.`,
      'Screening only: distortion and duty decide.',
      ...remarks,
    ],
    mend:
      part.kind === 'filter'
        ? `Retune or resize the filter so that its parallel resonance leaves the ${order}, or add a filter for the order below.`
        : `Detune the bank so that its resonance lies below the lowest present order, or choose step sizes that leave the ${order} clear.`,
  });
}
