import type { PaperName } from '../document/model.ts';

/** Paper, margins and type sizes in points. Nothing is set smaller than 7 points. */

export interface Paper {
  width: number;
  height: number;
  margin: { left: number; right: number; top: number; bottom: number };
}

const SIZES: Record<PaperName, [width: number, height: number]> = {
  A4: [595.28, 841.89],
  Letter: [612, 792],
};

export function paperOf(name: PaperName): Paper {
  const [width, height] = SIZES[name];
  return { width, height, margin: { left: 42.5, right: 42.5, top: 36, bottom: 36 } };
}

/** The same paper turned on its side. */
export function turned(paper: Paper): Paper {
  return { ...paper, width: paper.height, height: paper.width };
}

export function contentWidth(paper: Paper): number {
  return paper.width - paper.margin.left - paper.margin.right;
}

export const TYPE = {
  title: 14,
  section: 10.5,
  heading: 9,
  body: 8.5,
  table: 7.8,
  small: 7.2,
} as const;

/** Distance of baselines over type size. */
export const LEADING = 1.38;
