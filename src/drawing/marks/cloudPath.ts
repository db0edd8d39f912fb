import type { Box } from '../layout/index.ts';

/** Width of one scallop, about. */
const SCALLOP = 18;
const LEAST = 24;

/** A closed revision cloud round a box: equal scallops along each side, bulging outwards. */
export function cloudPath({ x, y, width, height }: Box): string {
  const w = Math.max(LEAST, width);
  const h = Math.max(LEAST, height);
  const across = Math.max(2, Math.round(w / SCALLOP));
  const down = Math.max(2, Math.round(h / SCALLOP));
  const arcs = (count: number, dx: number, dy: number) => {
    const radius = (Math.hypot(dx, dy) * 0.58).toFixed(2);
    return `a${radius},${radius} 0 0 1 ${dx.toFixed(2)},${dy.toFixed(2)}`.repeat(count);
  };
  return [
    `M${x.toFixed(2)},${y.toFixed(2)}`,
    arcs(across, w / across, 0),
    arcs(down, 0, h / down),
    arcs(across, -w / across, 0),
    arcs(down, 0, -h / down),
    'Z',
  ].join('');
}
