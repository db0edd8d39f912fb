import type { Bus } from '../../study/index.ts';
import { busById, elementsOfKind, isOn } from '../../study/index.ts';
import type { CheckContext } from '../CheckContext.ts';
import { inflowAt } from '../inflow.ts';
import { currentSetFor } from '../limits/choice.ts';
import { type CurrentRowLimits, currentLimits } from '../limits/currentLimit.ts';
import { meteredBusesOf } from '../pcc.ts';
import { type Gauge, type GaugedState, NOT_FORMED } from './Gauge.ts';

/**
 * Displacement power factor where the site is metered. `judgedPF` names the busbars at which the case's own
 * verdict is a power factor: light load, export and generators are judged otherwise, and stay with that. A
 * point at which motors stand still is another load, not the case's power factor.
 */
export function powerFactorGauges(context: CheckContext, judgedPF: ReadonlySet<string>): Gauge[] {
  const target = context.study.criteria?.targetPF ?? 0.95;
  const motors = context.study.elements
    .filter((part) => part.kind === 'motor' && isOn(part))
    .map(({ id }) => id);
  return meteredBusesOf(context.study, context.pccBuses)
    .filter((bus) => judgedPF.has(`target-pf|${bus}`))
    .map((bus) => ({
      measures: [{ key: `target-pf|${bus}`, check: 'target-pf', subject: { kind: 'bus' as const, id: bus } }],
      read({ solved, actual }, out, at) {
        const running = motors.every((id) => actual.elements.some((part) => part.id === id && isOn(part)));
        const factor = running ? (inflowAt(actual, solved, bus)?.displacementPF ?? null) : null;
        out[at] = factor === null ? NOT_FORMED : (factor - target) / (1 - target);
      },
    }));
}

/** Harmonic currents into the site at each PCC whose demand current and fault level are entered. */
export function pccGauges(context: CheckContext): Gauge[] {
  const { study } = context;
  const choice = currentSetFor(study);
  const { demandCurrentA, shortCircuitMVAAtPcc } = study.criteria ?? {};
  if (!('set' in choice) || demandCurrentA === undefined || shortCircuitMVAAtPcc === undefined) return [];
  if (!elementsOfKind(study, 'supply').some(isOn)) return [];
  return [...context.pccBuses].flatMap((id) => {
    const bus = busById(study, id);
    if (!bus) return [];
    const ratio = (shortCircuitMVAAtPcc * 1e6) / (Math.sqrt(3) * bus.nominalV) / demandCurrentA;
    const limits = currentLimits(choice.set, bus.nominalV, ratio);
    return limits ? [emissionGauge(context, bus, limits, demandCurrentA)] : [];
  });
}

function emissionGauge(context: CheckContext, bus: Bus, limits: CurrentRowLimits, demandA: number): Gauge {
  const subject = { kind: 'bus' as const, id: bus.id };
  const orders = Array.from({ length: context.solved.maxOrder }, (_, index) => ({
    h: index + 1,
    limit: limits.order(index + 1)?.value,
  })).flatMap(({ h, limit }) => (limit === undefined ? [] : [{ h, limit }]));
  return {
    measures: [
      { key: `pcc-tdd|${bus.id}`, check: 'pcc-tdd', subject },
      ...orders.map(({ h }) => ({ key: `pcc-order|${bus.id}|${h}`, check: 'pcc-order', subject, order: h })),
    ],
    read(state, out, at) {
      for (let k = at; k <= at + orders.length; k++) out[k] = NOT_FORMED;
      const terminals = inflowAt(state.actual, state.solved, bus.id)?.terminals;
      if (!terminals) return;
      const last = Math.min(50, state.solved.maxOrder);
      let sum = 0;
      for (let h = 2; h <= last; h++) sum += largestAmperes(state, terminals, h) ** 2;
      out[at] = 1 - (100 * Math.sqrt(sum)) / demandA / limits.tdd.value;
      orders.forEach(({ h, limit }, k) => {
        out[at + 1 + k] = 1 - (100 * largestAmperes(state, terminals, h)) / demandA / limit;
      });
    },
  };
}

function largestAmperes({ solved }: GaugedState, terminals: readonly number[], h: number): number {
  let largest = 0;
  for (let phase = 0; phase < 3; phase++) {
    let sum = 0;
    for (const terminal of terminals) sum += solved.amperes(terminal, h, phase);
    if (sum > largest) largest = sum;
  }
  return largest;
}
