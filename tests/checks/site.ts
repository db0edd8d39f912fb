import type { Verdict } from '../../src/checks/index.ts';
import { judgeCase } from '../../src/checks/index.ts';
import { solveCase } from '../../src/engine/index.ts';
import type { Bank, Converter, Study, StudyElement, Supply, Transformer } from '../../src/study/index.ts';

/** An invented works: 20 kV supply, one 1000 kVA transformer, a drive, a load and a bank at 400 V. */
export interface SiteParts {
  supply?: Partial<Supply>;
  transformer?: Partial<Transformer>;
  drive?: Partial<Converter>;
  bank?: Partial<Bank> | null;
  loadKW?: number;
  loadPF?: number;
  more?: StudyElement[];
  study?: Partial<Study>;
}

export function site(parts: SiteParts = {}): Study {
  const elements: StudyElement[] = [
    { id: 'S', kind: 'supply', bus: 'HV', shortCircuitMVA: 250, xOverR: 10, ...parts.supply },
    {
      id: 'T',
      kind: 'transformer',
      from: 'HV',
      to: 'LV',
      ratedKVA: 1000,
      hvV: 20_000,
      lvV: 400,
      ukPercent: 6,
      loadLossKW: 7.6,
      vectorGroup: 'Dyn11',
      eddyLossShare: 0.1,
      ...parts.transformer,
    },
    { id: 'L', kind: 'load', bus: 'LV', kW: parts.loadKW ?? 400, powerFactor: parts.loadPF ?? 0.8 },
    {
      id: 'D',
      kind: 'converter',
      bus: 'LV',
      kW: 200,
      powerFactor: 0.95,
      spectrum: [
        { h: 5, percent: 30, angleDeg: 180 },
        { h: 7, percent: 17, angleDeg: 0 },
        { h: 11, percent: 8, angleDeg: 180 },
        { h: 13, percent: 6, angleDeg: 0 },
      ],
      ...parts.drive,
    },
  ];
  if (parts.bank !== null) {
    elements.push({
      id: 'C',
      kind: 'bank',
      bus: 'LV',
      ratedV: 440,
      detuningPercent: 7,
      steps: [{ kvar: 100 }, { kvar: 100 }, { kvar: 100 }],
      ...parts.bank,
    });
  }
  return {
    format: 'varwright-study',
    version: 1,
    title: 'Harrow Mill',
    frequencyHz: 50,
    maxOrder: 25,
    buses: [
      { id: 'HV', nominalV: 20_000, pcc: true },
      { id: 'LV', nominalV: 400 },
    ],
    elements: [...elements, ...(parts.more ?? [])],
    ...parts.study,
  };
}

export function verdictsOf(study: Study, caseId = 'base'): Verdict[] {
  const solution = solveCase(study, caseId);
  if (!solution.converged) throw new Error(solution.error);
  return judgeCase(study, solution);
}

/** The verdicts of one check on one part or busbar. */
export function of(verdicts: readonly Verdict[], check: string, id?: string): Verdict[] {
  return verdicts.filter(
    (verdict) => verdict.check === check && (id === undefined || verdict.subject.id === id),
  );
}

/** The first of them; an error where there is none. */
export function one(verdicts: readonly Verdict[], check: string, id?: string): Verdict {
  const found = of(verdicts, check, id)[0];
  if (!found) throw new Error(`no ${check} verdict${id ? ` on ${id}` : ''}`);
  return found;
}
