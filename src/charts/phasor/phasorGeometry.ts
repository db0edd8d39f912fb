import { magnitude, type Phasor, type ThreePhasors } from './phasorSpectrum.ts';

/** Dash patterns of L1, L2, L3: they tell the phases apart without colour. */
export const PHASE_DASHES = [null, '5 2.5', '1.4 2.2'] as const;

const VOLTAGE_REACH = 0.94;
const CURRENT_REACH = 0.72;

export interface Point {
  x: number;
  y: number;
}

/**
 * Units of figure per volt (or ampere): the longest voltage nearly reaches the circle, the longest current
 * stays visibly shorter, so that the two never hide each other at unity power factor. null when all are zero.
 */
export function phasorScale(
  phasors: ThreePhasors | null,
  radius: number,
  quantity: 'voltage' | 'current',
): number | null {
  const largest = phasors ? Math.max(...phasors.map(magnitude)) : 0;
  if (!(largest > 0)) return null;
  return (radius * (quantity === 'voltage' ? VOLTAGE_REACH : CURRENT_REACH)) / largest;
}

/** Tip of a phasor from the centre, y downwards, turned on by `turn` full turns anticlockwise. */
export function phasorTip(phasor: Phasor, scale: number, turn: number): Point {
  const angle = Math.atan2(phasor.im, phasor.re) + 2 * Math.PI * turn;
  const length = magnitude(phasor) * scale;
  return { x: length * Math.cos(angle), y: -length * Math.sin(angle) };
}

/** Arrow head at the tip, as a closed path; short phasors get a head no longer than themselves. */
export function arrowHead(tip: Point, size: number): string {
  const length = Math.hypot(tip.x, tip.y);
  if (length < 0.5) return '';
  const head = Math.min(size, length);
  const ux = tip.x / length;
  const uy = tip.y / length;
  const bx = tip.x - ux * head;
  const by = tip.y - uy * head;
  const half = head * 0.38;
  const p = (value: number) => value.toFixed(2);
  return `M${p(tip.x)},${p(tip.y)}L${p(bx - uy * half)},${p(by + ux * half)}L${p(bx + uy * half)},${p(by - ux * half)}Z`;
}

/** An open head for currents, so that they are told from voltages without colour. */
export function openArrowHead(tip: Point, size: number): string {
  const length = Math.hypot(tip.x, tip.y);
  if (length < 0.5) return '';
  const head = Math.min(size, length);
  const ux = tip.x / length;
  const uy = tip.y / length;
  const p = (value: number) => value.toFixed(2);
  const half = head * 0.42;
  const bx = tip.x - ux * head;
  const by = tip.y - uy * head;
  return `M${p(bx - uy * half)},${p(by + ux * half)}L${p(tip.x)},${p(tip.y)}L${p(bx + uy * half)},${p(by - ux * half)}`;
}

/** Arc from one phasor's direction to another's, the short way, at a radius. */
export function angleArc(from: Phasor, to: Phasor, radius: number, turn: number): string {
  const start = phasorTip(from, radius / magnitude(from), turn);
  const end = phasorTip(to, radius / magnitude(to), turn);
  const cross = from.re * to.im - from.im * to.re;
  const sweep = cross > 0 ? 0 : 1;
  const p = (value: number) => value.toFixed(2);
  return `M${p(start.x)},${p(start.y)}A${p(radius)},${p(radius)} 0 0 ${sweep} ${p(end.x)},${p(end.y)}`;
}
