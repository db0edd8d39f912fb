import { ieeeElements } from './elementary.ts';
import { iecShapes } from './iec60617.ts';
import type { PlainKind } from './PlainKind.ts';
import { box, path, type SymbolShape, shape } from './primitives.ts';

/** Four half circles along a horizontal line, bulging down (1) or up (0). */
function facing(y: number, bulge: 0 | 1): string {
  const hump = ` a4,4 0 0 ${1 - bulge} 8,0`;
  return `M-16,${y}${hump.repeat(4)}`;
}

/**
 * Shapes after IEEE Std 315 of the kinds whose data do not change them, drawn by ourselves from memory of the
 * standard's shapes: a transformer as two facing windings, machines as circles with their letters, a
 * resistive load as a zigzag, a converter as a box around a rectifier.
 */
export const ieeeShapes: Record<PlainKind, SymbolShape> = {
  supply: iecShapes.supply,
  cable: iecShapes.cable,
  generator: shape(
    16,
    32,
    { shape: 'circle', cx: 0, cy: 0, r: 16 },
    { shape: 'letter', x: 0, y: 4.5, text: 'GEN', sizePx: 12 },
  ),
  motor: shape(
    16,
    32,
    { shape: 'circle', cx: 0, cy: 0, r: 16 },
    { shape: 'letter', x: 0, y: 4.5, text: 'MOT', sizePx: 11 },
  ),
  transformer: shape(21.5, 34, path(`M0,-21.5 V-8 ${facing(-8, 1)} ${facing(8, 0)} M0,8 V21.5`)),
  reactor: shape(20, 18, path('M0,-20 V-18'), ieeeElements.winding(0, -18, 3, 6), path('M0,18 V20')),
  converter: shape(15, 30, box(-15, -15, 30, 30), path('M0,-15 V-7 M-7,-7 H7 L0,6 Z M-7,6 H7 M0,6 V15')),
  load: shape(17, 14, ieeeElements.resistor(0, -17, 34)),
};

/** A breaker as a square: closed with the conductor through it, open with a gap in it. */
export function ieeeCoupler(closed: boolean): SymbolShape {
  return shape(
    16,
    20,
    path('M0,-16 V-10 M0,10 V16'),
    box(-10, -10, 20, 20),
    path(closed ? 'M0,-10 V10' : 'M0,-10 V-4.5 M0,4.5 V10'),
  );
}
