export { type KvarAtBus, kvarAtBus } from './kvarAtBus.ts';
export { type KvarInput, type KvarResult, kvarForTarget, tanPhi } from './kvarForTarget.ts';
export { type QuickSite, quickSite } from './quickSite.ts';
