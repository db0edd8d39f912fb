import { judgeNumbers, probeOrder, scanPair, solveNumbers } from './compute.ts';
import { warmStudy } from './warmStudy.ts';

const window = 6;
const fewestRounds = 18;
/** A round less than this much faster than before counts as no faster. */
const gain = 0.9;

/**
 * One round of work per call on the built-in study, so that the just-in-time compiler meets every path
 * before the user does. Hot once the best of the last rounds hardly beats the best of those before.
 */
export function createWarmUp(): () => { hot: boolean } {
  const roundMs: number[] = [];
  return () => {
    const start = performance.now();
    // A fresh object, as after an edit: otherwise what is remembered per study would spare the compiling.
    const study = { ...warmStudy };
    const { solution } = solveNumbers(study, 'base');
    scanPair(study, 'base', 'lv');
    probeOrder(study, 'base', 6.5);
    judgeNumbers(study, solution);
    roundMs.push(performance.now() - start);
    const recent = Math.min(...roundMs.slice(-window));
    const before = Math.min(...roundMs.slice(0, -window));
    return { hot: roundMs.length >= fewestRounds && recent >= gain * before };
  };
}
