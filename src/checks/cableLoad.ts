import type { Cable } from '../study/index.ts';
import { isOn, nameOf } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';
import { figure } from './figure.ts';
import { SolvedCase } from './SolvedCase.ts';
import type { Source, Verdict, Working } from './types.ts';
import { judged, type Row, unknown } from './verdict.ts';

const source: Source = { document: 'IEC 60364-5-52', clause: 'Annex E', provenance: 'memory' };

/** Reduction by the third harmonic's share of the phase current, and the current it acts on. */
export interface ThirdHarmonicRule {
  factor: number;
  basis: 'phase' | 'neutral';
  words: string;
}

/** IEC 60364-5-52 Annex E (memory): share of the 3rd harmonic in the phase current, per cent. */
export function thirdHarmonicRule(sharePercent: number): ThirdHarmonicRule {
  if (!(sharePercent >= 0))
    throw new RangeError(`third-harmonic share ${sharePercent} %: zero or more is possible`);
  if (sharePercent <= 15) return { factor: 1, basis: 'phase', words: 'up to 15 %: 1.0 on the phase current' };
  if (sharePercent <= 33)
    return { factor: 0.86, basis: 'phase', words: '15 to 33 %: 0.86 on the phase current' };
  if (sharePercent <= 45)
    return { factor: 0.86, basis: 'neutral', words: '33 to 45 %: 0.86 on the neutral current' };
  return { factor: 1, basis: 'neutral', words: 'above 45 %: 1.0 on the neutral current' };
}

/** Cable loading by phase and neutral current with the third-harmonic reduction (cable-load). */
export function cableLoad(context: CheckContext): Verdict[] {
  return context.study.elements.flatMap((part) =>
    part.kind === 'cable' && isOn(part) ? [atCable(context, part)] : [],
  );
}

interface CableDesign {
  phase: number;
  phaseA: number;
  neutralA: number;
  sharePercent: number;
  rule: ThirdHarmonicRule;
  /** The current the cross-section is chosen for. */
  designA: number;
}

/** Design current of a cable at its heavier end; null out of service. */
export function cableDesignAmperes(solved: SolvedCase, cable: Cable): CableDesign | null {
  const ends = [cable.from, cable.to]
    .map((bus) => solved.terminal(cable.id, bus))
    .filter((t) => t !== undefined);
  const terminal = ends.sort((a, b) => largestPhase(solved, b) - largestPhase(solved, a))[0];
  if (terminal === undefined) return null;
  const phase = SolvedCase.worstPhase((k) => solved.rmsAmperes(terminal, k));
  const phaseA = solved.rmsAmperes(terminal, phase);
  const neutralA = neutralRms(solved, terminal);
  const sharePercent =
    phaseA > 0 && solved.maxOrder >= 3 ? (solved.amperes(terminal, 3, phase) / phaseA) * 100 : 0;
  // A three-wire run has no neutral conductor to heat; a share without neutral current says so.
  const rule = thirdHarmonicRule(neutralA > 0.01 * phaseA ? sharePercent : 0);
  const designA = (rule.basis === 'phase' ? phaseA : Math.max(neutralA, phaseA)) / rule.factor;
  return { phase, phaseA, neutralA, sharePercent, rule, designA };
}

function atCable(context: CheckContext, cable: Cable): Verdict {
  const { solved } = context;
  const row: Row = {
    check: 'cable-load',
    title: 'cable loading',
    subject: { kind: 'element', id: cable.id },
    caseId: context.caseId,
    unit: 'p.u.',
    source,
    working: [],
  };
  const design = cableDesignAmperes(solved, cable);
  if (!design) return unknown(row, `${nameOf(cable)} carries no current in this case`);
  const { phase, phaseA, neutralA, sharePercent, rule, designA } = design;
  const working = (): Working[] => [
    {
      equation: 'I_phase, I_neutral (rms of all orders)',
      numbers: `L${phase + 1} ${figure(phaseA)} A, N ${figure(neutralA)} A`,
    },
    {
      equation: 'third-harmonic share I_3 / I_phase',
      numbers: `${figure(sharePercent, 3)} %; ${rule.words}`,
    },
  ];
  if (cable.ratedA === undefined) {
    return unknown(
      { ...row, working: working() },
      `enter the rated current of ${nameOf(cable)}; ${figure(designA)} A are needed`,
    );
  }
  const ratedA = cable.ratedA;
  const value = designA / ratedA;
  return judged({
    ...row,
    value,
    limit: 1,
    working: () => [
      ...working(),
      {
        equation: 'I_design / I_rated',
        numbers: `${figure(designA)} A / ${figure(ratedA)} A = ${figure(value)}`,
      },
    ],
    mend: 'Choose a larger cross-section or another run; where triplens fill the neutral, size by the neutral.',
  });
}

const largestPhase = (solved: SolvedCase, terminal: number): number =>
  Math.max(...[0, 1, 2].map((k) => solved.rmsAmperes(terminal, k)));

function neutralRms(solved: SolvedCase, terminal: number): number {
  let sum = 0;
  for (let h = 1; h <= solved.maxOrder; h++) sum += solved.neutralAmperes(terminal, h) ** 2;
  return Math.sqrt(sum);
}
