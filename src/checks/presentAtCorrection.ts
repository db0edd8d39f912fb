import type { CaseSolution } from '../engine/index.ts';
import type { Study } from '../study/index.ts';
import { isOn } from '../study/index.ts';
import { caseContext } from './caseContext.ts';
import { kvarOn } from './correctionBranch.ts';
import { type Content, presentOrders } from './presentOrders.ts';

/** The orders present at a busbar with correction, rising, of the sequence whose peaks they meet. */
export interface PresentOrders {
  bus: string;
  sequence: Content;
  orders: number[];
}

/** Every order present at the busbars of the banks and filters in service in one solved case. */
export function presentAtCorrection(study: Study, solution: CaseSolution): PresentOrders[] {
  if (!solution.converged) return [];
  const context = caseContext(study, solution, {});
  const found = new Map<string, PresentOrders>();
  for (const part of context.study.elements) {
    if ((part.kind !== 'bank' && part.kind !== 'filter') || !isOn(part)) continue;
    if (!context.solved.energised(part.bus) || (part.kind === 'bank' && kvarOn(part) === 0)) continue;
    for (const sequence of ['positive', 'zero'] as const) {
      const orders = presentOrders(context, part.bus, sequence, part.kind === 'bank' ? part : undefined);
      const known = found.get(`${sequence} ${part.bus}`)?.orders ?? [];
      const all = [...new Set([...known, ...orders])].sort((a, b) => a - b);
      if (all.length > 0) found.set(`${sequence} ${part.bus}`, { bus: part.bus, sequence, orders: all });
    }
  }
  return [...found.values()];
}
