import type { Layout, Point } from '../layout/index.ts';
import { partsAlong } from './busAt.ts';

export interface Insertion {
  /** Where the first of them would touch the bar, drawing px. */
  mark?: Point;
  /** Order along the bar with them put in; absent where they fall at the end anyway. */
  order?: string[];
}

const END_PITCH = 40;
const INSET = 6;

/** Puts parts along a busbar at a place, x in drawing px; without one they go to the end. */
export function insertionAt(
  layout: Layout,
  bus: string,
  ids: readonly string[],
  x: number | undefined,
): Insertion {
  if (x === undefined) return {};
  const others = partsAlong(layout, bus).filter((part) => !ids.includes(part.id));
  const at = others.filter((part) => part.x < x).length;
  const bar = layout.buses.find((place) => place.id === bus);
  const [before, after] = [others[at - 1]?.x, others[at]?.x];
  const markX =
    before !== undefined && after !== undefined
      ? (before + after) / 2
      : before !== undefined
        ? before + END_PITCH
        : after !== undefined
          ? Math.max((bar?.x1 ?? 0) + INSET, after - END_PITCH)
          : Math.min(Math.max(x, bar?.x1 ?? x), bar?.x2 ?? x);
  const mark = { x: markX, y: bar?.y ?? 0 };
  if (at === others.length) return { mark };
  return { mark, order: others.map((part) => part.id).toSpliced(at, 0, ...ids) };
}

/** Puts parts right after another one; at the end where that one is last, or does not stand along the bar. */
export function insertionAfter(
  layout: Layout,
  bus: string,
  ids: readonly string[],
  after: string | undefined,
): Insertion {
  const others = partsAlong(layout, bus)
    .map((part) => part.id)
    .filter((id) => !ids.includes(id));
  const at = after === undefined ? -1 : others.indexOf(after);
  return at < 0 || at === others.length - 1 ? {} : { order: others.toSpliced(at + 1, 0, ...ids) };
}
