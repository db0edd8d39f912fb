import type { Bus } from '../study/index.ts';
import { busById, elementsOfKind, isOn } from '../study/index.ts';
import { namedSource } from './busThd.ts';
import type { CheckContext } from './CheckContext.ts';
import { angleRemarks } from './distortion.ts';
import { figure, ordinal } from './figure.ts';
import { inflowAt } from './inflow.ts';
import { currentSetFor } from './limits/choice.ts';
import { type CurrentRowLimits, currentLimits } from './limits/currentLimit.ts';
import { margin, verdictWord, WATCH_MARGIN } from './margin.ts';
import type { SolvedCase } from './SolvedCase.ts';
import type { Verdict, Working } from './types.ts';
import { judged, type Row, unknown } from './verdict.ts';

/**
 * TDD and single harmonic currents at each PCC against the current set (pcc-tdd, pcc-order). Nothing is
 * said for a site off the grid, or where no set is chosen nor default and no demand current is entered.
 */
export function pccCurrent(context: CheckContext): Verdict[] {
  const { study } = context;
  const asked = 'set' in currentSetFor(study) || study.limits?.current !== undefined;
  if (!asked && study.criteria?.demandCurrentA === undefined) return [];
  if (!elementsOfKind(study, 'supply').some(isOn)) return [];
  return [...context.pccBuses].flatMap((id) => {
    const bus = busById(context.study, id);
    return bus ? atPcc(context, bus) : [];
  });
}

/** I_h into the site by order (index h − 1), amperes: the larger phase; feeders are added by magnitude. */
function harmonicAmperes(solved: SolvedCase, terminals: readonly number[]): number[] {
  return Array.from({ length: solved.maxOrder }, (_, index) =>
    Math.max(
      ...[0, 1, 2].map((k) =>
        terminals.reduce((sum, terminal) => sum + solved.amperes(terminal, index + 1, k), 0),
      ),
    ),
  );
}

function atPcc(context: CheckContext, bus: Bus): Verdict[] {
  const choice = currentSetFor(context.study);
  const row: Row = {
    check: 'pcc-tdd',
    title: 'current distortion at the PCC (TDD)',
    subject: { kind: 'bus', id: bus.id },
    caseId: context.caseId,
    unit: '%',
    source: namedSource(choice),
    working: [],
  };
  const inflow = inflowAt(context.study, context.solved, bus.id);
  if (!inflow) return [unknown(row, 'nothing feeds the PCC in this case')];
  if (!('set' in choice)) return [unknown(row, choice.missing)];
  const demandA = context.study.criteria?.demandCurrentA;
  const shortCircuitMVA = context.study.criteria?.shortCircuitMVAAtPcc;
  const absent = [
    demandA === undefined ? 'the maximum demand current I_L' : '',
    shortCircuitMVA === undefined ? 'the fault level at the PCC' : '',
  ].filter((words) => words !== '');
  if (demandA === undefined || shortCircuitMVA === undefined) {
    return [unknown(row, `enter ${absent.join(' and ')}: they choose the row of the limits`)];
  }
  const shortCircuitA = (shortCircuitMVA * 1e6) / (Math.sqrt(3) * bus.nominalV);
  const limits = currentLimits(choice.set, bus.nominalV, shortCircuitA / demandA);
  if (!limits) return [unknown(row, `${choice.set.label} has no current limits here; choose another set`)];
  const amperes = harmonicAmperes(context.solved, inflow.terminals);
  const before = beforeCorrection(context, bus);
  const ratio: Working = {
    equation: 'Isc / I_L',
    numbers: `${figure(shortCircuitA)} A / ${figure(demandA)} A = ${figure(shortCircuitA / demandA)}: ${limits.words}`,
  };
  const remark =
    inflow.terminals.length > 1
      ? ['Several feeders supply the PCC; their currents are added by magnitude.']
      : [];
  const base: Row = { ...row, remarks: remark };
  return [
    tdd(context, base, limits, { amperes, before, demandA, ratio }),
    ...orders(context, base, limits, { amperes, before, demandA, ratio }),
  ];
}

/** Currents at the PCC by order, with the correction and without, and what they are measured against. */
interface Emission {
  amperes: number[];
  /** The same without the correction; null where there is none or that case has no solution. */
  before: number[] | null;
  demandA: number;
  ratio: Working;
}

function beforeCorrection(context: CheckContext, bus: Bus): number[] | null {
  const without = context.without();
  const inflow = without ? inflowAt(context.study, without, bus.id) : null;
  return without && inflow ? harmonicAmperes(without, inflow.terminals) : null;
}

function withoutCorrection(percent: number | null, limit: number): Pick<Row, 'withoutCorrection'> {
  if (percent === null) return {};
  return { withoutCorrection: { value: percent, verdict: verdictWord(margin(percent, limit)) } };
}

/** √(Σ I_h²), h = 2 to 50. */
const totalOf = (amperes: readonly number[]): number =>
  Math.sqrt(amperes.slice(1, 50).reduce((sum, ampere) => sum + ampere ** 2, 0));

function tdd(context: CheckContext, row: Row, limits: CurrentRowLimits, emission: Emission): Verdict {
  const { amperes, before, demandA, ratio } = emission;
  const harmonicA = totalOf(amperes);
  const value = (harmonicA / demandA) * 100;
  const unknownOrders = (): number[] =>
    amperes.flatMap((ampere, index) =>
      index > 0 && ampere > 1e-3 * demandA && context.solved.anglesUnknown(index + 1) ? [index + 1] : [],
    );
  return judged({
    ...row,
    value,
    limit: limits.tdd.value,
    source: limits.tdd.source,
    ...withoutCorrection(before && (totalOf(before) / demandA) * 100, limits.tdd.value),
    working: () => [
      ratio,
      {
        equation: 'TDD = √(Σ I_h²) / I_L',
        numbers: `${figure(harmonicA)} A / ${figure(demandA)} A = ${figure(value)} %`,
      },
    ],
    remarks: () => [...(row.remarks ?? []), ...angleRemarks(context.solved, unknownOrders())],
    mend: 'Filter the lowest large order, or lower the emission with chokes or a higher pulse number.',
  });
}

function orders(context: CheckContext, row: Row, limits: CurrentRowLimits, emission: Emission): Verdict[] {
  const { amperes, before, demandA, ratio } = emission;
  const found = amperes
    .map((ampere, index) => ({
      h: index + 1,
      percent: (ampere / demandA) * 100,
      limit: limits.order(index + 1),
    }))
    .flatMap(({ h, percent, limit }) =>
      limit ? [{ h, percent, limit, margin: margin(percent, limit.value) }] : [],
    )
    .sort((a, b) => a.margin - b.margin || a.h - b.h);
  return found
    .filter((order, index) => index === 0 || order.margin < WATCH_MARGIN)
    .map(({ h, percent, limit }) => {
      const unknownAt = context.solved.anglesUnknown(h) ? [h] : [];
      return judged({
        ...row,
        check: 'pcc-order',
        title: `${ordinal(h)} harmonic current at the PCC`,
        order: h,
        value: percent,
        limit: limit.value,
        source: limit.source,
        ...withoutCorrection(before && ((before[h - 1] ?? 0) / demandA) * 100, limit.value),
        working: () => [
          ratio,
          {
            equation: `I_${h} / I_L`,
            numbers: `${figure((percent * demandA) / 100)} A / ${figure(demandA)} A = ${figure(percent)} %`,
          },
        ],
        remarks: () => [...(row.remarks ?? []), ...angleRemarks(context.solved, unknownAt)],
        mend: `Fit a filter tuned just below the ${ordinal(h)}, or lower the emission with chokes or a higher pulse number.`,
      });
    });
}
