import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Layout, layoutStudy, textWidth } from '../../src/drawing/index.ts';
import { cloudPath } from '../../src/drawing/marks/cloudPath.ts';
import { drawingSize } from '../../src/drawing/marks/drawingSize.ts';
import { markPoint, markPoints, markSubject, pointOn } from '../../src/drawing/marks/markPlaces.ts';
import { markShape, shapeBetween, WORDS_WIDTH } from '../../src/drawing/marks/markShape.ts';
import { wrappedWords } from '../../src/drawing/marks/wrappedWords.ts';
import { addMark, addPart, marksOf, removeParts, type Study } from '../../src/study/index.ts';
import { anyStudy } from './randomStudy.ts';

const place = fc.record({ x: fc.integer({ min: 0, max: 1500 }), y: fc.integer({ min: 0, max: 900 }) });

/** A study with a mark at a point of its own drawing. */
function marked(study: Study, at: { x: number; y: number }, kind: 'note' | 'arrow' = 'note'): Study {
  const layout = layoutStudy(study);
  const from = markPoint(at, layout);
  const to = markPoint({ x: at.x + 80, y: at.y + 40 }, layout);
  return addMark(study, { kind, text: 'check', from, ...(kind === 'arrow' ? { to } : {}) }).apply(study);
}

describe('a point of a mark', () => {
  it('comes back where it was put, whatever it follows', () => {
    fc.assert(
      fc.property(anyStudy, place, (study, at) => {
        const layout = layoutStudy(study);
        expect(pointOn(markPoint(at, layout), layout)).toEqual(at);
      }),
      { seed: 5, numRuns: 60 },
    );
  });

  it('moves with its part when the layout moves', () => {
    fc.assert(
      fc.property(anyStudy, fc.nat(), (study, pick) => {
        const layout = layoutStudy(study);
        const part = layout.parts[pick % Math.max(1, layout.parts.length)];
        const bus = layout.buses[0];
        if (!part || !bus) return;
        const point = markPoint({ x: part.x, y: part.y }, layout);
        const by = point.by;
        if (by?.kind !== 'element') return;
        const grown = addPart(study, { kind: 'load', bus: bus.id }).apply(study);
        const after = layoutStudy(grown);
        const home = after.parts.find(({ id }) => id === by.id);
        if (!home) return;
        const moved = pointOn(point, after);
        expect([moved.x - home.x, moved.y - home.y]).toEqual([by.dx, by.dy]);
      }),
      { seed: 6, numRuns: 60 },
    );
  });

  it('stays on the paper when its part is removed', () => {
    fc.assert(
      fc.property(anyStudy, place, (study, at) => {
        const with1 = marked(study, at);
        const [mark] = marksOf(with1);
        if (mark?.from.by?.kind !== 'element') return;
        const without = removeParts(with1, [mark.from.by.id]).apply(with1);
        const [left] = marksOf(without);
        expect(left && pointOn(left.from, layoutStudy(without))).toEqual(at);
      }),
      { seed: 7, numRuns: 60 },
    );
  });

  it('far from every part is free on the paper', () => {
    const layout = layoutStudy({
      format: 'varwright-study',
      version: 1,
      title: '',
      frequencyHz: 50,
      buses: [],
      elements: [],
    });
    expect(markPoint({ x: 900, y: 20 }, layout)).toEqual({ x: 900, y: 20 });
    expect(markPoint({ x: -40.4, y: 12.6 }, layout)).toEqual({ x: 0, y: 13 });
  });
});

describe('an area', () => {
  it('follows what stands inside it, not the nearer neighbour outside', () => {
    const layout = {
      width: 400,
      height: 300,
      buses: [],
      parts: ['a', 'b'].map((id, i) => ({ id, x: 100 + 90 * i, y: 100 })),
    } as unknown as Layout;
    const { from, to } = markPoints('cloud', { x: 50, y: 60 }, { x: 160, y: 140 }, layout);
    expect([from.by?.id, to?.by?.id]).toEqual(['a', 'a']);
    const arrow = markPoints('arrow', { x: 50, y: 60 }, { x: 160, y: 140 }, layout);
    expect([arrow.from.by?.id, arrow.to?.by?.id]).toEqual(['a', 'b']);
    expect(markPoints('note', { x: 50, y: 60 }, { x: 160, y: 140 }, layout)).not.toHaveProperty('to');
  });
});

describe('the shape of a mark', () => {
  it('has its words in lines that fit, every word kept and line feeds respected', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme', maxLength: 200 }), (text) => {
        const lines = wrappedWords(text, WORDS_WIDTH);
        expect(lines.join('').replaceAll(/\s/g, '')).toBe(text.replaceAll(/\s/g, ''));
        for (const line of lines)
          if (line.length > 1) expect(textWidth(line)).toBeLessThanOrEqual(WORDS_WIDTH);
      }),
      { seed: 8 },
    );
    expect(wrappedWords('one\n\ntwo', WORDS_WIDTH)).toEqual(['one', '', 'two']);
    expect(wrappedWords(' \n ', WORDS_WIDTH)).toEqual([]);
  });

  it('keeps the words of an arrow off its line, on either side', () => {
    for (const head of [90, -90]) {
      const { wordsBox } = shapeBetween('arrow', 'replace', { x: 200, y: 100 }, { x: 200 + head, y: 100 });
      const right = wordsBox.x + wordsBox.width;
      expect(head > 0 ? right < 200 : wordsBox.x > 200).toBe(true);
    }
  });

  it('is a closed cloud of equal scallops however large the area', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 2000 }), fc.integer({ min: 0, max: 2000 }), (width, height) => {
        const path = cloudPath({ x: 10, y: 20, width, height });
        const steps = [...path.matchAll(/ 0 0 1 (-?[\d.]+),(-?[\d.]+)/g)];
        const dx = steps.reduce((sum, step) => sum + Number(step[1]), 0);
        const dy = steps.reduce((sum, step) => sum + Number(step[2]), 0);
        expect(Math.hypot(dx, dy)).toBeLessThan(0.01 * steps.length + 0.01);
      }),
      { seed: 9 },
    );
  });

  it('beyond the parts makes the drawing larger, on screen and on the sheet', () => {
    fc.assert(
      fc.property(anyStudy, place, (study, at) => {
        const with1 = marked(study, at, 'arrow');
        const layout = layoutStudy(with1);
        const size = drawingSize(with1, layout);
        for (const mark of marksOf(with1)) {
          const { box } = markShape(mark, layout);
          expect(box.x + box.width).toBeLessThan(size.width);
          expect(box.y + box.height).toBeLessThan(size.height);
        }
        expect(size.width).toBeGreaterThanOrEqual(layout.width);
      }),
      { seed: 10, numRuns: 60 },
    );
  });
});

describe('what a mark speaks of', () => {
  it('is the part at its head, and nothing once that is gone', () => {
    const study = { buses: [{ id: 'b' }], elements: [{ id: 'e' }] } as unknown as Study;
    const at = { x: 0, y: 0 };
    const by = (kind: 'bus' | 'element', id: string) => ({ ...at, by: { kind, id, dx: 0, dy: 0 } });
    const arrow = { id: 'a', kind: 'arrow' as const, text: '', from: by('bus', 'b'), to: by('element', 'e') };
    expect(markSubject(arrow, study)).toMatchObject({ kind: 'element', id: 'e' });
    expect(markSubject({ ...arrow, to: by('element', 'gone') }, study)).toMatchObject({
      kind: 'bus',
      id: 'b',
    });
    expect(markSubject({ ...arrow, from: at, to: at }, study)).toBeUndefined();
  });
});
