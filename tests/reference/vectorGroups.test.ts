import { describe, expect, it } from 'vitest';
import { voltagePhasor } from '../../src/engine/index.ts';
import type { StudyElement } from '../../src/study/index.ts';
import { busIndex, solved, studyOf, volts } from '../engine/study.ts';

function noLoad(vectorGroup: string, more: Partial<StudyElement> = {}): ReturnType<typeof studyOf> {
  const background = Array.from({ length: 18 }, (_, k) => ({ h: k + 2, percent: 1, angleDeg: 17 * k }));
  return studyOf(
    [
      { id: 'hv', nominalV: 20000 },
      { id: 'lv', nominalV: 400 },
    ],
    [
      { id: 'grid', kind: 'supply', bus: 'hv', shortCircuitMVA: 200, xOverR: 10, background },
      {
        id: 't',
        kind: 'transformer',
        from: 'hv',
        to: 'lv',
        ratedKVA: 1000,
        hvV: 20000,
        lvV: 400,
        ukPercent: 6,
        loadLossKW: 8,
        vectorGroup,
        z0OverZ1: 1,
        ...more,
      } as StudyElement,
    ],
    { maxOrder: 19 },
  );
}

/** Degrees by which the low-voltage busbar leads the high-voltage one at order h. */
function leadDegrees(vectorGroup: string, h: number): number {
  const solution = solved(noLoad(vectorGroup));
  const at = (bus: string) => voltagePhasor(solution, busIndex(solution, bus), h, 0);
  return (at('lv').div(at('hv')).arg() * 180) / Math.PI;
}

describe('phase shift of a transformer by order', () => {
  // Clock number times 30° lag of LV in positive sequence, lead in negative: published (IEC 60076-1, second-hand).
  it.each([
    [1, 30],
    [2, -30],
    [4, 30],
    [5, -30],
    [7, 30],
    [11, -30],
    [13, 30],
    [17, -30],
    [19, 30],
  ] as const)('of Dyn11 at order %i: LV leads by %i°', (h, lead) => {
    expect(leadDegrees('Dyn11', h)).toBeCloseTo(lead, 6);
  });

  it('blocks balanced triplen orders in Dyn11', () => {
    const solution = solved(noLoad('Dyn11'));
    expect(volts(solution, 'hv', 3)).toBeGreaterThan(1);
    for (const h of [3, 9, 15]) expect(volts(solution, 'lv', h)).toBeLessThan(1e-9);
  });

  it('lets triplen orders through YNyn0, turned over in YNyn6', () => {
    const straight = solved(noLoad('YNyn0'));
    expect(volts(straight, 'lv', 3) / volts(straight, 'hv', 3)).toBeCloseTo(0.02, 9);
    expect(leadDegrees('YNyn0', 3)).toBeCloseTo(0, 6);
    expect(Math.abs(leadDegrees('YNyn6', 3))).toBeCloseTo(180, 6);
  });

  it.each(['Dyn1', 'Dyn5', 'Dyn7', 'Yd1', 'YNd5', 'Yzn11', 'Dd6', 'Yy0', 'Dzn2'])(
    '%s lags by its clock number at the fundamental',
    (group) => {
      const clock = Number(/\d+$/.exec(group)?.[0]);
      const lag = (((-leadDegrees(group, 1) % 360) + 360) % 360) / 30;
      expect(lag).toBeCloseTo(clock, 6);
    },
  );
});
