import { nameOf } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { angleRemarks } from './distortion.ts';
import { figure } from './figure.ts';
import { judgedOnce } from './judgedOnce.ts';
import { type LiveBank, liveBanks } from './liveBanks.ts';
import { partRow } from './partRow.ts';
import { SolvedCase } from './SolvedCase.ts';
import type { Verdict } from './types.ts';
import { judged, unknown } from './verdict.ts';

/** Reactors are customarily linear to at least this multiple of I1. */
const LINEAR_SHARE = 1.6;

/**
 * Detuning reactors (reactor-duty): I_rms/I_rated ≤ 1, and (I1 + ΣI_h)/I1 within the linear range,
 * reactorLinearA or else the customary 1.6·I1. Ratings are those of the bank with all steps on and are taken
 * in proportion to the kvar on.
 */
export function reactorDuty(context: CheckContext): Verdict[] {
  return liveBanks(context).flatMap((live) =>
    live.p > 0 ? [...rms(context, live), linear(context, live)] : [],
  );
}

/** Share of the bank's kvar that is on. */
export const shareOn = ({ bank, kvar }: LiveBank): number =>
  kvar / bank.steps.reduce((sum, step) => sum + step.kvar, 0);

const scaledRemark = (live: LiveBank): string[] =>
  shareOn(live) < 1 - 1e-9
    ? [`Ratings of the whole bank are taken in proportion to the kvar on (${figure(shareOn(live), 3)}).`]
    : [];

function rms(context: CheckContext, live: LiveBank): Verdict[] {
  const { bank, terminal } = live;
  const phase = SolvedCase.worstPhase((k) => context.solved.rmsAmperes(terminal, k));
  const ampere = context.solved.rmsAmperes(terminal, phase);
  const row = partRow(context, bank.id, {
    check: 'reactor-duty',
    title: 'reactor current',
    unit: 'p.u.',
    part: 'rms',
  });
  if (bank.ratedReactorA === undefined) {
    if (!judgedOnce(context, bank.id)) return [];
    row.working.push({
      equation: 'I_rms = √(Σ I_h²)',
      numbers: `L${phase + 1}: ${figure(ampere)} A with ${figure(live.kvar)} kvar on`,
    });
    const missing = `enter the rated reactor current of ${nameOf(bank)}, all steps on; it carries ${figure(ampere)} A here`;
    return [unknown(row, missing)];
  }
  const ratedA = bank.ratedReactorA * shareOn(live);
  return [
    judged({
      ...row,
      value: ampere / ratedA,
      limit: 1,
      working: () => [
        {
          equation: 'I_rms / I_rated',
          numbers: `L${phase + 1}: ${figure(ampere)} A / ${figure(ratedA)} A = ${figure(ampere / ratedA)}`,
        },
      ],
      remarks: () => [...scaledRemark(live), ...angles(context, live)],
      mend: 'Order reactors for the current shown with a tenth in hand, or lower the tuning so that the branch takes up less of the lowest order.',
    }),
  ];
}

/** Linear range over the fundamental: the entered one, or the customary 1.6 times. */
export function linearLimitOf(live: LiveBank, fundamentalA: number): number {
  const entered = live.bank.reactorLinearA;
  return entered === undefined ? LINEAR_SHARE : (entered * shareOn(live)) / fundamentalA;
}

function linear(context: CheckContext, live: LiveBank): Verdict {
  const { bank, terminal } = live;
  const { solved } = context;
  const sums = [0, 1, 2].map((k) => {
    let sum = 0;
    for (let h = 1; h <= solved.maxOrder; h++) sum += solved.amperes(terminal, h, k);
    return sum;
  });
  const phase = sums.indexOf(Math.max(...sums));
  const fundamental = solved.amperes(terminal, 1, phase);
  const sum = sums[phase] ?? 0;
  const row = partRow(context, bank.id, {
    check: 'reactor-duty',
    title: 'reactor linear range',
    unit: '×',
    part: 'linear',
  });
  return judged({
    ...row,
    value: sum / fundamental,
    limit: linearLimitOf(live, fundamental),
    working: () => [
      {
        equation: '(I1 + Σ I_h) / I1, all crests taken to coincide',
        numbers: `L${phase + 1}: ${figure(sum)} A / ${figure(fundamental)} A = ${figure(sum / fundamental)}`,
      },
    ],
    remarks: () => [
      ...(bank.reactorLinearA === undefined
        ? ['The linear range is not entered; the customary 1.6 times the fundamental stands in for it.']
        : scaledRemark(live)),
      ...angles(context, live),
    ],
    mend: 'Order reactors that stay linear to the current shown, or lower the tuning so that the branch takes up less.',
  });
}

function angles({ solved }: CheckContext, { terminal }: LiveBank): string[] {
  const orders: number[] = [];
  for (let h = 2; h <= solved.maxOrder; h++) {
    if (solved.anglesUnknown(h) && solved.amperes(terminal, h, 0) > 1e-3 * solved.amperes(terminal, 1, 0))
      orders.push(h);
  }
  return angleRemarks(solved, orders);
}
