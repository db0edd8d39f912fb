import { useEffect, useState } from 'react';
import { pageComputation, useWorkbench } from '../../store/index.ts';
import { casesOf, type Study } from '../../study/index.ts';
import type { CaseDossier } from '../../worker/index.ts';

interface Gathered {
  study: Study;
  dossiers: CaseDossier[] | null;
  words: string;
}

/** Busbars whose impedance the sheet shows: the one looked at and those with a bank or filter. */
function scannedBuses(study: Study, focusBus: string): string[] {
  const corrected = study.elements.flatMap((part) =>
    part.kind === 'bank' || part.kind === 'filter' ? [part.bus] : [],
  );
  return [...new Set([focusBus, ...corrected])].filter((id) => study.buses.some((bus) => bus.id === id));
}

/** Solves and judges every case for the sheet; null with words while that lasts or when it failed. */
export function useDossiers(): { dossiers: CaseDossier[] | null; words: string } {
  const study = useWorkbench((state) => state.study);
  const revision = useWorkbench((state) => state.revision);
  const focusBus = useWorkbench((state) => state.view.focusBus);
  const [gathered, setGathered] = useState<Gathered | null>(null);
  useEffect(() => {
    if (!study) return;
    let current = true;
    const say = (words: string, dossiers: CaseDossier[] | null = null) => {
      if (current) setGathered({ study, dossiers, words });
    };
    const cases = casesOf(study).map((one) => one.id);
    say(`Solving case 1 of ${cases.length}`);
    void pageComputation()
      .dossiers({ study, revision }, cases, scannedBuses(study, focusBus), (_dossier, done) => {
        if (done < cases.length) say(`Solving case ${done + 1} of ${cases.length}`);
      })
      .then((settled) => {
        if (settled.outcome === 'done') say('', settled.value);
        else if (settled.outcome === 'failed') say(`The cases could not be solved: ${settled.message}`);
      });
    return () => {
      current = false;
    };
  }, [study, revision, focusBus]);
  if (!study) return { dossiers: null, words: 'Open a study, a sample, or draw a site first.' };
  if (gathered?.study !== study) return { dossiers: null, words: 'Solving every case' };
  return gathered;
}
