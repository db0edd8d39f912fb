import type { Transformer } from '../study/index.ts';
import { isOn, nameOf } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { angleRemarks } from './distortion.ts';
import { figure } from './figure.ts';
import type { SolvedCase } from './SolvedCase.ts';
import { type HarmonicLoss, harmonicLoss, permissibleLoad } from './transformerHeating.ts';
import type { Source, Verdict, Working } from './types.ts';
import { judged, keptQuietly, type Row, unknown } from './verdict.ts';

const source: Source = {
  document: 'IEEE C57.110',
  clause: 'harmonic loss factor, permissible load',
  provenance: 'second-hand',
};

/** F_HL below this derates by less than 0.1 % even at P_EC-R = 0.15: the share is then not needed. */
const NEGLIGIBLE_LOSS_FACTOR = 1.01;

/**
 * Transformer loading with harmonic derating (transformer-load): (I_rms/I_N)/√((1+P_EC)/(1+F_HL·P_EC)) ≤ 1,
 * on the side and phase that is heated most. Without P_EC-R an overload on rms alone still fails; otherwise
 * there is no verdict.
 */
export function transformerLoad(context: CheckContext): Verdict[] {
  return context.study.elements.flatMap((part) =>
    part.kind === 'transformer' && isOn(part) ? [atTransformer(context, part)] : [],
  );
}

interface Side {
  words: string;
  phase: number;
  ratedA: number;
  terminal: number;
  loss: HarmonicLoss;
}

function sideOf(solved: SolvedCase, part: Transformer, bus: string, ratedV: number, words: string): Side[] {
  const terminal = solved.terminal(part.id, bus);
  if (terminal === undefined) return [];
  const ratedA = (part.ratedKVA * 1000) / (Math.sqrt(3) * ratedV);
  return [0, 1, 2].flatMap((phase) => {
    const amperes = Array.from({ length: solved.maxOrder }, (_, i) => solved.amperes(terminal, i + 1, phase));
    const loss = harmonicLoss(amperes, ratedA);
    return loss ? [{ words, phase, ratedA, terminal, loss }] : [];
  });
}

/** Load over what P_EC-R permits; without the share, the rms load alone. */
function heat({ loss, ratedA }: Side, share = 0): number {
  return loss.rmsA / ratedA / permissibleLoad(loss.lossFactor, share);
}

function heaviestSide(solved: SolvedCase, part: Transformer): Side | null {
  const sides = [
    ...sideOf(solved, part, part.to, part.lvV, 'LV side'),
    ...sideOf(solved, part, part.from, part.hvV, 'HV side'),
  ];
  const share = part.eddyLossShare;
  return sides.sort((a, b) => heat(b, share) - heat(a, share))[0] ?? null;
}

/**
 * Load over what is permitted, as the verdict judges it: null without current, and where only P_EC-R would
 * tell (the rms load alone is below the rating).
 */
export function transformerUse(solved: SolvedCase, part: Transformer): number | null {
  const side = heaviestSide(solved, part);
  if (!side || !solved.energised(part.to)) return null;
  const load = side.loss.rmsA / side.ratedA;
  if (part.eddyLossShare !== undefined)
    return load / permissibleLoad(side.loss.lossFactor, part.eddyLossShare);
  return side.loss.lossFactor < NEGLIGIBLE_LOSS_FACTOR || load > 1 ? load : null;
}

function atTransformer(context: CheckContext, part: Transformer): Verdict {
  const side = heaviestSide(context.solved, part);
  const row: Row = {
    check: 'transformer-load',
    title: 'transformer loading',
    subject: { kind: 'element', id: part.id },
    caseId: context.caseId,
    unit: 'p.u.',
    source,
    working: [],
  };
  if (!context.solved.energised(part.to))
    return unknown(row, `${nameOf(part)} has no path to a source in this case`);
  if (!side) return keptQuietly(row, `${nameOf(part)} carries no current in this case.`, 0, 1);
  const { loss, ratedA } = side;
  const load = loss.rmsA / ratedA;
  const remarks = (): string[] => remarksOf(context, side);
  const base = { ...row, working: () => loadWorking(side), remarks };
  const mend =
    'Move load to another transformer, choose a larger or K-rated one, or filter the orders that heat it.';
  const share = part.eddyLossShare;
  if (share === undefined && loss.lossFactor < NEGLIGIBLE_LOSS_FACTOR) {
    return judged({
      ...base,
      value: load,
      limit: 1,
      mend,
      remarks: () => [...remarks(), 'F_HL is near 1: no derating, whatever P_EC-R is.'],
    });
  }
  if (share !== undefined) {
    const permissible = permissibleLoad(loss.lossFactor, share);
    const value = load / permissible;
    return judged({
      ...base,
      value,
      limit: 1,
      mend,
      working: () => [...loadWorking(side), derating(loss, share, permissible, load)],
    });
  }
  const missing = `enter the winding eddy-current loss P_EC-R of ${nameOf(part)}: with F_HL = ${figure(loss.lossFactor)} the rating must be derated`;
  if (load > 1) {
    return judged({
      ...base,
      value: load,
      limit: 1,
      mend,
      remarks: () => [...remarks(), `Overloaded already without derating; ${missing}.`],
    });
  }
  return unknown({ ...row, working: loadWorking(side), remarks: remarks() }, missing, load, 1);
}

function loadWorking({ words, phase, ratedA, loss }: Side): Working[] {
  return [
    {
      equation: 'I_rms / I_N',
      numbers: `${words}, L${phase + 1}: ${figure(loss.rmsA)} A / ${figure(ratedA)} A = ${figure(loss.rmsA / ratedA)}`,
    },
    { equation: 'F_HL = Σ (I_h/I)² · h² / Σ (I_h/I)²', numbers: `${figure(loss.lossFactor)}` },
    { equation: 'K = Σ h² · (I_h/I_R)²', numbers: `${figure(loss.kFactor)}` },
  ];
}

function derating(loss: HarmonicLoss, eddy: number, permissible: number, load: number): Working {
  return {
    equation: '(I_rms/I_N) / √((1 + P_EC) / (1 + F_HL · P_EC))',
    numbers: `${figure(load)} / √(${figure(1 + eddy)} / ${figure(1 + loss.lossFactor * eddy)}) = ${figure(load)} / ${figure(permissible)} = ${figure(load / permissible)}`,
  };
}

function remarksOf(context: CheckContext, side: Side): string[] {
  const orders: number[] = [];
  for (let h = 2; h <= context.solved.maxOrder; h++) {
    if (
      context.solved.anglesUnknown(h) &&
      context.solved.amperes(side.terminal, h, side.phase) > 1e-3 * side.ratedA
    ) {
      orders.push(h);
    }
  }
  return angleRemarks(context.solved, orders);
}
