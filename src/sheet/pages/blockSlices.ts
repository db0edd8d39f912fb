import type { Block, FigureBlock, FigureRowBlock, SignOffField } from '../document/model.ts';
import type { PageMark } from './marks.ts';
import { textWidth } from './measure.ts';
import { LEADING, TYPE } from './paper.ts';
import type { Slice } from './slice.ts';
import { tableSlices } from './tableSlices.ts';
import { baseline, headingSlices, listSlices, paragraphSlices, termsSlices, textMark } from './textSlices.ts';
import { wrap } from './wrap.ts';

const FIGURE_GAP = 14;
/** How far a wide drawing may reach into the margin on either side, in points. */
const BLEED = 15;

/** What blocks are set into: the width, and the greatest height of a figure. */
export interface Room {
  width: number;
  tallest: number;
}

function figureSlices(block: FigureBlock, { width, tallest }: Room): Slice[] {
  const drawn = (scale: number): { height: number; marks: PageMark[] } => {
    const wanted = Math.min(width + 2 * BLEED, block.widest ?? width) * scale;
    const height = Math.min(wanted * block.aspect, tallest);
    const set = height / block.aspect;
    const x = -Math.max(0, set - width) / 2;
    return { height, marks: [{ kind: 'figure', id: block.id, x, y: 0, width: set, height }] };
  };
  const captions = block.caption === undefined ? [] : paragraphSlices(block.caption, width, true);
  const slice: Slice = { ...drawn(1), glued: captions.length > 0, gap: 4 };
  return [block.tightest === undefined ? slice : { ...slice, tight: drawn(block.tightest) }, ...captions];
}

function figureRowSlice(block: FigureRowBlock, width: number): Slice {
  const height = width * block.aspect;
  const room = width - FIGURE_GAP * (block.figures.length - 1);
  let x = 0;
  const marks = block.figures.map(({ id, share }): PageMark => {
    const mark: PageMark = { kind: 'figure', id, x, y: 0, width: room * share, height };
    x += room * share + FIGURE_GAP;
    return mark;
  });
  return { height, marks, glued: false, gap: 4 };
}

/** A ruled box with "Caution" in front. */
export function cautionSlice(lines: string[], width: number): Slice {
  const size = TYPE.body;
  const indent = 9;
  const x = indent + textWidth('Caution', size, 'semibold') + 10;
  const set = lines.flatMap((line) => wrap(line, width - x - indent, size));
  const height = set.length * size * LEADING + 14;
  const marks: PageMark[] = [
    { kind: 'box', x: 0, y: 0, width, height, stroke: 0.75, ink: 'ink' },
    textMark('Caution', { size, weight: 'semibold', x: indent }, 7 + baseline(size)),
    ...set.map((line, index) => textMark(line, { size, x }, 7 + index * size * LEADING + baseline(size))),
  ];
  return { height, marks, glued: false, gap: 8 };
}

/** A ruled box for each hand: role, name, and room for signature and date. */
function signOffSlice(fields: SignOffField[], width: number): Slice {
  const row = 40;
  const cuts = [0, 0.2, 0.5, 0.8, 1].map((share) => share * width);
  const marks: PageMark[] = fields.flatMap((field, index) => {
    const y = index * row;
    const labels = ['role', 'name', 'signature', 'date'];
    const words = [field.role, field.name, '', ''];
    return cuts.slice(0, -1).flatMap((x, k): PageMark[] => {
      const box: PageMark = {
        kind: 'box',
        x,
        y,
        width: (cuts[k + 1] ?? width) - x,
        height: row,
        stroke: 0.75,
        ink: 'ink',
      };
      const label = textMark(labels[k] ?? '', { size: TYPE.small, ink: 'quiet', x: x + 6 }, y + 11);
      const word = words[k] ?? '';
      const room = box.width - 12;
      const set = wrap(word, room, TYPE.body, 'semibold').slice(0, 2);
      return [
        box,
        label,
        ...set
          .filter((line) => line !== '')
          .map((line, n) =>
            textMark(line, { size: TYPE.body, weight: 'semibold', x: x + 6 }, y + 23 + n * 11),
          ),
      ];
    });
  });
  return { height: fields.length * row, marks, glued: false, gap: 8 };
}

/** A block of the document cut into pieces that pages are filled with. */
export function blockSlices(block: Block, room: Room): Slice[] {
  const { width } = room;
  switch (block.kind) {
    case 'heading':
      return headingSlices(block.text, block.aside, width, false);
    case 'paragraph':
      return paragraphSlices(block.text, width, block.small ?? false).map((slice) =>
        block.leadsOn ? { ...slice, glued: true } : slice,
      );
    case 'list':
      return listSlices(block.items, width);
    case 'terms':
      return termsSlices(block, width);
    case 'table':
      return tableSlices(block, width);
    case 'figure':
      return figureSlices(block, room);
    case 'figureRow':
      return [figureRowSlice(block, width)];
    case 'caution':
      return [cautionSlice(block.lines, width)];
    case 'signOff':
      return [signOffSlice(block.fields, width)];
  }
}
