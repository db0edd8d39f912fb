import type { CheckContext } from './CheckContext.ts';
import { bankAdmittance } from './correctionBranch.ts';
import { figure } from './figure.ts';
import { type LiveBank, liveBanks } from './liveBanks.ts';
import { partRow } from './partRow.ts';
import { SolvedCase } from './SolvedCase.ts';
import type { Verdict } from './types.ts';
import { judged } from './verdict.ts';

/** Per cent of nominal; the smaller where a controller switches the bank through the day. Common practice. */
const LIMIT = 3;
const LIMIT_OFTEN = 2;

/** A complex number in parts, ohm or siemens. */
interface Parts {
  re: number;
  im: number;
}

const product = (a: Parts, b: Parts): Parts => ({
  re: a.re * b.re - a.im * b.im,
  im: a.re * b.im + a.im * b.re,
});

const size = ({ re, im }: Parts): number => Math.hypot(re, im);

/**
 * U(step off)/U(step on) = |1 + Z·Y_step| with 1/Z = 1/Zs + Y_rest: the network seen from the busbar with the
 * bank's other steps beside it, all as linear parts at the fundamental.
 */
export function offOverOn(network: Parts, rest: Parts, step: Parts): number {
  const beside = product(network, rest);
  const factor = product(network, step);
  // 1 + Zs·Y_step/(1 + Zs·Y_rest), taken as one fraction.
  const below = size({ re: 1 + beside.re, im: beside.im });
  return size({ re: 1 + beside.re + factor.re, im: beside.im + factor.im }) / below;
}

/**
 * Change of the steady voltage when the largest step of a bank is switched (step-change), from the network's
 * impedance at its busbar: at most 3 %, 2 % for a bank under a controller. Loads are taken to hold their
 * current meanwhile.
 */
export function stepChange(context: CheckContext): Verdict[] {
  return liveBanks(context).flatMap((live) => atBank(context, live));
}

interface Change {
  kvar: number;
  /** Per cent of nominal, with the step on and off. */
  on: number;
  off: number;
  phase: number;
}

function changeOf(context: CheckContext, { bank, bus, kvar }: LiveBank): Change | null {
  const [largest] = [...bank.steps].sort(
    (a, b) => b.kvar - a.kvar || Number(b.on !== false) - Number(a.on !== false),
  );
  const network = context.networkOhm(bus.id);
  if (!largest || !network) return null;
  const isOn = largest.on !== false;
  const unit = bankAdmittance(bank, bus, 1)(1);
  const scaled = (by: number): Parts => ({ re: unit.re * by, im: unit.im * by });
  const ratio = offOverOn(network, scaled(isOn ? kvar - largest.kvar : kvar), scaled(largest.kvar));
  const index = context.solved.bus(bus.id);
  const phase = SolvedCase.worstPhase((k) => context.solved.volts(index, 1, k));
  const now = (context.solved.volts(index, 1, phase) / bus.nominalV) * Math.sqrt(3) * 100;
  const on = isOn ? now : now / ratio;
  return { kvar: largest.kvar, on, off: on * ratio, phase };
}

function atBank(context: CheckContext, live: LiveBank): Verdict[] {
  const { bank } = live;
  const change = changeOf(context, live);
  if (!change) return [];
  const row = partRow(context, bank.id, {
    check: 'step-change',
    title: 'voltage change by a step',
    unit: '%',
  });
  const value = Math.abs(change.on - change.off);
  const often = bank.controller !== undefined;
  const limit = often ? LIMIT_OFTEN : LIMIT;
  return [
    judged({
      ...row,
      value,
      limit,
      working: [
        {
          equation: 'ΔU = U(step on) − U(step off), U(off)/U(on) = |1 + Z · Y_step|',
          numbers: `step of ${figure(change.kvar)} kvar, L${change.phase + 1}: ${figure(change.on)} % − ${figure(change.off)} % = ${figure(value, 3)} %`,
        },
      ],
      remarks: often
        ? ['2 % asked, as a controller switches the bank often.']
        : ['3 % asked of a bank that is seldom switched; with a controller 2 %.'],
      mend: `Split the bank into smaller steps: about ${figure((change.kvar * 0.9 * limit) / value, 3)} kvar a step keeps it with a tenth in hand.`,
    }),
  ];
}
