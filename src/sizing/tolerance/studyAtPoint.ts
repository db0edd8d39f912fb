import type { Bank, Filter, Study, StudyElement, Supply } from '../../study/index.ts';
import { casesOf, studyInCase } from '../../study/index.ts';
import type { Dimension, DimensionKind, Point } from './Dimension.ts';

/** A case as it really is at a tolerance point. */
export interface ActualCase {
  /** Has the one case, its changes worked in. */
  study: Study;
  /** Actual over rated frequency. */
  frequencyFactor: number;
}

/**
 * The study of one case with its parts at a tolerance point: capacitance alone with the choke kept, choke
 * alone with the capacitance kept (p = X_L/X_c changes with both), uk, fault level, voltage and background
 * by their factors, motors out at 0. Ratings are not to be read from it.
 */
export function studyAtPoint(
  study: Study,
  caseId: string,
  dimensions: readonly Dimension[],
  point: Point,
): ActualCase {
  const inCase = studyInCase(study, caseId);
  const byPart = new Map<string, Partial<Record<DimensionKind, number>>>();
  let frequencyFactor = 1;
  let motorsRun = true;
  dimensions.forEach(({ kind, part }, k) => {
    const factor = point[k] ?? 1;
    if (kind === 'frequency') frequencyFactor = factor;
    else if (kind === 'motors') motorsRun = factor > 0.5;
    else if (part !== undefined && factor !== 1) byPart.set(part, { ...byPart.get(part), [kind]: factor });
  });
  const elements = inCase.elements.map((part) => {
    if (part.kind === 'motor' && !motorsRun) return { ...part, on: false };
    const factors = byPart.get(part.id);
    return factors ? deviated(part, factors) : part;
  });
  const found = casesOf(study).find(({ id }) => id === caseId);
  return {
    study: { ...inCase, elements, cases: found ? [{ ...found, changes: [] }] : [] },
    frequencyFactor,
  };
}

type Factors = Partial<Record<DimensionKind, number>>;

function deviated(part: StudyElement, factors: Factors): StudyElement {
  switch (part.kind) {
    case 'bank':
      return deviatedBank(part, factors.capacitance ?? 1, factors.inductance ?? 1);
    case 'filter':
      return deviatedFilter(part, factors.capacitance ?? 1, factors.inductance ?? 1);
    case 'transformer':
      return { ...part, ukPercent: part.ukPercent * (factors['transformer-impedance'] ?? 1) };
    case 'supply':
      return deviatedSupply(part, factors);
    default:
      return part;
  }
}

/** X_c/c and l·X_L: p = X_L/X_c grows by both. */
function deviatedBank(bank: Bank, c: number, l: number): Bank {
  return {
    ...bank,
    steps: bank.steps.map((step) => ({ ...step, kvar: step.kvar * c })),
    ...(bank.detuningPercent === undefined ? {} : { detuningPercent: bank.detuningPercent * c * l }),
  };
}

/**
 * Single-tuned and high-pass: X_c = U²/Q·n²/(n² − 1) and X_L = X_c/n² become X_c/c and l·X_L, so that
 * n'² = n²/(c·l) and Q' = c·Q·(n² − 1)/n²·n'²/(n'² − 1). A series choke's resistance goes with it, R = n·X_L/q;
 * a damping resistor R = q·n·X_L stays. C-type: X_c = U²/Q and what is tuned to the fundamental go together.
 */
function deviatedFilter(filter: Filter, c: number, l: number): Filter {
  if (filter.type === 'c-type') return { ...filter, kvar: filter.kvar * c };
  const square = filter.tunedOrder ** 2;
  const tunedOrder = filter.tunedOrder / Math.sqrt(c * l);
  const tuned = tunedOrder ** 2;
  const kvar = (filter.kvar * c * (square - 1) * tuned) / (square * (tuned - 1));
  const qFactor =
    filter.type === 'single-tuned'
      ? (filter.qFactor * tunedOrder) / filter.tunedOrder
      : (filter.qFactor * filter.tunedOrder) / (tunedOrder * l);
  return { ...filter, kvar, tunedOrder, qFactor };
}

function deviatedSupply(supply: Supply, factors: Factors): Supply {
  const background = factors.background ?? 1;
  return {
    ...supply,
    shortCircuitMVA: supply.shortCircuitMVA * (factors['fault-level'] ?? 1),
    ...(factors['supply-voltage'] === undefined
      ? {}
      : { setpointPercent: (supply.setpointPercent ?? 100) * factors['supply-voltage'] }),
    ...(supply.background === undefined
      ? {}
      : { background: supply.background.map((row) => ({ ...row, percent: row.percent * background })) }),
  };
}
