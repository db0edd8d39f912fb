import type { Bus } from '../study/index.ts';
import { busById, casesOf } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { figure } from './figure.ts';
import type { SolvedCase } from './SolvedCase.ts';
import { commonPractice } from './source.ts';
import type { Verdict, Working } from './types.ts';
import { judged, type Row, unknown } from './verdict.ts';

/** Per cent of the nominal voltage. */
const LIMIT = 3;

/**
 * Rise of the steady voltage by the correction at light load, U(with) − U(without), at each busbar that
 * carries correction (light-load-rise): at most 3 % of nominal, common practice. Judged in the cases of role
 * "light"; in every case of a study that has none.
 */
export function lightLoadRise(context: CheckContext): Verdict[] {
  if (context.correction.size === 0) return [];
  const hasLight = casesOf(context.base).some(({ role }) => role === 'light');
  if (hasLight && context.role !== 'light') return [];
  const ids = new Set(
    context.study.elements.flatMap((part) =>
      'bus' in part && context.correction.has(part.id) ? [part.bus] : [],
    ),
  );
  return [...ids].flatMap((id) => {
    const bus = busById(context.study, id);
    return bus && context.solved.energised(id) ? [atBus(context, bus, hasLight)] : [];
  });
}

const volts = (solved: SolvedCase, bus: Bus, phase: number): number =>
  solved.volts(solved.bus(bus.id), 1, phase);

function atBus(context: CheckContext, bus: Bus, hasLight: boolean): Verdict {
  const row: Row = {
    check: 'light-load-rise',
    title: 'voltage rise by the correction',
    subject: { kind: 'bus', id: bus.id },
    caseId: context.caseId,
    unit: '%',
    source: commonPractice,
    working: [],
    remarks: hasLight ? [] : ['The study has no light-load case; the rise is taken in this one.'],
  };
  const without = context.without();
  if (!without?.energised(bus.id))
    return unknown(row, 'the case without the correction has no solution, so the rise is not known');
  const nominal = bus.nominalV / Math.sqrt(3);
  const rises = [0, 1, 2].map(
    (k) => ((volts(context.solved, bus, k) - volts(without, bus, k)) / nominal) * 100,
  );
  const phase = rises.indexOf(Math.max(...rises));
  const value = rises[phase] ?? 0;
  return judged({
    ...row,
    value,
    limit: LIMIT,
    working: [
      {
        equation: 'U(with) − U(without), worst phase, of U_n/√3',
        numbers: `L${phase + 1}: ${figure(volts(context.solved, bus, phase))} V − ${figure(volts(without, bus, phase))} V = ${figure(value)} %`,
      },
      ...crossCheck(context, bus),
    ],
    mend: 'Switch steps off at light load by the controller, or leave less of the kvar fixed.',
  });
}

/** 100·Q/S_sc from the kvar at the busbar and the impedance seen there. */
function crossCheck(context: CheckContext, bus: Bus): Working[] {
  const ohm = context.networkOhm(bus.id);
  if (!ohm) return [];
  const shortCircuitMVA = bus.nominalV ** 2 / Math.hypot(ohm.re, ohm.im) / 1e6;
  const kvar = correctionKvar(context, bus);
  return [
    {
      equation: 'cross-check 100 · Q / S_sc',
      numbers: `100 · ${figure(kvar)} kvar / ${figure(shortCircuitMVA)} MVA = ${figure((100 * kvar) / (shortCircuitMVA * 1000))} %`,
    },
  ];
}

/** Kvar drawn (negative Q) by the correction of a busbar as solved, kvar above zero. */
function correctionKvar(context: CheckContext, bus: Bus): number {
  const { voltage, current, maxOrder } = context.solved.solution;
  const at = context.solved.bus(bus.id) * maxOrder * 3;
  let vars = 0;
  for (const part of context.study.elements) {
    const terminal = context.correction.has(part.id) ? context.solved.terminal(part.id, bus.id) : undefined;
    if (terminal === undefined) continue;
    for (let k = 0; k < 3; k++) {
      const i = terminal * maxOrder * 3 + k;
      vars -=
        (voltage.im[at + k] ?? 0) * (current.re[i] ?? 0) - (voltage.re[at + k] ?? 0) * (current.im[i] ?? 0);
    }
  }
  return vars / 1000;
}
