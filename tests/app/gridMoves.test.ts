import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { boxOf, type GridPlace, inBox, movedBy, tabbed } from '../../src/app/table/gridMoves.ts';

const size = { rows: 5, columns: 4, page: 3 };

describe('In a table', () => {
  const moves: [string, boolean, GridPlace, GridPlace][] = [
    ['ArrowDown', false, { row: 0, column: 1 }, { row: 1, column: 1 }],
    ['ArrowUp', false, { row: 0, column: 1 }, { row: -1, column: 1 }],
    ['ArrowUp', true, { row: 4, column: 1 }, { row: 0, column: 1 }],
    ['ArrowRight', false, { row: 2, column: 3 }, { row: 2, column: 3 }],
    ['Home', false, { row: 2, column: 3 }, { row: 2, column: 0 }],
    ['End', true, { row: 0, column: 0 }, { row: 4, column: 3 }],
    ['PageDown', false, { row: 1, column: 2 }, { row: 4, column: 2 }],
    ['PageUp', false, { row: 1, column: 2 }, { row: 0, column: 2 }],
  ];
  it.each(moves)('%s (to the edge: %s) leads from %j to %j', (key, far, from, to) => {
    expect(movedBy(key, from, size, far)).toEqual(to);
  });

  it('other keys move nothing', () => {
    expect(movedBy('a', { row: 0, column: 0 }, size, false)).toBeNull();
  });

  it('Tab goes along the rows and leaves past either end', () => {
    expect(tabbed({ row: 0, column: 3 }, size, false)).toEqual({ row: 1, column: 0 });
    expect(tabbed({ row: 1, column: 0 }, size, true)).toEqual({ row: 0, column: 3 });
    expect(tabbed({ row: 4, column: 3 }, size, false)).toBeNull();
    expect(tabbed({ row: 0, column: 0 }, size, true)).toBeNull();
  });

  it('no key ever leads outside, and the cell with the keyboard is always marked', () => {
    const keys = fc.constantFrom(
      'ArrowUp',
      'ArrowDown',
      'ArrowLeft',
      'ArrowRight',
      'Home',
      'End',
      'PageUp',
      'PageDown',
    );
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 9 }),
        fc.integer({ min: 1, max: 9 }),
        fc.array(fc.tuple(keys, fc.boolean(), fc.boolean()), { maxLength: 30 }),
        (rows, columns, presses) => {
          let anchor: GridPlace = { row: 0, column: 0 };
          let focus = anchor;
          for (const [key, far, marking] of presses) {
            focus = movedBy(key, focus, { rows, columns, page: 3 }, far) ?? focus;
            if (!marking) anchor = focus;
            expect(focus.row).toBeGreaterThanOrEqual(-1);
            expect(focus.row).toBeLessThan(Math.max(1, rows));
            expect(focus.column).toBeGreaterThanOrEqual(0);
            expect(focus.column).toBeLessThan(columns);
            if (focus.row >= 0) expect(inBox(boxOf({ anchor, focus }), focus.row, focus.column)).toBe(true);
          }
        },
      ),
      { seed: 21 },
    );
  });
});
