import type { Verdict } from '../../src/checks/index.ts';
import { correctionParts, scanImpedance, solveCase } from '../../src/engine/index.ts';
import type { SheetCase, SheetInput } from '../../src/sheet/document/index.ts';
import { casesOf, type Study } from '../../src/study/index.ts';

/** An invented site: one transformer, one bank, three cases of which the last cannot be solved. */
export const quarry: Study = {
  format: 'varwright-study',
  version: 1,
  title: 'Quarry crusher line',
  site: 'Stonefold quarry (invented)',
  preparedBy: 'M. Example',
  revision: 'B',
  revisionDate: '2026-03-04',
  notes: 'Invented for the tests.',
  frequencyHz: 50,
  maxOrder: 13,
  buses: [
    { id: 'in', name: 'Intake', nominalV: 10_000, pcc: true },
    { id: 'lv', name: 'Main board', nominalV: 400 },
  ],
  elements: [
    { id: 'grid', name: 'Grid', kind: 'supply', bus: 'in', shortCircuitMVA: 120, xOverR: 8 },
    {
      id: 't1',
      name: 'T1',
      kind: 'transformer',
      from: 'in',
      to: 'lv',
      ratedKVA: 800,
      hvV: 10_000,
      lvV: 400,
      ukPercent: 6,
      loadLossKW: 7,
      vectorGroup: 'Dyn11',
    },
    { id: 'mill', name: 'Mill', kind: 'load', bus: 'lv', kW: 300, powerFactor: 0.8 },
    {
      id: 'drive',
      name: 'Drive',
      kind: 'converter',
      bus: 'lv',
      kW: 120,
      powerFactor: 0.95,
      spectrum: 'six-pulse-ideal',
    },
    {
      id: 'c1',
      name: 'Bank C1',
      kind: 'bank',
      bus: 'lv',
      ratedV: 440,
      detuningPercent: 7,
      steps: [{ kvar: 50 }, { kvar: 50 }, { kvar: 25 }],
    },
  ],
  cases: [
    { id: 'day', name: 'Day', changes: [] },
    { id: 'night', name: 'Night', role: 'light', changes: [{ element: 'mill', set: { kW: 60 } }] },
    { id: 'heavy', name: 'Overload', changes: [{ element: 'mill', set: { kW: 40_000 } }] },
  ],
  origins: { '$.elements[1].ukPercent': { origin: 'nameplate', date: '2019-05-06' } },
};

export const fingerprint = '0123456789abcdef'.repeat(4);

export function verdict(change: Partial<Verdict> & Pick<Verdict, 'check' | 'caseId'>): Verdict {
  return {
    key: `${change.check}|c1`,
    title: change.check.replaceAll('-', ' '),
    subject: { kind: 'element', id: 'c1' },
    value: 1.1,
    limit: 1.3,
    unit: 'p.u.',
    margin: 0.15,
    verdict: 'pass',
    screening: false,
    working: [{ equation: 'I_rms / I_N', numbers: '110 A / 100 A = 1.1' }],
    source: { document: 'IEC 60831-1', edition: '2014', clause: 'maximum current', provenance: 'memory' },
    remarks: [],
    ...change,
  };
}

export function caseOf(study: Study, caseId: string, verdicts: readonly Verdict[]): SheetCase {
  const without = correctionParts(study);
  const span = { bus: 'lv', sequence: 'positive' as const, fromHz: 50, toHz: 650, points: 121 };
  return {
    caseId,
    solution: solveCase(study, caseId),
    without: solveCase(study, caseId, { without }),
    verdicts,
    scans: [
      {
        withCorrection: scanImpedance(study, caseId, span),
        without: scanImpedance(study, caseId, span, { without }),
      },
    ],
  };
}

export function inputOf(study: Study, verdicts: readonly Verdict[]): SheetInput {
  return {
    study,
    fingerprint,
    programmeVersion: '0.1.0',
    paper: 'A4',
    pins: [{ quantity: 'voltage', bus: 'lv' }],
    cases: casesOf(study).map(({ id }) =>
      caseOf(
        study,
        id,
        verdicts.filter(({ caseId }) => caseId === id),
      ),
    ),
  };
}
