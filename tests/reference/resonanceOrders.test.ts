import { describe, expect, it } from 'vitest';
import { scanImpedance } from '../../src/engine/index.ts';
import type { Study, StudyElement } from '../../src/study/index.ts';
import { amps, solved, stiffSupply, studyOf, volts } from '../engine/study.ts';

function plant(
  transformer: Partial<StudyElement>,
  supplyMVA: number,
  kvar: number,
  volt: number,
  hz: 50 | 60,
): Study {
  return studyOf(
    [
      { id: 'mv', nominalV: 13800 },
      { id: 'lv', nominalV: volt },
    ],
    [
      { id: 'grid', kind: 'supply', bus: 'mv', shortCircuitMVA: supplyMVA, xOverR: 1e4 },
      {
        id: 't',
        kind: 'transformer',
        from: 'mv',
        to: 'lv',
        hvV: 13800,
        lvV: volt,
        loadLossKW: 0.05,
        vectorGroup: 'Dyn1',
        skin: [0, 1],
        ...transformer,
      } as StudyElement,
      { id: 'bank', kind: 'bank', bus: 'lv', ratedV: volt, steps: [{ kvar }], lossWPerKvar: 0.001 },
    ],
    { frequencyHz: hz },
  );
}

function parallelOrder(study: Study): number | undefined {
  const span = { bus: 'lv', sequence: 'positive', fromHz: 60, toHz: 1200, points: 1141 } as const;
  return scanImpedance(study, 'base', span).resonances.find(({ kind }) => kind === 'parallel')?.order;
}

describe('parallel resonance of a bank with its network', () => {
  it('is at the 7th for 350 kvar on 1500 kVA, 5.5 %, behind 48 MVA (a published article; h = √(Ssc/Qc) = 7.049)', () => {
    const study = plant({ ratedKVA: 1500, ukPercent: 5.5 } as Partial<StudyElement>, 48, 350, 480, 60);
    expect(parallelOrder(study)).toBeCloseTo(7.049, 3);
  });

  it('is at 13.7 for 100 kvar on 1000 kVA, 5.3 %, 480 V (a published article; 13.736 computed)', () => {
    const study = plant({ ratedKVA: 1000, ukPercent: 5.3 } as Partial<StudyElement>, 1e9, 100, 480, 60);
    expect(parallelOrder(study)).toBeCloseTo(13.736, 2);
  });
});

describe('detuning p = XL/Xc', () => {
  // f = f1/√p and U_C = U/(1 − p): 7 % and 189 Hz as printed in a manufacturers' text, the rest arithmetic.
  it.each([
    [5.67, 50, 209.98, 1.0601],
    [7, 50, 188.98, 1.07527],
    [7, 60, 226.78, 1.07527],
    [12.5, 50, 141.42, 1.14286],
    [14, 50, 133.63, 1.16279],
  ] as const)(
    'of %d %% puts the series resonance at %i/√p Hz = %d Hz and raises U_C by %d',
    (p, hz, series, rise) => {
      const study = studyOf(
        [{ id: 'lv', nominalV: 400 }],
        [
          stiffSupply('lv'),
          {
            id: 'bank',
            kind: 'bank',
            bus: 'lv',
            ratedV: 400,
            steps: [{ kvar: 50 }],
            detuningPercent: p,
            reactorQ: 1e5,
            lossWPerKvar: 1e-4,
          },
        ],
        { frequencyHz: hz },
      );
      // Seen through the supply's own small reactance, a series resonance of the bank is a dip of |Z|.
      const span = {
        bus: 'lv',
        sequence: 'positive',
        fromHz: hz * 1.5,
        toHz: hz * 5.5,
        points: 2001,
      } as const;
      const weak = {
        ...study,
        elements: study.elements.map((e) => (e.id === 'grid' ? { ...e, shortCircuitMVA: 1 } : e)),
      } as Study;
      const dip = scanImpedance(weak, 'base', span).resonances.find(({ kind }) => kind === 'series');
      expect((dip?.order ?? 0) * hz).toBeCloseTo(series, 1);
      const solution = solved(study);
      const xc = 400 ** 2 / 50e3;
      expect((amps(solution, 'bank', 1) * xc) / volts(solution, 'lv', 1)).toBeCloseTo(rise, 4);
    },
  );
});
