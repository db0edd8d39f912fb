import { box, type Primitive, path, plates, winding } from './primitives.ts';

/** The elementary shapes in which the two standards differ; composite symbols are built from them. */
export interface Elementary {
  /** A resistance of that height downwards from (x, y). */
  resistor(x: number, y: number, height: number): Primitive;
  /** A capacitor whose upper plate is at y and whose lower plate is met `gap` below it. */
  capacitor(x: number, y: number, half: number, gap: number): Primitive;
  /** A winding of `humps` half circles of radius r downwards from (x, y). */
  winding(x: number, y: number, humps: number, r: number): Primitive;
}

/** IEC 60617: resistance a box, capacitor two straight plates, winding of half circles. */
export const iecElements: Elementary = {
  resistor: (x, y, height) => box(x - Math.min(4, height / 3), y, 2 * Math.min(4, height / 3), height),
  capacitor: plates,
  winding,
};

function zigzag(x: number, y: number, height: number): Primitive {
  const half = Math.min(5, height / 3);
  const step = height / 12;
  const turns = [half, -half, half, -half, half, -half];
  const points = turns.map((dx, at) => `L${x + dx},${(y + step * (2 * at + 1)).toFixed(2)}`);
  return path(`M${x},${y} ${points.join(' ')} L${x},${y + height}`);
}

function curvedPlate(x: number, y: number, half: number, gap: number): Primitive {
  const drop = Math.min(4, half / 3);
  const foot = y + gap;
  return path(
    `M${x - half},${y} h${2 * half} M${x - half},${foot + drop} Q${x},${foot - drop} ${x + half},${foot + drop}`,
  );
}

/** IEEE Std 315: resistance a zigzag, capacitor with one curved plate, winding of half circles. */
export const ieeeElements: Elementary = { resistor: zigzag, capacitor: curvedPlate, winding };
