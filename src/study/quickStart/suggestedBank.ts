import { typicalValues } from '../newPart.ts';
import { stepSizes } from '../typical/typicalSteps.ts';
import { driveKinds } from './driveKinds.ts';
import type { SiteFigures } from './SiteAnswers.ts';

export interface SuggestedBank {
  /** Equal steps, rated kvar each at ratedV. */
  stepKvar: number;
  steps: number;
  ratedV: number;
  detuningPercent: number;
  /** Kvar of all steps at the busbar's nominal voltage. */
  givesKvar: number;
  /** Why plain or detuned, in one sentence with the numbers. */
  reason: string;
}

/** Share of harmonic-producing kVA in the transformer's up to which a plain bank is usual. */
const plainUpTo = 0.15;
const usualDetuning = 7;
/** The board stands a little below its nominal voltage at full load, and Q falls with U². */
const reserve = 1.05;
const usualSteps = 8;
const mostSteps = 12;
const favouredSteps = 6;
const largestStep = stepSizes.at(-1) ?? 80;

/**
 * A bank that gives at least `kvar` at the main board: plain, or detuned by 7 % where drives make up more
 * than 15 % of the transformer's kVA (screening of the trade's handbooks; the verdicts decide). Nameplate
 * kvar from Q = Q_N·(U/U_N)²/(1 − p), with 5 % in reserve, in the fewest kvar that equal steps of a usual size
 * reach. null where nothing is needed.
 */
export function suggestedBank(figures: SiteFigures, kvar: number, drivesKVA: number): SuggestedBank | null {
  if (!(kvar > 0)) return null;
  const { mainV, frequencyHz } = figures.system;
  const share = driveKinds[figures.driveKind].harmonic ? drivesKVA / figures.ratedKVA : 0;
  const detuningPercent = share > plainUpTo ? usualDetuning : 0;
  const { ratedV } = typicalValues('bank', { nominalV: mainV, frequencyHz });
  const perNameplate = (mainV / ratedV) ** 2 / (1 - detuningPercent / 100);
  const { steps, stepKvar } = equalSteps((reserve * kvar) / perNameplate);
  const percent = Math.round(100 * share);
  return {
    stepKvar,
    steps,
    ratedV,
    detuningPercent,
    givesKvar: steps * stepKvar * perNameplate,
    reason:
      detuningPercent > 0
        ? `detuned: drives are ${percent} % of the transformer's kVA, above 15 % (handbook screening, from memory)`
        : `plain: harmonic loads are ${percent} % of the transformer's kVA, up to 15 % (handbook screening, from memory)`,
  };
}

/** Steps of a usual size with the least surplus over `kvar`; among equals the number nearest to six. */
function equalSteps(kvar: number): { steps: number; stepKvar: number } {
  const possible = stepSizes
    .map((stepKvar) => ({ stepKvar, steps: Math.ceil(kvar / stepKvar - 1e-9) }))
    .filter(({ steps }) => steps >= 2 && steps <= mostSteps);
  const usual = possible.filter(({ steps }) => steps <= usualSteps);
  const options = (usual.length > 0 ? usual : possible).toSorted(
    (a, b) =>
      a.steps * a.stepKvar - b.steps * b.stepKvar ||
      Math.abs(a.steps - favouredSteps) - Math.abs(b.steps - favouredSteps),
  );
  const best = options[0];
  if (best) return best;
  if (kvar <= largestStep)
    return { steps: 1, stepKvar: stepSizes.find((size) => size >= kvar) ?? largestStep };
  return { steps: mostSteps, stepKvar: 5 * Math.ceil(kvar / mostSteps / 5) };
}
