import type { DrawingMark, MarkKind } from '../../study/index.ts';
import { type Box, type Layout, measures, type Point, textWidth } from '../layout/index.ts';
import { cloudPath } from './cloudPath.ts';
import { pointOn } from './markPlaces.ts';
import { wrappedWords } from './wrappedWords.ts';

/** A mark ready to draw, in px of the drawing at 100 %. */
export interface MarkShape {
  kind: MarkKind;
  lines: string[];
  /** Left edge and first baseline of the words. */
  words: Point;
  /** Room of the words; without width where there are none. */
  wordsBox: Box;
  /** The outline or the arrow; empty for a note. */
  path: string;
  from: Point;
  to: Point;
  /** All of it. */
  box: Box;
}

export const WORDS_WIDTH = 190;
const LINE = measures.FONT_PX + 3;
const GAP = 8;
/** Left of a note's words: the reviewer's stroke. */
const STROKE = 7;

/** Where the parts of a mark stand on this layout. */
export function markShape(
  mark: Pick<DrawingMark, 'kind' | 'text' | 'from' | 'to'>,
  layout: Layout,
): MarkShape {
  const from = pointOn(mark.from, layout);
  const to = mark.to ? pointOn(mark.to, layout) : from;
  return shapeBetween(mark.kind, mark.text, from, to);
}

/** The same between two points of the drawing, for a mark under the hand. */
export function shapeBetween(kind: MarkKind, text: string, from: Point, to: Point): MarkShape {
  const lines = wrappedWords(text, WORDS_WIDTH);
  const size = {
    width: Math.max(0, ...lines.map((line) => textWidth(line))),
    height: lines.length * LINE,
  };
  const corner = wordsCorner(kind, from, to, size);
  const wordsBox = { ...corner, ...size };
  const words = { x: corner.x, y: corner.y + measures.FONT_PX };
  const drawn = kind === 'note' ? wordsBox : between(from, to);
  return {
    kind,
    lines,
    words,
    wordsBox,
    path: pathOf(kind, from, to),
    from,
    to,
    box: lines.length > 0 ? around(drawn, wordsBox) : drawn,
  };
}

/** Words: at a note's point; over an area; at an arrow's foot, away from its head. */
function wordsCorner(kind: MarkKind, from: Point, to: Point, size: { width: number; height: number }): Point {
  if (kind === 'note') return { x: from.x + STROKE, y: from.y };
  if (kind === 'arrow') {
    const away = to.x >= from.x ? from.x - GAP - size.width : from.x + GAP;
    return { x: away, y: from.y - size.height / 2 };
  }
  const area = between(from, to);
  return { x: area.x + 2, y: area.y - size.height - GAP };
}

function pathOf(kind: MarkKind, from: Point, to: Point): string {
  if (kind === 'note') return '';
  if (kind === 'arrow') return arrowPath(from, to);
  const area = between(from, to);
  if (kind === 'cloud') return cloudPath(area);
  return `M${area.x},${area.y}h${area.width}v${area.height}h${-area.width}Z`;
}

const HEAD = 9;

function arrowPath(from: Point, to: Point): string {
  const angle = Math.atan2(to.y - from.y, to.x - from.x);
  const barb = (turn: number) =>
    `L${round(to.x - HEAD * Math.cos(angle + turn))},${round(to.y - HEAD * Math.sin(angle + turn))}`;
  return `M${from.x},${from.y}L${to.x},${to.y}${barb(0.42)}M${to.x},${to.y}${barb(-0.42)}`;
}

function round(value: number): number {
  return Math.round(value * 100) / 100;
}

export function between(a: Point, b: Point): Box {
  return {
    x: Math.min(a.x, b.x),
    y: Math.min(a.y, b.y),
    width: Math.abs(a.x - b.x),
    height: Math.abs(a.y - b.y),
  };
}

function around(a: Box, b: Box): Box {
  const x = Math.min(a.x, b.x);
  const y = Math.min(a.y, b.y);
  return {
    x,
    y,
    width: Math.max(a.x + a.width, b.x + b.width) - x,
    height: Math.max(a.y + a.height, b.y + b.height) - y,
  };
}
