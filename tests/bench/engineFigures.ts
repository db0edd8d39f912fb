import { scanImpedance, solveCase } from '../../src/engine/index.ts';
import { resonanceElasticities } from '../../src/engine/sensitivity/index.ts';
import { medianMicroseconds } from './medianMicroseconds.ts';
import { benchStudy, editedStudy } from './network.ts';

/** Milliseconds from a study with one value edited to all results of one case, 50 orders. */
export function editToResults(busbars: number, milliseconds = 700): number {
  const study = benchStudy(busbars);
  let round = 0;
  const work = () => {
    const { converged, error } = solveCase(editedStudy(study, round++), 'base');
    if (!converged) throw new Error(`the benchmark's site did not converge: ${error}`);
  };
  return medianMicroseconds(work, milliseconds) / 1e3;
}

/**
 * Milliseconds of a scan of `points` frequencies on an edited study, resonances refined. The site needs phase
 * coordinates for its single-phase loads; `balanced` leaves those out, and one sequence network answers.
 */
export function scanTime(busbars: number, points: number, balanced: boolean, milliseconds = 700): number {
  const site = benchStudy(busbars);
  const threePhase = site.elements.filter((part) => !('connection' in part));
  const study = balanced ? { ...site, elements: threePhase } : site;
  let round = 0;
  const span = { bus: 's0b1', sequence: 'positive', fromHz: 50, toHz: 2500, points } as const;
  return (
    medianMicroseconds(() => scanImpedance(editedStudy(study, round++), 'base', span), milliseconds) / 1e3
  );
}

/** Milliseconds of the ranked elasticities of the first parallel resonance. */
export function elasticityTime(busbars: number): number {
  const study = benchStudy(busbars);
  const span = { bus: 's0b1', sequence: 'positive', fromHz: 50, toHz: 2500, points: 2000 } as const;
  const found = scanImpedance(study, 'base', span).resonances.find(({ kind }) => kind === 'parallel');
  if (!found) throw new Error('the benchmark site has no parallel resonance');
  const at = { bus: span.bus, sequence: span.sequence, order: found.order, kind: found.kind };
  return medianMicroseconds(() => resonanceElasticities(study, 'base', at), 800) / 1e3;
}
