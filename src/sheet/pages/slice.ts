import type { PageMark } from './marks.ts';

/** A piece of a page that is never cut; marks in points from its upper left corner. */
export interface Slice {
  height: number;
  marks: PageMark[];
  /** Stays on one page with the slice after it. */
  glued: boolean;
  /** White space above, dropped at the head of a page. */
  gap?: number;
  /** Repeated above this slice where it begins a page: the head of its table. */
  repeat?: Slice;
  /** The same drawn smaller, where more then fits on the first page. */
  tight?: { height: number; marks: PageMark[] };
  /** The section that begins here. */
  section?: { id: string; title: string };
}
