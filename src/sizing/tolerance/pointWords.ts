import { figure } from '../../checks/index.ts';
import type { Dimension, Point } from './Dimension.ts';

/** A tolerance point in words, what stands at its rated value left out: "capacitance of Bank C1 +7.1 %". */
export function pointWords(dimensions: readonly Dimension[], point: Point): string {
  const words = dimensions.flatMap(({ kind, words: name }, k) => {
    const factor = point[k] ?? 1;
    if (kind === 'motors') return factor > 0.5 ? [] : ['motors off'];
    if (kind === 'background') return factor > 1 - 1e-9 ? [] : [`${name} at ${figure(100 * factor, 3)} %`];
    const percent = 100 * (factor - 1);
    if (Math.abs(percent) < 0.005) return [];
    return [`${name} ${percent > 0 ? '+' : ''}${figure(percent, Math.abs(percent) < 1 ? 2 : 3)} %`];
  });
  return words.length === 0 ? 'every part at its rated value' : words.join(', ');
}
