import type { Bank, Study, StudyElement } from '../../src/study/index.ts';
import { amps, solved, studyOf } from '../engine/study.ts';

/** The benchmark's capacitors have no losses. */
const capacitorW = 0;

/**
 * Benchmark computed from closed-form physics: 20 kV, 250 MVA, X/R 10; 1000 kVA 20/0.4 kV, uk 6 %,
 * Pk 7.6 kW; 300 kvar plain, or with 7 % reactors of Q 50 on the same capacitors; drives of 120, 70, 36
 * and 28 A at orders 5, 7, 11, 13. Per cent of 400 V nominal.
 */
export function benchmarkSite(bank: Partial<Bank> | null): Study {
  const elements: StudyElement[] = [
    { id: 'grid', kind: 'supply', bus: 'mv', shortCircuitMVA: 250, xOverR: 10 },
    {
      id: 't1',
      kind: 'transformer',
      from: 'mv',
      to: 'lv',
      ratedKVA: 1000,
      hvV: 20000,
      lvV: 400,
      ukPercent: 6,
      loadLossKW: 7.6,
      vectorGroup: 'Dyn11',
      skin: [0, 1],
    },
  ];
  if (bank)
    elements.push({
      id: 'bank',
      kind: 'bank',
      bus: 'lv',
      ratedV: 400,
      steps: [{ kvar: 300 }],
      lossWPerKvar: capacitorW,
      ...bank,
    });
  return studyOf(
    [
      { id: 'mv', nominalV: 20000 },
      { id: 'lv', nominalV: 400 },
    ],
    elements,
  );
}

/** Amperes by order. */
const injected = { 5: 120, 7: 70, 11: 36, 13: 28 } as const;

/** The benchmark's currents as a converter whose harmonics are a share of a fundamental current of ours. */
export function withDrives(study: Study): Study {
  const probe: Study = {
    ...study,
    elements: [
      ...study.elements,
      { id: 'drives', kind: 'converter', bus: 'lv', kW: 100, powerFactor: 1, spectrum: [] },
    ],
  };
  const fundamental = amps(solved(probe), 'drives', 1);
  const spectrum = Object.entries(injected).map(([h, ampere]) => ({
    h: Number(h),
    percent: (100 * ampere) / fundamental,
    angleDeg: 0,
  }));
  return {
    ...probe,
    elements: probe.elements.map((e) => (e.id === 'drives' ? ({ ...e, spectrum } as StudyElement) : e)),
  };
}
