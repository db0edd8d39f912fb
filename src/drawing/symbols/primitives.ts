/** What a symbol is made of, around its centre, px at 100 %. Stroked in the part's ink unless filled. */
export type Primitive =
  | { shape: 'path'; d: string; fill?: 'ink'; weight?: 'bold' }
  | { shape: 'circle'; cx: number; cy: number; r: number; fill?: 'ink' }
  | { shape: 'letter'; x: number; y: number; text: string; sizePx: number };

export interface SymbolShape {
  /** From the centre to each terminal, along the conductor. */
  reach: number;
  width: number;
  primitives: Primitive[];
}

export const path = (d: string): Primitive => ({ shape: 'path', d });

/** A winding of `humps` half circles of radius r, downwards from (x, y). */
export function winding(x: number, y: number, humps: number, r: number): Primitive {
  const hump = ` a${r},${r} 0 0 1 0,${2 * r}`;
  return path(`M${x},${y}${hump.repeat(humps)}`);
}

/** Two plates, the upper at y, `gap` apart. */
export function plates(x: number, y: number, half: number, gap = 6): Primitive {
  return path(`M${x - half},${y} h${2 * half} M${x - half},${y + gap} h${2 * half}`);
}

export function box(x: number, y: number, width: number, height: number): Primitive {
  return path(`M${x},${y} h${width} v${height} h${-width} Z`);
}

/** Three shortening strokes below (x, y). */
export function earth(x: number, y: number): Primitive {
  return path(`M${x - 8},${y} h16 M${x - 5},${y + 3.5} h10 M${x - 2},${y + 7} h4`);
}

export function shape(reach: number, width: number, ...primitives: Primitive[]): SymbolShape {
  return { reach, width, primitives };
}
