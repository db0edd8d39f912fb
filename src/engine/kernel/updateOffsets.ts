import type { EliminationPlan } from './EliminationPlan.ts';

/** The plan's update targets as offsets into an array of diagonal blocks, then slots. */
export function updateOffsets(
  plan: EliminationPlan,
  diagonal: number,
  base: number,
  slot: number,
): Int32Array {
  const target = new Int32Array(plan.updateTarget.length);
  let t = 0;
  for (let k = 0; k < plan.nodeCount; k++) {
    const rows = plan.columnStart[k + 1]! - plan.columnStart[k]!;
    for (let b = rows; b > 0; b--) {
      target[t] = diagonal * plan.updateTarget[t]!;
      for (let a = 1; a < b; a++) target[t + a] = base + slot * plan.updateTarget[t + a]!;
      t += b;
    }
  }
  return target;
}

export function longestColumn(plan: EliminationPlan): number {
  let longest = 0;
  for (let k = 0; k < plan.nodeCount; k++)
    longest = Math.max(longest, plan.columnStart[k + 1]! - plan.columnStart[k]!);
  return longest;
}
