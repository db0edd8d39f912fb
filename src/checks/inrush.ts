import type { CheckContext } from './CheckContext.ts';
import { figure } from './figure.ts';
import { isolatedPeakA, neededHenry } from './inrushPeak.ts';
import { judgedOnce } from './judgedOnce.ts';
import { inrushLimit } from './limits/capacitorLimit.ts';
import { capacitorSetFor } from './limits/choice.ts';
import type { Limit } from './limits/voltageLimit.ts';
import { type LiveBank, liveBanks } from './liveBanks.ts';
import { partRow } from './partRow.ts';
import type { Verdict } from './types.ts';
import { judged, unknown } from './verdict.ts';

/**
 * Inrush of a bank's steps (inrush): the crest of a step switched alone over its I_N, at most 100
 * (IEC 60831-1), in the smallest step, which is worst; against the switch's making current, where entered, in
 * the largest. A plain step beside others already on has no verdict: the inductance between them is not in
 * the study, and what is needed is told.
 */
export function inrush(context: CheckContext): Verdict[] {
  return liveBanks(context).flatMap((live) => {
    const choice = capacitorSetFor(context.study, live.bank);
    const limit = 'set' in choice ? inrushLimit(choice.set) : null;
    const alone = limit ? atBank(context, live, limit) : [];
    return limit && live.p === 0 && live.bank.steps.length > 1 && judgedOnce(context, live.bank.id)
      ? [...alone, besideOthers(context, live, limit)]
      : alone;
  });
}

const ratedA = (kvar: number, ratedV: number): number => (kvar * 1000) / (Math.sqrt(3) * ratedV);

function atBank(context: CheckContext, { bank, bus, p }: LiveBank, limit: Limit): Verdict[] {
  const ohm = context.networkOhm(bus.id);
  if (!ohm) return [];
  const xs = Math.hypot(ohm.re, ohm.im);
  const peak = (kvar: number): number => {
    const xc = bank.ratedV ** 2 / (kvar * 1000);
    return isolatedPeakA(bus.nominalV, xc, xs, p * xc);
  };
  const steps = bank.steps.map(({ kvar }) => kvar);
  const [small, large] = [Math.min(...steps), Math.max(...steps)];
  const level = `S_sc = ${figure(bus.nominalV ** 2 / xs / 1e6)} MVA at the busbar`;
  const value = peak(small) / ratedA(small, bank.ratedV);
  const equation =
    p > 0
      ? 'Î = √(2 · Xc / (Xs + X_L)) · I_N · U/U_N, the step alone'
      : 'Î = √2 · I_N · √(S_sc/Q), the step alone';
  const first = judged({
    ...partRow(context, bank.id, {
      check: 'inrush',
      title: 'inrush of a step alone',
      unit: '× I_N',
      part: 'alone',
      source: limit.source,
    }),
    value,
    limit: limit.value,
    working: [
      {
        equation,
        numbers: `step of ${figure(small)} kvar, ${level}: ${figure(peak(small))} A / ${figure(ratedA(small, bank.ratedV))} A = ${figure(value)}`,
      },
    ],
    remarks: ['Crest without damping, on the safe side.'],
    mend: 'Detune the bank, or use contactors with damping resistors.',
  });
  if (bank.switchMakingA === undefined) return [first];
  const made = judged({
    ...partRow(context, bank.id, {
      check: 'inrush',
      title: 'inrush against the switch',
      unit: 'A',
      part: 'making',
    }),
    value: peak(large),
    limit: bank.switchMakingA,
    working: [
      {
        equation: `${equation}, against the making current`,
        numbers: `step of ${figure(large)} kvar, ${level}: ${figure(peak(large))} A of ${figure(bank.switchMakingA)} A`,
      },
    ],
    mend: 'Choose a capacitor contactor of higher making current, or smaller steps.',
  });
  return [first, made];
}

function besideOthers(context: CheckContext, { bank, bus }: LiveBank, limit: Limit): Verdict {
  const farad = (kvar: number): number =>
    (kvar * 1000) / (2 * Math.PI * context.study.frequencyHz * bank.ratedV ** 2);
  const steps = [...bank.steps.map(({ kvar }) => kvar)].sort((a, b) => a - b);
  const small = steps[0] ?? 0;
  const rest = steps.slice(1).reduce((sum, kvar) => sum + kvar, 0);
  const equivalent = (farad(small) * farad(rest)) / (farad(small) + farad(rest));
  const peakA = limit.value * ratedA(small, bank.ratedV);
  const henry = neededHenry(bus.nominalV, equivalent, peakA);
  const row = partRow(context, bank.id, {
    check: 'inrush',
    title: 'inrush beside steps already on',
    unit: '× I_N',
    part: 'beside',
    source: limit.source,
  });
  row.working.push({
    equation: 'Î = U · √(2/3) · √(C_eq / L), the last step onto the others',
    numbers: `${figure(limit.value)} · I_N = ${figure(peakA)} A needs L of at least ${figure(henry * 1e6, 3)} µH per phase (C_eq = ${figure(equivalent * 1e6)} µF)`,
  });
  const missing = `the inductance between the steps is not in the study: ask the maker for at least ${figure(henry * 1e6, 3)} µH per phase, or for contactors with damping resistors`;
  return unknown(row, missing);
}
