import type { Filter } from '../study/index.ts';
import { busById, isOn, nameOf, withDefaults } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { capacitorVerdicts } from './capacitorVerdicts.ts';
import { filterAdmittance, filterXc, filterXl } from './correctionBranch.ts';
import { figure } from './figure.ts';
import { commonPractice } from './source.ts';
import type { Verdict, Working } from './types.ts';
import { unitAmperes } from './unitAmperes.ts';
import { type Row, unknown } from './verdict.ts';

const checks = { current: 'filter-duty', voltage: 'filter-duty', kvar: 'filter-duty' } as const;

/**
 * Duty of every filter in service (filter-duty): current, voltage, crest and kvar of the main capacitor;
 * reactor current and resistor loss, and the auxiliary capacitor of a c-type, are shown without a verdict,
 * as the study holds no rating for them.
 */
export function filterDuty(context: CheckContext): Verdict[] {
  return context.study.elements.flatMap((part) =>
    part.kind === 'filter' && isOn(part) ? atFilter(context, part) : [],
  );
}

function atFilter(context: CheckContext, filter: Filter): Verdict[] {
  const bus = busById(context.study, filter.bus);
  const terminal = context.solved.terminal(filter.id, filter.bus);
  const row: Row = {
    check: 'filter-duty',
    title: 'filter reactor and resistor',
    subject: { kind: 'element', id: filter.id },
    caseId: context.caseId,
    unit: 'A',
    source: commonPractice,
    working: [],
    part: 'reactor',
  };
  if (!bus || terminal === undefined || !context.solved.energised(filter.bus)) {
    return [unknown(row, `the busbar of ${nameOf(filter)} has no path to a source in this case`)];
  }
  const real = context.actual(filter);
  const { frequencyFactor } = context;
  const admittance = filterAdmittance(real, bus);
  const connection = withDefaults(filter, context.study).connection;
  const capacitor = capacitorVerdicts(context, context.study, {
    id: filter.id,
    words: 'filter capacitor',
    checks,
    xcOhm: filterXc(real, bus) / frequencyFactor,
    ratedV: filter.ratedV,
    ratedKvar: filter.ratedV ** 2 / filterXc(filter, bus) / 1000,
    amperes: unitAmperes(context.solved, {
      terminal,
      bus: bus.id,
      connection,
      admittance: (h) => admittance(h * frequencyFactor),
    }),
    orderCount: context.solved.maxOrder,
  });
  const duty = innerDuty(real, filterXl(real, bus), lineAmperes(context, terminal));
  const missing = `the study holds no rating for the reactor${filter.type === 'single-tuned' ? '' : ' and the resistor'}${filter.type === 'c-type' ? ' or the auxiliary capacitor' : ''} of ${nameOf(filter)}: order to the duty shown`;
  return [...capacitor, unknown({ ...row, working: duty.working }, missing, duty.reactorA)];
}

/** Line current by order of the phase with the largest rms. */
function lineAmperes(context: CheckContext, terminal: number): number[] {
  const { solved } = context;
  const phase =
    [0, 1, 2].sort((a, b) => solved.rmsAmperes(terminal, b) - solved.rmsAmperes(terminal, a))[0] ?? 0;
  return Array.from({ length: solved.maxOrder }, (_, index) => solved.amperes(terminal, index + 1, phase));
}

export interface InnerDuty {
  reactorA: number;
  resistorWPerPhase: number;
  /** C-type only: volts of the auxiliary capacitor, line-to-line equivalent. */
  auxiliaryV: number | null;
  working: Working[];
}

/**
 * Current shares inside a filter from its line current by order: single-tuned all in series; high-pass
 * R ∥ jhX_L; c-type R ∥ j(hX_L − X_C2/h) with X_C2 = X_L. Star-equivalent ohm, amperes rms per phase.
 */
export function innerDuty(
  filter: Pick<Filter, 'type' | 'tunedOrder' | 'qFactor'>,
  xlOhm: number,
  amperes: readonly number[],
): InnerDuty {
  const resistance =
    filter.type === 'single-tuned'
      ? (filter.tunedOrder * xlOhm) / filter.qFactor
      : filter.qFactor * filter.tunedOrder * xlOhm;
  let reactor = 0;
  let loss = 0;
  let auxiliary = 0;
  amperes.forEach((ampere, index) => {
    const h = index + 1;
    if (filter.type === 'single-tuned') {
      reactor += ampere ** 2;
      loss += resistance * ampere ** 2;
      return;
    }
    const x = filter.type === 'high-pass' ? h * xlOhm : h * xlOhm - xlOhm / h;
    const square = resistance ** 2 + x ** 2;
    const reactorSquare = (ampere ** 2 * resistance ** 2) / square;
    reactor += reactorSquare;
    loss += (resistance * ampere ** 2 * x ** 2) / square;
    auxiliary += 3 * reactorSquare * (xlOhm / h) ** 2;
  });
  const reactorA = Math.sqrt(reactor);
  const auxiliaryV = filter.type === 'c-type' ? Math.sqrt(auxiliary) : null;
  const working = [
    { equation: 'reactor current, √(Σ I_h²)', numbers: `${figure(reactorA)} A per phase` },
    {
      equation: 'resistor loss, Σ R · I_R,h²',
      numbers: `${figure(loss)} W per phase, R = ${figure(resistance)} Ω`,
    },
  ];
  if (auxiliaryV !== null) {
    working.push({
      equation: 'auxiliary capacitor, √(Σ (√3 · I_h · X_C2/h)²)',
      numbers: `${figure(auxiliaryV)} V line-to-line equivalent`,
    });
  }
  return { reactorA, resistorWPerPhase: loss, auxiliaryV, working };
}
