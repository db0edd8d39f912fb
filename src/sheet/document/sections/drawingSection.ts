import type { Block, DrawingWindow, FigureBlock, PaperName, Section } from '../model.ts';
import { type SheetView, solvedIn } from '../SheetView.ts';
import { shownWords } from './frontSections.ts';

/** Units of the drawing's own margin that the sheet leaves out on each side. */
const CROP = 8;
/** Letter height of the drawing in its own units, and the least it may have on paper, in points. */
const LETTER_UNITS = 12;
const LEAST_LETTER = 7;
/** Points for one unit at most: letters become 9 points. */
const LARGEST_SCALE = 0.75;
/** How far neighbouring pieces of a drawing overlap, in its units. */
const OVERLAP = 60;
/** Room for the drawing on an upright page and on one turned on its side, in points; a little wider than text. */
const UPRIGHT: Record<PaperName, Size> = {
  A4: { width: 540, height: 620 },
  Letter: { width: 556, height: 580 },
};
const TURNED: Record<PaperName, Size> = {
  A4: { width: 786, height: 480 },
  Letter: { width: 736, height: 496 },
};
/** Room a piece leaves for the words under it. */
const CAPTION = 18;

interface Size {
  width: number;
  height: number;
}

const scaleFor = (size: Size, room: Size): number =>
  Math.min(LARGEST_SCALE, room.width / size.width, room.height / size.height);

const readable = (scale: number): boolean => scale * LETTER_UNITS >= LEAST_LETTER;

function figure(
  view: SheetView,
  window: DrawingWindow,
  size: Size,
  scale: number,
  part: string,
): FigureBlock {
  return {
    kind: 'figure',
    id: `drawing${part.replaceAll(' ', '-')}`,
    request: { kind: 'drawing', caseId: view.shown.id, window },
    label: `Single-line diagram, ${view.shown.name}${part}`,
    aspect: size.height / size.width,
    widest: size.width * scale,
  };
}

/** Begin and length of equal overlapping pieces, none longer than `longest`. */
function pieces(whole: number, longest: number): { from: number; length: number }[] {
  const count = Math.max(1, Math.ceil((whole - OVERLAP) / (longest - OVERLAP)));
  const length = (whole + OVERLAP * (count - 1)) / count;
  return Array.from({ length: count }, (_, k) => ({ from: k * (length - OVERLAP), length }));
}

/** A drawing too large for one page with readable letters, cut into overlapping pieces. */
function tiles(view: SheetView, size: Size): Block[] {
  const scale = LEAST_LETTER / LETTER_UNITS;
  const room = TURNED[view.input.paper];
  const across = pieces(size.width, room.width / scale);
  const down = pieces(size.height, (room.height - CAPTION) / scale);
  return down.flatMap((row, r) =>
    across.map((column, c) => {
      const place = [
        ...(across.length > 1 ? [`column ${c + 1} of ${across.length}`] : []),
        ...(down.length > 1 ? [`row ${r + 1} of ${down.length}`] : []),
      ].join(' ');
      const window = {
        x: CROP + column.from,
        y: CROP + row.from,
        width: column.length,
        height: row.length,
      };
      const block = figure(view, window, window, scale, ` ${place}`);
      return { ...block, caption: `${place}; neighbouring pieces overlap` };
    }),
  );
}

/**
 * The single-line diagram of the shown case: on an upright page where its letters stay readable, else on a
 * page turned on its side, else in pieces over several.
 */
export function drawingSection(view: SheetView): Section {
  const solved = solvedIn(view.shown) !== undefined;
  const aside = solved
    ? `${shownWords(view)}; readings at the fundamental`
    : `${view.shown.name}; no readings: the case is not solved`;
  const section = { id: 'drawing', title: 'Single-line diagram', aside };
  const given = view.input.drawingSize;
  if (!given) {
    const block: FigureBlock = {
      ...figure(view, null, { width: 2, height: 1 }, 1, ''),
      widest: UPRIGHT[view.input.paper].width,
    };
    return { ...section, blocks: [block] };
  }
  const size = { width: given.width - 2 * CROP, height: given.height - 2 * CROP };
  const window = { x: CROP, y: CROP, ...size };
  const upright = scaleFor(size, UPRIGHT[view.input.paper]);
  if (readable(upright)) {
    const tightest = Math.max(LEAST_LETTER / (upright * LETTER_UNITS), 0.8);
    return { ...section, blocks: [{ ...figure(view, window, size, upright, ''), tightest }] };
  }
  const turned = scaleFor(size, TURNED[view.input.paper]);
  return {
    ...section,
    landscape: true,
    blocks: readable(turned) ? [figure(view, window, size, turned, '')] : tiles(view, size),
  };
}
