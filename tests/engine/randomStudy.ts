import fc from 'fast-check';
import type { Bus, Connection, HarmonicRow, Study, StudyElement } from '../../src/study/index.ts';
import { studyOf } from './study.ts';

/** What a generated site may contain. */
export interface SiteOptions {
  /** Three-phase parts only. */
  balanced?: boolean;
  /** No part that draws constant power (constant impedance and passive parts remain). */
  linear?: boolean;
  maxOrder?: number;
  buses?: number;
}

const groups = ['Dyn11', 'Dyn5', 'Dyn1', 'YNyn0', 'YNyn6', 'Dzn0'];
const connections: Connection[] = ['L1L2L3', 'L1', 'L2', 'L3', 'L1L2', 'L2L3', 'L3L1'];

/** Draws numbers from one seed, so that a whole site shrinks to a seed that can be pinned. */
class Dice {
  constructor(private state: number) {}

  unit(): number {
    // Numerical Recipes' linear congruential generator; quality enough to pick parts.
    this.state = (Math.imul(this.state, 1664525) + 1013904223) >>> 0;
    return this.state / 2 ** 32;
  }

  between(low: number, high: number): number {
    return low + (high - low) * this.unit();
  }

  pick<T>(list: readonly T[]): T {
    return list[Math.floor(this.unit() * list.length)] as T;
  }

  chance(p: number): boolean {
    return this.unit() < p;
  }
}

/** A radial site with ties: 11 kV supply, one or two transformers, cables and loads of every kind. */
export function siteFromSeed(seed: number, options: SiteOptions = {}): Study {
  const dice = new Dice(seed);
  const { balanced = false, linear = false, maxOrder = 13 } = options;
  const count = options.buses ?? 3 + Math.floor(dice.between(0, 5));
  const buses: Bus[] = [
    { id: 'b0', nominalV: 11000 },
    { id: 'b1', nominalV: 400 },
  ];
  const elements: StudyElement[] = [supply(dice), ...transformers(dice)];
  for (let k = 2; k < count; k++) {
    buses.push({ id: `b${k}`, nominalV: 400 });
    const from = `b${1 + Math.floor(dice.between(0, k - 1))}`;
    elements.push(link(dice, `k${k}`, from, `b${k}`));
    if (k > 3 && dice.chance(0.4)) elements.push(link(dice, `tie${k}`, `b${k - 2}`, `b${k}`));
  }
  for (let k = 1; k < count; k++) {
    for (let n = 0; n < 2; n++) elements.push(shunt(dice, `p${k}${n}`, `b${k}`, balanced, linear));
  }
  return studyOf(buses, elements, { maxOrder });
}

function rows(dice: Dice): HarmonicRow[] {
  return [2, 3, 5, 7, 9, 11]
    .filter(() => dice.chance(0.6))
    .map((h) => ({
      h,
      percent: dice.between(1, 30),
      angleDeg: dice.between(-180, 180),
    }));
}

function supply(dice: Dice): StudyElement {
  return {
    id: 'grid',
    kind: 'supply',
    bus: 'b0',
    shortCircuitMVA: dice.between(80, 400),
    xOverR: dice.between(3, 15),
    z0OverZ1: dice.between(0.8, 3),
    angleDeg: dice.between(-90, 90),
    background: rows(dice).map((row) => ({ ...row, percent: row.percent / 20 })),
  };
}

function transformers(dice: Dice): StudyElement[] {
  const vectorGroup = dice.pick(groups);
  return Array.from(
    { length: dice.chance(0.4) ? 2 : 1 },
    (_, k): StudyElement => ({
      id: `t${k}`,
      kind: 'transformer',
      from: 'b0',
      to: 'b1',
      ratedKVA: dice.between(600, 1600),
      hvV: 11000,
      lvV: 410,
      ukPercent: dice.between(4, 7),
      loadLossKW: dice.between(5, 12),
      vectorGroup,
      tapPercent: dice.between(-2, 2),
      noLoadLossKW: 1.2,
      noLoadCurrentPercent: dice.chance(0.5) ? 0.8 : 0,
      neutralOhm: /^YN/.test(vectorGroup) ? 0 : dice.chance(0.3) ? 0.01 : 0,
    }),
  );
}

function link(dice: Dice, id: string, from: string, to: string): StudyElement {
  const draw = dice.unit();
  if (draw < 0.1) return { id, kind: 'coupler', from, to };
  if (draw < 0.2)
    return { id, kind: 'reactor', from, to, inductanceMH: dice.between(0.01, 0.05), resistanceOhm: 0.002 };
  if (draw < 0.3)
    return {
      id,
      kind: 'branch',
      from,
      to,
      arrangement: 'parallel',
      resistanceOhm: 0.4,
      inductanceMH: dice.between(0.02, 0.1),
    };
  return {
    id,
    kind: 'cable',
    from,
    to,
    lengthM: dice.between(10, 150),
    resistanceOhmPerKm: dice.between(0.06, 0.3),
    reactanceOhmPerKm: 0.08,
    capacitanceNFPerKm: dice.chance(0.5) ? 450 : 0,
    runs: dice.chance(0.3) ? 2 : 1,
  };
}

function shunt(dice: Dice, id: string, bus: string, balanced: boolean, linear: boolean): StudyElement {
  const draw = dice.unit();
  const connection = balanced || dice.chance(0.5) ? 'L1L2L3' : dice.pick(connections);
  if (draw < 0.35)
    return {
      id,
      kind: 'load',
      bus,
      kW: dice.between(2, 40),
      powerFactor: dice.between(0.7, 1),
      leading: dice.chance(0.2),
      model: linear || dice.chance(0.4) ? 'impedance' : 'power',
      connection,
      neutral: dice.chance(0.6),
    };
  if (draw < 0.5 && !linear)
    return { id, kind: 'motor', bus, ratedKW: dice.between(3, 45), loadPercent: dice.between(30, 100) };
  if (draw < 0.75 && !linear)
    return {
      id,
      kind: 'converter',
      bus,
      kW: dice.between(-20, 50),
      powerFactor: dice.between(0.9, 1),
      wires: dice.chance(0.5) ? 4 : 3,
      connection,
      spectrum: rows(dice),
      ...(connection === 'L1L2L3' && dice.chance(0.3) ? { filterCapacitanceUF: 20 } : {}),
    };
  if (draw < 0.87)
    return {
      id,
      kind: 'bank',
      bus,
      ratedV: 440,
      steps: [{ kvar: dice.between(10, 60) }],
      detuningPercent: dice.pick([0, 5.67, 7, 14]),
      connection: dice.pick(['delta', 'star', 'star-earthed'] as const),
    };
  if (draw < 0.94)
    return {
      id,
      kind: 'filter',
      bus,
      type: dice.pick(['single-tuned', 'high-pass', 'c-type'] as const),
      kvar: dice.between(10, 50),
      tunedOrder: dice.between(2.5, 11),
      qFactor: dice.between(2, 40),
      ratedV: 480,
      connection: dice.pick(['delta', 'star-earthed'] as const),
    };
  return {
    id,
    kind: 'shunt',
    bus,
    arrangement: 'series',
    resistanceOhm: 3,
    capacitanceUF: 30,
    neutral: dice.chance(0.5),
  };
}

/** Seeds of sites, for fast-check. */
export const seeds = fc.integer({ min: 1, max: 2 ** 31 - 1 });
