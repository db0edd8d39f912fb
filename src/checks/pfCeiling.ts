import { busById, nameOf } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { figure } from './figure.ts';
import { inflowAt } from './inflow.ts';
import { meteredBusesOf } from './pcc.ts';
import { commonPractice } from './source.ts';
import type { Verdict } from './types.ts';
import { judged } from './verdict.ts';

/** Above this ceiling distortion costs the true power factor too little to speak of. */
const WORTH_SAYING = 0.995;

/** True power factor that kvar alone can reach with undistorted voltage: 1/√(1 + THD_I²), THD_I per unit. */
export function pfCeilingOf(thd: number): number {
  if (!(thd >= 0)) throw new RangeError(`THD ${thd}: zero or more is possible`);
  return 1 / Math.sqrt(1 + thd * thd);
}

/**
 * True power factor attainable by kvar alone (pf-ceiling), where the current at a metered busbar is distorted
 * enough to matter. It informs: the target is a displacement factor unless the tariff says otherwise.
 */
export function pfCeiling(context: CheckContext): Verdict[] {
  const target = context.study.criteria?.targetPF ?? 0.95;
  if (context.role !== 'load' || target >= 1) return [];
  return meteredBusesOf(context.study, context.pccBuses).flatMap((id) => atBus(context, id, target));
}

function atBus(context: CheckContext, id: string, target: number): Verdict[] {
  const { solved } = context;
  const inflow = inflowAt(context.study, solved, id);
  if (!inflow || inflow.kW <= 0) return [];
  const total = (h: number, k: number): number =>
    inflow.terminals.reduce((sum, terminal) => sum + solved.amperes(terminal, h, k), 0);
  const thds = [0, 1, 2].map((k) => {
    let squares = 0;
    for (let h = 2; h <= solved.maxOrder; h++) squares += total(h, k) ** 2;
    const fundamental = total(1, k);
    return fundamental > 1e-6 ? Math.sqrt(squares) / fundamental : 0;
  });
  const thd = Math.max(...thds);
  const value = pfCeilingOf(thd);
  if (value > WORTH_SAYING) return [];
  return [
    judged({
      check: 'pf-ceiling',
      title: 'true power factor by kvar alone',
      subject: { kind: 'bus', id },
      caseId: context.caseId,
      unit: '',
      source: commonPractice,
      screening: true,
      value,
      limit: target,
      reference: 1,
      sense: 'lower',
      working: [
        {
          equation: '1 / √(1 + THD_I²)',
          numbers: `THD_I ${figure(thd * 100, 3)} % at ${nameOf(busById(context.study, id) ?? { id })}: ${figure(value)}`,
        },
      ],
      remarks: ['Informs only: a tariff on displacement power factor is not touched by distortion.'],
      mend: 'Kvar alone does not reach the target as true power factor: lower the distortion with chokes, higher pulse numbers or filters.',
    }),
  ];
}
