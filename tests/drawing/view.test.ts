import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { placeSlip } from '../../src/drawing/editor/placeSlip.ts';
import { lineWidth } from '../../src/drawing/readings/lineWidth.ts';
import { symbolPaths } from '../../src/drawing/symbols/symbolShape.ts';
import { fitView, toDrawing, zoomAt } from '../../src/drawing/view/paneView.ts';
import { elementKinds } from '../../src/study/index.ts';

const number = (min: number, max: number) => fc.integer({ min, max });

describe('view of the drawing', () => {
  it('keeps what is under the pointer in place while zooming', () => {
    fc.assert(
      fc.property(number(20, 300), number(0, 1000), number(0, 700), (percent, x, y) => {
        const view = { scale: 0.8, x: 31, y: -12 };
        const before = toDrawing(view, { x, y });
        const after = toDrawing(zoomAt(view, percent / 100, { x, y }), { x, y });
        expect(after.x).toBeCloseTo(before.x, 6);
        expect(after.y).toBeCloseTo(before.y, 6);
      }),
      { seed: 31 },
    );
  });

  it('shows the whole drawing when fitted, above 100 % in a large pane alone', () => {
    fc.assert(
      fc.property(number(300, 9000), number(200, 3000), number(600, 2400), (width, height, across) => {
        const pane = { width: across, height: 660 };
        const view = fitView({ width, height }, pane);
        expect(view.scale).toBeLessThanOrEqual(across <= 1200 ? 1 : 1.5);
        expect(view.x).toBeGreaterThanOrEqual(0);
        expect(view.x + width * view.scale).toBeLessThanOrEqual(pane.width);
        expect(view.y + height * view.scale).toBeLessThanOrEqual(pane.height);
      }),
      { seed: 32 },
    );
  });
});

describe('data slip', () => {
  it('never covers its part, moving the drawing aside where no side has room', () => {
    fc.assert(
      fc.property(number(0, 800), number(0, 500), number(20, 260), number(20, 140), (x, y, width, height) => {
        const part = { x, y, width, height };
        const slip = { width: 340, height: 420 };
        const place = placeSlip(part, slip, { width: 1000, height: 660 });
        const moved = { ...part, x: part.x + place.panX };
        const covers =
          place.x < moved.x + width &&
          moved.x < place.x + slip.width &&
          place.y < moved.y + height &&
          moved.y < place.y + slip.height;
        expect(covers).toBe(false);
      }),
      { seed: 33, numRuns: 500 },
    );
  });
});

describe('conductors and symbols', () => {
  it('grows a conductor with its current between 1.5 px and 7 px', () => {
    expect(lineWidth(null, 100)).toBe(1.5);
    expect(lineWidth(0, 0)).toBe(1.5);
    expect(lineWidth(100, 100)).toBe(7);
    expect(lineWidth(1e9, 100)).toBe(7);
    expect(lineWidth(50, 100)).toBeGreaterThan(lineWidth(10, 100));
  });

  it('draws a symbol for every kind, and an earth only at a bank whose star point is earthed', () => {
    for (const kind of elementKinds) expect(symbolPaths(kind).primitives.length).toBeGreaterThan(0);
    const marks = (connection: 'delta' | 'star' | 'star-earthed') =>
      symbolPaths('bank', { id: 'c', kind: 'bank', bus: 'b', steps: [], ratedV: 400, connection }).primitives;
    expect(marks('star-earthed').length).toBeGreaterThan(marks('star').length);
    expect(marks('star')).not.toEqual(marks('delta'));
  });
});
