import type { CheckContext } from './CheckContext.ts';
import { figure } from './figure.ts';
import { type LiveBank, liveBanks } from './liveBanks.ts';
import { partRow } from './partRow.ts';
import { SolvedCase } from './SolvedCase.ts';
import type { Verdict } from './types.ts';
import { judged, unknown } from './verdict.ts';

/** Per cent of nominal; the smaller where a controller switches the bank through the day. Common practice. */
const LIMIT = 3;
const LIMIT_OFTEN = 2;

/**
 * Change of the steady voltage when the largest step of a bank is switched (step-change), from two solutions
 * of the fundamental, with and without that step: at most 3 %, 2 % for a bank under a controller.
 */
export function stepChange(context: CheckContext): Verdict[] {
  return liveBanks(context).map((live) => atBank(context, live));
}

function atBank(context: CheckContext, { bank, bus, kvar }: LiveBank): Verdict {
  const largest = [...bank.steps].sort(
    (a, b) => b.kvar - a.kvar || Number(b.on !== false) - Number(a.on !== false),
  )[0];
  const row = partRow(context, bank.id, {
    check: 'step-change',
    title: 'voltage change by a step',
    unit: '%',
  });
  if (!largest) return unknown(row, 'the bank has no steps');
  const on = largest.on !== false;
  const other = on ? kvar - largest.kvar : kvar + largest.kvar;
  const solution = context.solveFundamental(new Map([[bank.id, other > 1e-9 ? other : 0]]));
  if (!solution.converged) return unknown(row, 'the case with that step switched has no solution');
  const switched = new SolvedCase(solution);
  const nominal = bus.nominalV / Math.sqrt(3);
  const percent = (solved: SolvedCase, k: number): number =>
    (solved.volts(solved.bus(bus.id), 1, k) / nominal) * 100;
  const phase = SolvedCase.worstPhase((k) => Math.abs(percent(switched, k) - percent(context.solved, k)));
  const [low, high] = [percent(switched, phase), percent(context.solved, phase)].sort((a, b) => a - b) as [
    number,
    number,
  ];
  const value = high - low;
  const often = bank.controller !== undefined;
  return judged({
    ...row,
    value,
    limit: often ? LIMIT_OFTEN : LIMIT,
    working: [
      {
        equation: 'ΔU = U(step on) − U(step off), worst phase, of U_n/√3',
        numbers: `step of ${figure(largest.kvar)} kvar, L${phase + 1}: ${figure(high)} % − ${figure(low)} % = ${figure(value, 3)} %`,
      },
    ],
    remarks: often
      ? ['2 % asked, as a controller switches the bank often.']
      : ['3 % asked of a bank that is seldom switched; with a controller 2 %.'],
    mend: `Split the bank into smaller steps: about ${figure((largest.kvar * 0.9 * (often ? LIMIT_OFTEN : LIMIT)) / value, 3)} kvar a step keeps it with a tenth in hand.`,
  });
}
