import { describe, expect, it } from 'vitest';
import { DutyMargins } from '../../../src/checks/index.ts';
import { solveCase } from '../../../src/engine/index.ts';
import { type Dimension, isSwitch, type Point } from '../../../src/sizing/tolerance/Dimension.ts';
import { PointJudge } from '../../../src/sizing/tolerance/PointJudge.ts';
import { searchTolerances } from '../../../src/sizing/tolerance/searchTolerances.ts';
import { studyAtPoint } from '../../../src/sizing/tolerance/studyAtPoint.ts';
import { toleranceSpace } from '../../../src/sizing/tolerance/toleranceSpace.ts';
import type { Study, StudyElement } from '../../../src/study/index.ts';
import { amps, studyOf } from '../../engine/study.ts';
import { benchmarkSite, withDrives } from '../../reference/benchmarkSite.ts';

function search(study: Study, dimensions: readonly Dimension[]) {
  const judge = new PointJudge(study, solveCase(study, 'base'), dimensions);
  return searchTolerances(judge);
}

describe('the worst over tolerances is generally not at a vertex', () => {
  const study = withDrives(benchmarkSite({ tolerancePercent: [-5, 10] }));
  const dimensions = toleranceSpace(study, 'base').filter(({ kind }) => kind === 'capacitance');
  const capacitance = dimensions.map((axis) => ({ ...axis, low: 0.95 }));
  const bankI7 = (c: number): number => {
    const actual = studyAtPoint(study, 'base', capacitance, Float64Array.of(c));
    const solution = solveCase(actual.study, 'base');
    // The benchmark injects 70 A whatever the voltage; a drive of constant power injects a little less at more.
    return (70 * amps(solution, 'bank', 7)) / amps(solution, 'drives', 7);
  };

  it('bank I7 is 543 A and 2211 A at the ends of C −5 … +10 %, 3891 A at C · 1.071 (benchmark B1)', () => {
    // CHECKS, tolerance space: computed twice, independently.
    expect(Math.abs(bankI7(0.95) - 543)).toBeLessThan(1);
    expect(Math.abs(bankI7(1.1) - 2211)).toBeLessThan(2);
    expect(Math.abs(bankI7(1.071) - 3891)).toBeLessThan(2);
  });

  it('and the search finds it there', () => {
    const found = search(study, capacitance);
    const worst = found.worst.find(({ measure }) => measure.key === 'bank-current|bank');
    expect(worst?.point[0]).toBeCloseTo(1.071, 3);
    expect(bankI7(worst?.point[0] ?? 1)).toBeGreaterThan(3890);
    expect(found.unsolved).toEqual([]);
  });
});

/** Numbers from one seed, the same every time. */
function dice(seed: number): (low: number, high: number) => number {
  let state = seed;
  return (low, high) => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return low + ((high - low) * state) / 2 ** 32;
  };
}

/** A board behind one transformer, with a plain or detuned bank, a drive, a load and motors; seven orders. */
function smallSite(seed: number): Study {
  const between = dice(seed);
  const detuned = between(0, 1) > 0.5;
  const elements: StudyElement[] = [
    {
      id: 'grid',
      kind: 'supply',
      bus: 'mv',
      shortCircuitMVA: between(80, 400),
      xOverR: 10,
      background: [{ h: 5, percent: between(0.5, 2) }],
    },
    {
      id: 't1',
      kind: 'transformer',
      from: 'mv',
      to: 'lv',
      ratedKVA: 1000,
      hvV: 20000,
      lvV: 400,
      ukPercent: 6,
      loadLossKW: 9,
      vectorGroup: 'Dyn11',
    },
    {
      id: 'bank',
      kind: 'bank',
      bus: 'lv',
      ratedV: 440,
      steps: [{ kvar: between(200, 520) }],
      ...(detuned ? { detuningPercent: between(5, 14) } : {}),
    },
    { id: 'load', kind: 'load', bus: 'lv', kW: between(50, 350), powerFactor: 0.85 },
    {
      id: 'drive',
      kind: 'converter',
      bus: 'lv',
      kW: between(80, 250),
      powerFactor: 0.95,
      spectrum: 'six-pulse-ideal',
    },
  ];
  return studyOf(
    [
      { id: 'mv', nominalV: 20000 },
      { id: 'lv', nominalV: 400 },
    ],
    elements,
    { maxOrder: 13 },
  );
}

/** Smallest margins of some measures on a grid over the box, each then on ever finer grids around its best point. */
function bruteForce(
  study: Study,
  dimensions: readonly Dimension[],
  keys: readonly string[],
  perAxis: number,
): number[] {
  const duties = new DutyMargins(study, solveCase(study, 'base'));
  const places = keys.map((key) => duties.measures.findIndex((measure) => measure.key === key));
  const best = keys.map(() => ({ margin: Number.POSITIVE_INFINITY, point: new Float64Array(0) }));
  const sweep = (
    box: readonly { low: number; high: number }[],
    n: number,
    wanted: readonly number[],
  ): void => {
    for (let cell = 0; cell < n ** box.length; cell++) {
      const point = Float64Array.from(box, ({ low, high }, axis) => {
        const step = Math.floor(cell / n ** axis) % n;
        return low + ((high - low) * step) / (n - 1);
      });
      const { study: actual, frequencyFactor } = studyAtPoint(study, 'base', dimensions, point);
      duties.read(solveCase(actual, 'base', { frequencyFactor }), actual, frequencyFactor);
      for (const k of wanted) {
        const margin = duties.margins[places[k] ?? -1] ?? Number.NaN;
        if (margin < (best[k]?.margin ?? Number.NaN)) best[k] = { margin, point };
      }
    }
  };
  sweep(dimensions, perAxis, [...keys.keys()]);
  for (const k of keys.keys()) {
    let widths = dimensions.map(({ low, high }) => (high - low) / (perAxis - 1));
    for (let level = 0; level < 4; level++) {
      const centre: Point = best[k]?.point ?? new Float64Array(0);
      const box = dimensions.map(({ low, high }, axis) => ({
        low: Math.max(low, (centre[axis] ?? 1) - (widths[axis] ?? 0)),
        high: Math.min(high, (centre[axis] ?? 1) + (widths[axis] ?? 0)),
      }));
      sweep(box, 7, [k]);
      widths = widths.map((width) => width / 3);
    }
  }
  return best.map(({ margin }) => margin);
}

describe('the search against brute force', () => {
  const searched = ['capacitance', 'transformer-impedance', 'inductance'];
  const twoAxes = (study: Study): Dimension[] =>
    toleranceSpace(study, 'base')
      .filter((axis) => searched.includes(axis.kind) && !isSwitch(axis))
      .slice(0, 2);

  const keys = ['bank-current|bank', 'bus-thd|lv', 'bank-voltage|bank', 'bus-voltage|lv'];

  it.each([1, 2, 3, 4, 5])(
    'finds the worst of a grid of 41 per axis, refined: seed %i',
    (seed) => {
      const study = smallSite(seed);
      const dimensions = twoAxes(study);
      expect(dimensions).toHaveLength(2);
      const found = search(study, dimensions);
      const brute = bruteForce(study, dimensions, keys, 41);
      keys.forEach((key, k) => {
        const worst = found.worst.find(({ measure }) => measure.key === key)?.margin ?? Number.NaN;
        const expected = brute[k] ?? Number.NaN;
        expect(worst, key).toBeLessThan(expected + 0.002 * Math.max(1, Math.abs(expected)));
      });
    },
    60_000,
  );
});
