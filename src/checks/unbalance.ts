import type { Bus, Study } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { figure } from './figure.ts';
import { bandSetFor } from './limits/choice.ts';
import { iec61000x2x2 } from './limits/iec61000-2-2.ts';
import type { CitedValue, LimitSet } from './limits/types.ts';
import { citation } from './limits/voltageLimit.ts';
import { margin, verdictWord } from './margin.ts';
import type { SolvedCase } from './SolvedCase.ts';
import { negativeSequence, positiveSequence, type Rectangular } from './sequences.ts';
import type { Verdict } from './types.ts';
import { judged, type Row, unknown } from './verdict.ts';

/** Fundamental voltage unbalance U2/U1 per busbar (unbalance), 2 % by IEC 61000-2-2 unless the set says else. */
export function unbalance(context: CheckContext): Verdict[] {
  return context.study.buses.flatMap((bus) =>
    context.solved.energised(bus.id) ? [atBus(context, bus)] : [],
  );
}

/** The limit of unbalance and the set it stands in; IEC 61000-2-2 where the chosen set has none. */
export function unbalanceLimit(study: Study, isPcc: boolean): { set: LimitSet; cited: CitedValue } {
  const set = bandSetFor(study, isPcc);
  if (set.unbalancePercent) return { set, cited: set.unbalancePercent };
  const cited = iec61000x2x2.unbalancePercent;
  if (!cited) throw new RangeError('IEC 61000-2-2 lacks its limit of unbalance');
  return { set: iec61000x2x2, cited };
}

/** |V2|/|V1| in per cent at the fundamental; null without positive-sequence voltage. */
export function unbalancePercent(solved: SolvedCase, bus: Bus): number | null {
  const { voltage, maxOrder } = solved.solution;
  const at = solved.bus(bus.id) * maxOrder * 3;
  const phases: Rectangular[] = [0, 1, 2].map((k) => ({
    re: voltage.re[at + k] ?? 0,
    im: voltage.im[at + k] ?? 0,
  }));
  const v1 = positiveSequence(phases);
  const v2 = negativeSequence(phases);
  const size = Math.hypot(v1.re, v1.im);
  return size < (1e-6 * bus.nominalV) / Math.sqrt(3) ? null : (Math.hypot(v2.re, v2.im) / size) * 100;
}

function atBus(context: CheckContext, bus: Bus): Verdict {
  const { set, cited } = unbalanceLimit(context.study, context.pccBuses.has(bus.id));
  const row: Row = {
    check: 'unbalance',
    title: 'voltage unbalance',
    subject: { kind: 'bus', id: bus.id },
    caseId: context.caseId,
    unit: '%',
    source: citation(set, cited),
    working: [],
  };
  const value = unbalancePercent(context.solved, bus);
  if (value === null) return unknown(row, 'the busbar carries no positive-sequence voltage');
  const without = context.without();
  const before = without?.energised(bus.id) ? unbalancePercent(without, bus) : null;
  return judged({
    ...row,
    value,
    limit: cited.value,
    working: () => [{ equation: 'U2 / U1 at the fundamental', numbers: `${figure(value)} %` }],
    mend: 'Spread the single-phase loads over the phases, or feed them from a stiffer busbar.',
    ...(before === null
      ? {}
      : { withoutCorrection: { value: before, verdict: verdictWord(margin(before, cited.value)) } }),
  });
}
