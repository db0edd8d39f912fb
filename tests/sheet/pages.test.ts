import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { buildDocument, type SheetDocument, type TableBlock } from '../../src/sheet/document/index.ts';
import { layoutPages } from '../../src/sheet/pages/layoutPages.ts';
import type { SheetPage, TextMark } from '../../src/sheet/pages/marks.ts';
import { faceRuns, textWidth } from '../../src/sheet/pages/measure.ts';
import { paginate } from '../../src/sheet/pages/paginate.ts';
import type { Slice } from '../../src/sheet/pages/slice.ts';
import { wrap } from '../../src/sheet/pages/wrap.ts';
import { inputOf, quarry, verdict } from './sampleInput.ts';

const document = buildDocument(
  inputOf(quarry, [
    verdict({ check: 'bank-current', caseId: 'day' }),
    verdict({ check: 'bank-voltage', caseId: 'night', verdict: 'fail', margin: -0.2, value: 1.4 }),
  ]),
);

const textsOf = (pages: SheetPage[]): TextMark[] =>
  pages.flatMap(({ marks }) => marks.filter((mark) => mark.kind === 'text'));

const withTable = (rows: number): SheetDocument => {
  const table: TableBlock = {
    kind: 'table',
    columns: [
      { head: 'busbar head', align: 'left' },
      { head: 'volts head', unit: 'V', align: 'decimal' },
    ],
    rows: Array.from({ length: rows }, (_, k) => ({
      kind: 'cells',
      cells: [{ text: `row ${k}.` }, { text: (k * 1.25).toFixed(k % 3) }],
    })),
    notes: [],
  };
  return { ...document, sections: [{ id: 'long', title: 'Long', blocks: [table] }] };
};

describe('pages of the sheet', () => {
  for (const paper of ['A4', 'Letter'] as const) {
    const pages = layoutPages({ ...document, paper });

    it(`keep every mark inside the margins on ${paper}`, () => {
      for (const page of pages) {
        for (const mark of textsOf([page])) {
          expect(mark.x).toBeGreaterThanOrEqual(42.4);
          expect(mark.x + textWidth(mark.text, mark.size, mark.weight)).toBeLessThanOrEqual(page.width - 42);
          expect(mark.y).toBeGreaterThan(30);
          expect(mark.y).toBeLessThan(page.height - 30);
        }
      }
    });

    it(`set nothing under 7 points on ${paper}`, () => {
      for (const mark of textsOf(pages)) {
        for (const run of faceRuns(mark.text, mark.size, mark.weight))
          expect(run.size).toBeGreaterThanOrEqual(7);
      }
    });

    it(`never set two texts over one another on ${paper}`, () => {
      for (const { marks } of pages) {
        const texts = marks.filter((mark) => mark.kind === 'text');
        const boxes = texts.map((mark) => ({
          left: mark.x,
          right: mark.x + textWidth(mark.text, mark.size, mark.weight),
          top: mark.y - mark.size * 0.7,
          bottom: mark.y + mark.size * 0.1,
          text: mark.text,
        }));
        boxes.forEach((a, i) => {
          const hit = boxes
            .slice(i + 1)
            .find(
              (b) =>
                a.left < b.right - 0.1 &&
                b.left < a.right - 0.1 &&
                a.top < b.bottom - 0.1 &&
                b.top < a.bottom - 0.1,
            );
          expect(hit && `${a.text} over ${hit.text}`).toBeUndefined();
        });
      }
    });
  }

  it('carry title, revision and page n of m on each page', () => {
    const pages = layoutPages(document);
    expect(pages.length).toBeGreaterThan(3);
    pages.forEach(({ marks, number }) => {
      const text = marks.flatMap((mark) => (mark.kind === 'text' ? [mark.text] : [])).join('\n');
      expect(text).toContain(`${number} of ${pages.length}`);
      expect(text).toContain('Quarry crusher line');
      expect(text).toContain('revision B');
      expect(text).toContain('study 0123-4567');
    });
  });

  it('hold every word of the tables', () => {
    const set = textsOf(layoutPages(document))
      .map(({ text }) => text)
      .join(' ');
    const words = document.sections
      .flatMap(({ blocks }) => blocks.filter((block) => block.kind === 'table'))
      .flatMap(({ rows }) =>
        rows.flatMap((row) => (row.kind === 'cells' ? row.cells.map(({ text }) => text) : [row.text])),
      )
      .flatMap((text) => text.split(' '));
    for (const word of words) expect(set).toContain(word);
  });

  it('are the same for the same document', () => {
    expect(JSON.stringify(layoutPages(document))).toBe(JSON.stringify(layoutPages(document)));
  });

  it('repeat the heads of a table wherever it goes on, and leave no row alone', () => {
    for (const rows of [1, 2, 28, 29, 30, 31, 32, 33, 60, 95, 96, 97, 150]) {
      const pages = layoutPages(withTable(rows));
      const counts = pages.map(({ marks }) => {
        const texts = marks.flatMap((mark) => (mark.kind === 'text' ? [mark.text] : []));
        const own = texts.filter((text) => /^row \d+\.$/.test(text)).length;
        expect(texts.filter((text) => text === 'busbar head')).toHaveLength(own > 0 ? 1 : 0);
        return own;
      });
      expect(counts.reduce((sum, count) => sum + count, 0)).toBe(rows);
      if (rows > 1) expect(Math.min(...counts.filter((count) => count > 0))).toBeGreaterThan(1);
    }
  });

  it('line the numbers of a column up at their decimal points', () => {
    const rows = textsOf(layoutPages(withTable(30))).filter(({ text }) => /^\d+(\.\d+)?$/.test(text));
    const points = rows.map(({ text, x, size }) => x + textWidth(text.split('.')[0] ?? '', size));
    expect(rows.length).toBeGreaterThan(25);
    for (const point of points) expect(point).toBeCloseTo(points[0] ?? 0, 6);
  });
});

describe('the single-line diagram on paper', () => {
  const input = inputOf(quarry, []);
  const drawn = (width: number, height: number) => {
    const sheet = buildDocument({ ...input, drawingSize: { width, height } });
    return layoutPages(sheet).flatMap((page) =>
      page.marks.flatMap((mark) =>
        mark.kind === 'figure' && mark.id.startsWith('drawing') ? [{ page, mark }] : [],
      ),
    );
  };

  it('stands on the first page, upright, where it fits', () => {
    const [only, ...more] = drawn(700, 400);
    expect(more).toEqual([]);
    expect(only?.page.number).toBe(1);
  });

  it('stands on a page turned on its side where its letters would be too small upright', () => {
    const [only, ...more] = drawn(1250, 700);
    expect(more).toEqual([]);
    expect(only && only.page.width > only.page.height).toBe(true);
  });

  it('is cut into overlapping pieces that keep its letters at 7 points', () => {
    const pieces = drawn(4000, 1000);
    expect(pieces.length).toBeGreaterThan(3);
    for (const { page, mark } of pieces) {
      expect(page.width).toBeGreaterThan(page.height);
      expect(mark.x).toBeGreaterThan(20);
      expect(mark.x + mark.width).toBeLessThan(page.width - 20);
      expect(mark.y + mark.height).toBeLessThan(page.height - 30);
    }
  });

  it('never has letters under 7 points', () => {
    for (const [width, height] of [
      [700, 400],
      [936, 882],
      [1250, 700],
      [4000, 1000],
      [600, 3000],
    ] as const) {
      const area = drawn(width, height).reduce((sum, { mark }) => sum + mark.width * mark.height, 0);
      expect(area).toBeGreaterThanOrEqual((7 / 12) ** 2 * (width - 32) * (height - 32) * 0.999);
    }
  });
});

describe('filling pages', () => {
  const slice = fc.record({
    height: fc.double({ min: 1, max: 60, noNaN: true }),
    glued: fc.boolean(),
    gap: fc.double({ min: 0, max: 10, noNaN: true }),
  });

  it('puts every slice once, in order, inside its page', () => {
    fc.assert(
      fc.property(fc.array(slice, { maxLength: 40 }), (items) => {
        const slices: Slice[] = items.map((item) => ({ ...item, marks: [] }));
        const pages = paginate(slices, () => 100);
        expect(pages.flat().map(({ slice: placed }) => placed)).toEqual(slices);
        for (const page of pages) {
          let end = 0;
          for (const { slice: placed, y } of page) {
            expect(y).toBeGreaterThanOrEqual(end - 1e-9);
            end = y + placed.height;
            expect(end).toBeLessThanOrEqual(100.02);
          }
        }
      }),
      { seed: 20_261_201, numRuns: 300 },
    );
  });
});

describe('lines of text', () => {
  it('are no wider than their column and lose no letter', () => {
    fc.assert(
      fc.property(
        fc.string({ maxLength: 120 }),
        fc.double({ min: 20, max: 200, noNaN: true }),
        (text, width) => {
          const clean = text.replaceAll(/\s+/g, ' ').trim();
          const lines = wrap(clean, width, 8);
          expect(lines.join('').replaceAll(' ', '')).toBe(clean.replaceAll(' ', ''));
          for (const line of lines) {
            if ([...line].length > 1) expect(textWidth(line, 8)).toBeLessThanOrEqual(width + 1e-6);
          }
        },
      ),
      { seed: 20_261_202, numRuns: 300 },
    );
  });

  it('set a subscript lowered and leave names with underscores alone', () => {
    expect(faceRuns('I_rms 5', 8, 'regular').map(({ text, drop }) => [text, drop > 0])).toEqual([
      ['I', false],
      ['rms', true],
      [' 5', false],
    ]);
    expect(faceRuns('pump_house_2', 8, 'regular')).toHaveLength(1);
  });

  it('take the marks the text family lacks from the second family', () => {
    const faces = faceRuns('12 ∠ 30° ∥', 8, 'regular').map(({ face }) => face);
    expect(faces).toContain('varwright-marks');
    const trade = 'φ Ω ∠ ° µ √ ≤ ≥ Δ ² · × − ₀ ∥ ✓ ✕ α β γ θ π Σ … – • ³ ⁴';
    expect(
      faceRuns(trade, 8, 'regular')
        .map(({ text }) => text)
        .join(''),
    ).toBe(trade);
  });
});
