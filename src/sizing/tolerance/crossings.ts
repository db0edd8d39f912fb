import type { PresentOrders } from '../../checks/index.ts';
import { isSwitch, type Point, ratedPoint } from './Dimension.ts';
import type { PointJudge } from './PointJudge.ts';

/** A tolerance point at which a peak of the impedance stands exactly on a present order. */
export interface Crossing {
  point: Point;
  /** |Z| there, ohms. */
  ohm: number;
}

/** What the susceptance at one busbar does along the axes of the space. */
export interface Slopes {
  /** Change of the susceptance over each whole axis, siemens, by present order and dimension. */
  change: readonly Float64Array[];
  /** The axes that move it at any of the orders, the strongest first. */
  active: readonly number[];
}

/** Corners of the space grow as two to this many axes; the rest moves peaks least and stays rated. */
const MOST_ACTIVE = 5;
/** Axes that move the susceptance less than this share of the strongest do not move the peak. */
const ACTIVE_SHARE = 0.02;

/** How each axis, from the rated point, changes the susceptances; null where there is no impedance. */
export function slopesAt(judge: PointJudge, present: PresentOrders): Slopes | null {
  const { dimensions } = judge;
  const change = present.orders.map(() => new Float64Array(dimensions.length));
  for (const [k, { low, high }] of dimensions.entries()) {
    const below = judge.admittances(moved(ratedPoint(dimensions), k, low), present);
    const above = judge.admittances(moved(ratedPoint(dimensions), k, high), present);
    if (!below || !above) return null;
    change.forEach((axis, order) => {
      axis[k] = above[order]!.susceptance - below[order]!.susceptance;
    });
  }
  return { change, active: activeAxes(change) };
}

function activeAxes(change: readonly Float64Array[]): number[] {
  const share = new Float64Array(change[0]?.length ?? 0);
  for (const axis of change) {
    const strongest = Math.max(...axis.map(Math.abs));
    if (strongest > 0)
      axis.forEach((slope, k) => {
        share[k] = Math.max(share[k]!, Math.abs(slope) / strongest);
      });
  }
  return [...share.keys()]
    .filter((k) => share[k]! > ACTIVE_SHARE)
    .sort((a, b) => share[b]! - share[a]!)
    .slice(0, MOST_ACTIVE);
}

interface Corner {
  point: Point;
  /** By present order; empty where there is no impedance. */
  susceptance: readonly number[];
}

/**
 * Where a peak crosses a present order on the edges of the box spanned by the active axes: the driving-point
 * susceptance changes sign there. The set on which it does is nearly flat (susceptance is close to linear in
 * C and in 1/L), so these are its corners. By present order, largest |Z| first; dips are left out.
 */
export function crossingsAt(judge: PointJudge, present: PresentOrders, { active }: Slopes): Crossing[][] {
  const corners = cornersOf(judge, present, active);
  return present.orders.map((order, o) => {
    const at = { ...present, orders: [order] };
    const found = corners.flatMap((from, bits) =>
      active.flatMap((k, position) => {
        const to = corners[bits | (1 << position)]!;
        if (to === from || isSwitch(judge.dimensions[k]!)) return [];
        const [fa, fb] = [from.susceptance[o] ?? 0, to.susceptance[o] ?? 0];
        return fa * fb < 0
          ? (crossingOnEdge(judge, at, { from: from.point, to: to.point, k, fa, fb }) ?? [])
          : [];
      }),
    );
    const largest = Math.max(0, ...found.map(({ ohm }) => ohm));
    return found.filter(({ ohm }) => ohm > DIP_SHARE * largest).sort((a, b) => b.ohm - a.ohm);
  });
}

/** A zero of the susceptance with less than this share of the largest |Z| is a dip, or far from deciding. */
const DIP_SHARE = 0.3;

function cornersOf(judge: PointJudge, present: PresentOrders, active: readonly number[]): Corner[] {
  return Array.from({ length: 2 ** active.length }, (_, bits) => {
    const point = ratedPoint(judge.dimensions);
    active.forEach((k, position) => {
      const { low, high } = judge.dimensions[k]!;
      point[k] = (bits >> position) & 1 ? high : low;
    });
    const admittances = judge.admittances(point, present) ?? [];
    return { point, susceptance: admittances.map(({ susceptance }) => susceptance) };
  });
}

interface Edge {
  from: Point;
  to: Point;
  k: number;
  fa: number;
  fb: number;
}

/** Root of the susceptance along one axis, by the Illinois form of false position. */
function crossingOnEdge(judge: PointJudge, present: PresentOrders, edge: Edge): Crossing | null {
  const { from, to, k } = edge;
  let [a, fa] = [from[k]!, edge.fa];
  let [b, fb] = [to[k]!, edge.fb];
  const width = Math.abs(b - a);
  let found: Crossing | null = null;
  for (let round = 0; round < 12; round++) {
    const x = (a * fb - b * fa) / (fb - fa);
    const point = moved(from, k, x);
    const admittance = judge.admittances(point, present)?.[0];
    if (!admittance) return null;
    const { conductance, susceptance } = admittance;
    found = { point, ohm: 1 / Math.hypot(conductance, susceptance) };
    if (Math.abs(susceptance) < 0.02 * Math.abs(conductance) || Math.abs(b - a) < 1e-6 * width) break;
    if (susceptance * fb < 0) [a, fa] = [b, fb];
    else fa /= 2;
    [b, fb] = [x, susceptance];
  }
  return found;
}

/** The point with one coordinate set. */
export function moved(point: Point, k: number, value: number): Point {
  const other = point.slice();
  other[k] = value;
  return other;
}
