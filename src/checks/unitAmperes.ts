import type { StarDelta } from '../study/index.ts';
import type { SolvedCase } from './SolvedCase.ts';

/**
 * Current of each of three capacitor units by order, in line amperes: star units carry the line current;
 * a delta unit carries |I_k − I_(k+1)|/3, here times √3 so that its rated value is the line's I_N.
 * Where angles are unknown (judged magnitudes, or the α law) a delta unit takes the larger of its two lines.
 */
export function unitAmperes(solved: SolvedCase, terminal: number, connection: StarDelta): number[][] {
  return [0, 1, 2].map((unit) => {
    const amperes = new Array<number>(solved.maxOrder).fill(0);
    for (let h = 1; h <= solved.maxOrder; h++) {
      amperes[h - 1] =
        connection === 'delta' ? deltaAmperes(solved, terminal, h, unit) : solved.amperes(terminal, h, unit);
    }
    return amperes;
  });
}

function deltaAmperes(solved: SolvedCase, terminal: number, h: number, unit: number): number {
  const next = (unit + 1) % 3;
  const magnitudesOnly = solved.anglesUnknown(h) || (h > 1 && solved.solution.summation === 'alpha');
  if (magnitudesOnly) return Math.max(solved.amperes(terminal, h, unit), solved.amperes(terminal, h, next));
  const { current, maxOrder } = solved.solution;
  const at = (terminal * maxOrder + h - 1) * 3;
  const re = (current.re[at + unit] ?? 0) - (current.re[at + next] ?? 0);
  const im = (current.im[at + unit] ?? 0) - (current.im[at + next] ?? 0);
  return Math.hypot(re, im) / Math.sqrt(3);
}
