export { BlockLdl } from './BlockLdl.ts';
export { BlockLu } from './BlockLu.ts';
export type { BlockMatrix } from './BlockMatrix.ts';
export type { EliminationPlan } from './EliminationPlan.ts';
export type { FactorOutcome } from './FactorOutcome.ts';
export { type EntrySource, PivotedLu } from './PivotedLu.ts';
export { planElimination } from './planElimination.ts';
export { ScalarLdl } from './ScalarLdl.ts';
