import { busById, isOn, nameOf, withDefaults } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { figure, ordinal } from './figure.ts';
import { type Content, presentOrders } from './presentOrders.ts';
import { SolvedCase } from './SolvedCase.ts';
import { commonPractice } from './source.ts';
import type { Verdict } from './types.ts';
import { judged, keptQuietly, type Row, unknown } from './verdict.ts';

const LIMIT = 2;

/**
 * Screening (amplification): |Z_with/Z_without| ≤ 2 at the worst present order of each busbar that injects,
 * and |U_bus/E_background| with against without the correction at each busbar that carries correction.
 * Nothing is said of a case without correction.
 */
export function amplification(context: CheckContext): Verdict[] {
  if (context.correction.size === 0) return [];
  const injecting = new Set(
    context.study.elements.flatMap((part) => (part.kind === 'converter' && isOn(part) ? [part.bus] : [])),
  );
  return [...[...injecting].map((bus) => atInjector(context, bus)), ...background(context)];
}

function rowAt(context: CheckContext, bus: string): Row {
  return {
    check: 'amplification',
    part: 'impedance',
    title: 'amplification of injected current',
    subject: { kind: 'bus', id: bus },
    caseId: context.caseId,
    unit: '×',
    source: commonPractice,
    working: [],
    screening: true,
    remarks: ['Screening only: distortion and duty decide.'],
  };
}

interface Ratio {
  h: number;
  ratio: number;
  with: number;
  without: number;
}

const worstOf = (ratios: readonly Ratio[]): Ratio | undefined =>
  [...ratios].sort((a, b) => b.ratio - a.ratio || a.h - b.h)[0];

function starEarthedInService(context: CheckContext): boolean {
  return context.study.elements.some(
    (part) =>
      (part.kind === 'bank' || part.kind === 'filter') &&
      context.correction.has(part.id) &&
      withDefaults(part, context.study).connection === 'star-earthed',
  );
}

function atInjector(context: CheckContext, bus: string): Verdict {
  const row = rowAt(context, bus);
  const place = nameOf(busById(context.study, bus) ?? { id: bus });
  if (!context.solved.energised(bus)) return unknown(row, `${place} has no path to a source in this case`);
  const contents: Content[] = starEarthedInService(context) ? ['positive', 'zero'] : ['positive'];
  const present = contents.map((content) => presentOrders(context, bus, content));
  const ratios = contents.flatMap((content, index) =>
    impedanceRatios(context, bus, content, present[index] ?? []),
  );
  const worst = worstOf(ratios);
  if (!worst)
    return quiet(row, present.some((orders) => orders.length > 0) ? `no impedance is seen at ${place}` : '');
  return judged({
    ...row,
    order: worst.h,
    value: worst.ratio,
    limit: LIMIT,
    working: [
      {
        equation: `|Z_with(h) / Z_without(h)|, worst present order h = ${worst.h}`,
        numbers: `${figure(worst.with * 1000)} mΩ / ${figure(worst.without * 1000)} mΩ = ${figure(worst.ratio)}`,
      },
    ],
    mend: `The ${ordinal(worst.h)} is raised: detune the bank, or move its steps so that the resonance leaves this order.`,
  });
}

/** No order present: the rule is kept. Nothing to see: no verdict. */
function quiet(row: Row, missing: string): Verdict {
  if (missing !== '') return unknown(row, missing);
  return keptQuietly(row, 'No harmonic order is present at this busbar.', null, LIMIT);
}

function impedanceRatios(
  context: CheckContext,
  bus: string,
  content: Content,
  present: readonly number[],
): Ratio[] {
  if (present.length === 0) return [];
  const frequencyHz = Float64Array.from(present, (h) => h * context.study.frequencyHz);
  const span = { bus, sequence: content, frequencyHz };
  const after = context.scan(span);
  const before = context.scan(span, context.correction);
  if (after.error !== undefined || before.error !== undefined) return [];
  return present.map((h, index) => {
    const ohmWith = Math.hypot(after.re[index] ?? 0, after.im[index] ?? 0);
    const ohmWithout = Math.hypot(before.re[index] ?? 0, before.im[index] ?? 0);
    return { h, ratio: ohmWith / ohmWithout, with: ohmWith, without: ohmWithout };
  });
}

function background(context: CheckContext): Verdict[] {
  const orders = new Set(
    context.study.elements.flatMap((part) =>
      part.kind === 'supply' && isOn(part)
        ? (part.background ?? []).filter(({ percent }) => percent > 0).map(({ h }) => h)
        : [],
    ),
  );
  if (orders.size === 0) return [];
  const after = context.solveBackground(new Set());
  const before = context.solveBackground(context.correction);
  const buses = new Set(
    context.study.elements.flatMap((part) =>
      'bus' in part && context.correction.has(part.id) ? [part.bus] : [],
    ),
  );
  return [...buses].map((bus) => {
    const row: Row = {
      ...rowAt(context, bus),
      title: 'amplification of supply distortion',
      part: 'background',
    };
    if (!after.converged || !before.converged || !context.solved.energised(bus)) {
      return unknown(
        row,
        'the network under the distortion of its supply alone has no solution in this case',
      );
    }
    return atBackground(context, row, bus, orders, new SolvedCase(after), new SolvedCase(before));
  });
}

function atBackground(
  context: CheckContext,
  row: Row,
  bus: string,
  orders: ReadonlySet<number>,
  after: SolvedCase,
  before: SolvedCase,
): Verdict {
  const present = new Set([
    ...presentOrders(context, bus, 'positive'),
    ...presentOrders(context, bus, 'zero'),
  ]);
  const ratios = [...present]
    .filter((h) => orders.has(h))
    .flatMap((h) => {
      const loudest = SolvedCase.worstPhase((k) => before.volts(before.bus(bus), h, k));
      const without = before.volts(before.bus(bus), h, loudest);
      const volts = after.volts(after.bus(bus), h, loudest);
      return without > 0 ? [{ h, ratio: volts / without, with: volts, without }] : [];
    });
  const worst = worstOf(ratios);
  if (!worst) {
    const words = "No order of the supply's distortion is present at this busbar.";
    return keptQuietly(row, words, null, LIMIT);
  }
  return judged({
    ...row,
    order: worst.h,
    value: worst.ratio,
    limit: LIMIT,
    working: [
      {
        equation: `|U_h / E_h| with / without, supply distortion alone, worst present order h = ${worst.h}`,
        numbers: `${figure(worst.with)} V / ${figure(worst.without)} V = ${figure(worst.ratio)}`,
      },
    ],
    mend: `The supply's ${ordinal(worst.h)} is raised: detune the bank, or move its steps so that the series resonance with the transformer leaves this order.`,
  });
}
