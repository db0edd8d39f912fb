export { type CompileOptions, compileNetwork } from './network/compileNetwork.ts';
export type { Network } from './network/Network.ts';
export { type SolveOptions, solveCase } from './solve/solveCase.ts';
export type * from './types.ts';
