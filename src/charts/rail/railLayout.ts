import type { Box } from '../figure/box.ts';

/** The rail's places in figure units: the landscape above the axis, two rows of axis words under it. */
export interface RailLayout {
  width: number;
  height: number;
  left: number;
  right: number;
  /** Top edge of what may be drawn on. */
  top: number;
  /** Topmost and lowest y of the curves. */
  curveTop: number;
  curveBottom: number;
  axisY: number;
  orderBaseline: number;
  hzBaseline: number;
  /** Where flags and the handle's words may stand. */
  words: Box;
}

/** Places for a rail of a size; `smallSize` is the height of the axis letters. */
export function railLayout(width: number, height: number, smallSize: number): RailLayout {
  const side = Math.max(44, smallSize * 4.6);
  const axisY = height - smallSize * 2.9;
  return {
    width,
    height,
    left: side,
    right: width - smallSize * 2,
    top: 2,
    curveTop: 2 + smallSize * 1.3,
    curveBottom: axisY - smallSize * 1.2,
    axisY,
    orderBaseline: axisY + smallSize * 1.35,
    hzBaseline: axisY + smallSize * 2.5,
    words: { x: side, y: 1, width: width - side - 4, height: axisY - 6 },
  };
}
