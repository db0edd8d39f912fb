import type { Motor } from '../study/index.ts';
import { busById, isOn } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { angleRemarks, unknownAngleOrders } from './distortion.ts';
import { figure } from './figure.ts';
import { motorLimit } from './limits/motorLimits.ts';
import { margin, verdictWord } from './margin.ts';
import { partRow } from './partRow.ts';
import type { SolvedCase } from './SolvedCase.ts';
import type { Verdict } from './types.ts';
import { judged, unknown } from './verdict.ts';

/** The factor says nothing when the study stops below the 13th. */
const LOWEST_LAST_ORDER = 13;

/**
 * HVF = √Σ(U_h²/h), U_h per unit of U_N, over the orders not divisible by 3 — odd ones alone where `oddOnly`.
 * perUnit[h − 1] at orders 1…n. IEC 60034-1, NEMA MG 1 (definition second-hand).
 */
export function harmonicVoltageFactor(perUnit: ArrayLike<number>, oddOnly: boolean): number {
  let sum = 0;
  for (let h = 2; h <= perUnit.length; h++) {
    if (h % 3 === 0 || (oddOnly && h % 2 === 0)) continue;
    sum += (perUnit[h - 1] ?? 0) ** 2 / h;
  }
  return Math.sqrt(sum);
}

/** Harmonic voltage factor at each motor in service, worst phase (motor-hvf). */
export function motorHvf(context: CheckContext): Verdict[] {
  return context.study.elements.flatMap((part) =>
    part.kind === 'motor' && isOn(part) && context.solved.energised(part.bus) ? [atMotor(context, part)] : [],
  );
}

/** The factor of the phase where it is largest. */
export function worstVoltageFactor(
  solved: SolvedCase,
  busId: string,
  nominalV: number,
  oddOnly: boolean,
): { value: number; phase: number } {
  const index = solved.bus(busId);
  const perUnit = new Array<number>(solved.maxOrder).fill(0);
  let worst = { value: -1, phase: 0 };
  for (let phase = 0; phase < 3; phase++) {
    for (let h = 2; h <= solved.maxOrder; h++)
      perUnit[h - 1] = (solved.volts(index, h, phase) / nominalV) * Math.sqrt(3);
    const value = harmonicVoltageFactor(perUnit, oddOnly);
    if (value > worst.value) worst = { value, phase };
  }
  return worst;
}

function atMotor(context: CheckContext, motor: Motor): Verdict {
  const rule = motorLimit(motor.voltageFactorDesign, context.study.frequencyHz);
  const row = partRow(context, motor.id, {
    check: 'motor-hvf',
    title: 'harmonic voltage factor at the motor',
    unit: '',
    source: rule.source,
  });
  const bus = busById(context.study, motor.bus);
  if (!bus || context.solved.maxOrder < LOWEST_LAST_ORDER) {
    return unknown(
      row,
      `the study stops at order ${context.solved.maxOrder}: solve to the 13th at least to form the factor`,
    );
  }
  const { value, phase } = worstVoltageFactor(context.solved, bus.id, bus.nominalV, rule.oddOnly);
  const without = context.without();
  const before = without?.energised(bus.id)
    ? worstVoltageFactor(without, bus.id, bus.nominalV, rule.oddOnly).value
    : null;
  return judged({
    ...row,
    value,
    limit: rule.value,
    working: () => [
      {
        equation: `HVF = √Σ(U_h²/h), ${rule.oddOnly ? 'odd orders' : 'all orders'} not divisible by 3`,
        numbers: `L${phase + 1}: ${figure(value)}, allowed ${figure(rule.value)} (${rule.label})`,
      },
    ],
    remarks: () => [
      ...(motor.voltageFactorDesign === undefined ? [`No design is entered; judged as ${rule.label}.`] : []),
      ...angleRemarks(context.solved, unknownAngleOrders(context.solved, bus)),
    ],
    mend: 'Lower the lowest large order at this busbar with chokes or a filter, or derate the motor.',
    ...(before === null
      ? {}
      : { withoutCorrection: { value: before, verdict: verdictWord(margin(before, rule.value)) } }),
  });
}
