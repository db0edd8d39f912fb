import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { HEADER, LETTERS, panelPlaces, RAIL_STRIP } from '../../src/app/panels/panelPlaces.ts';
import { type Panels, readPanels } from '../../src/app/panels/panels.ts';

const windows = [
  { width: 1024, height: 768 },
  { width: 1280, height: 800 },
  { width: 1440, height: 900 },
  { width: 1920, height: 1080 },
  { width: 2560, height: 1440 },
];

function paper(panels: Panels, window: { width: number; height: number }) {
  const { tray, notes, rail } = panelPlaces(panels, window);
  return {
    width: window.width - tray.width - (notes.show === 'open' ? notes.size : LETTERS),
    height: window.height - HEADER - RAIL_STRIP - (rail.show === 'open' ? rail.size : 0),
  };
}

describe('panels round the drawing', () => {
  it('leave the drawing more than half of every usual window', () => {
    for (const window of windows) {
      const { width, height } = paper({}, window);
      expect(width / window.width).toBeGreaterThan(0.6);
      expect(height / window.height).toBeGreaterThan(0.7);
    }
  });

  it('keep room for the drawing whatever was chosen on another screen', () => {
    const chosen = fc.record(
      {
        notes: fc.constantFrom('open' as const, 'letters' as const),
        tray: fc.constantFrom('words' as const, 'symbols' as const),
        rail: fc.constantFrom('open' as const, 'strip' as const),
        notesWidth: fc.integer({ min: 1, max: 9000 }),
        railHeight: fc.integer({ min: 1, max: 9000 }),
      },
      { requiredKeys: [] },
    );
    const size = fc.record({
      width: fc.integer({ min: 720, max: 3840 }),
      height: fc.integer({ min: 450, max: 2160 }),
    });
    fc.assert(
      fc.property(chosen, size, (panels, window) => {
        const { width, height } = paper(panels, window);
        expect(width).toBeGreaterThanOrEqual(340);
        expect(height).toBeGreaterThanOrEqual(200);
      }),
      { seed: 71 },
    );
  });

  it('stand as they were chosen where there is room', () => {
    const window = { width: 1440, height: 900 };
    const { notes, rail, tray } = panelPlaces(
      { notesWidth: 480, railHeight: 260, tray: 'symbols', notes: 'open' },
      window,
    );
    expect(notes.size).toBe(480);
    expect(rail.size).toBe(260);
    expect(tray.show).toBe('symbols');
  });

  it('fold by themselves at 200 % zoom, where notes and rail would leave no drawing', () => {
    const { notes, rail, tray } = panelPlaces({}, { width: 720, height: 450 });
    expect([notes.show, rail.show, tray.show, tray.columns]).toEqual(['letters', 'strip', 'symbols', 2]);
  });

  it('set readings and verdicts side by side on a large screen', () => {
    expect(panelPlaces({}, { width: 2560, height: 1440 }).notes.size).toBeGreaterThanOrEqual(580 + 12);
  });
});

describe('what was kept of the panels', () => {
  it('comes back entry by entry', () => {
    const panels: Panels = {
      tray: 'symbols',
      notes: 'letters',
      notesWidth: 333,
      rail: 'strip',
      paper: 'list',
    };
    expect(readPanels(JSON.stringify(panels))).toEqual(panels);
  });

  it('loses only the entries that cannot be read', () => {
    expect(readPanels('{"tray":"wide","notesWidth":-3,"railHeight":200,"other":1}')).toEqual({
      railHeight: 200,
    });
    for (const text of [null, '', 'null', '[]', '{', '"x"', '7']) expect(readPanels(text)).toEqual({});
  });
});
