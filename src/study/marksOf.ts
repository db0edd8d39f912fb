import type { DrawingMark, MarkKind, MarkPoint, Study } from './types.ts';

export const markKinds: readonly MarkKind[] = ['note', 'cloud', 'box', 'arrow'];

/** The marks on the drawing that can be drawn; others, of a later version or a broken hand, stay in the file. */
export function marksOf(study: Study): DrawingMark[] {
  return marksAmong(study.view?.marks ?? []);
}

/** Those of a list that are marks. */
export function marksAmong(list: readonly unknown[]): DrawingMark[] {
  return list.filter(isMark);
}

/** What a mark is called: "the note “check uk”", "a cloud". */
export function markName({ kind, text }: DrawingMark): string {
  const first = text.split('\n')[0]?.trim() ?? '';
  const short = first.length > 28 ? `${first.slice(0, 27).trimEnd()}…` : first;
  return short === '' ? `the ${kind}` : `the ${kind} “${short}”`;
}

function isMark(mark: unknown): mark is DrawingMark {
  if (typeof mark !== 'object' || mark === null) return false;
  const { id, kind, text, from, to } = mark as Partial<Record<keyof DrawingMark, unknown>>;
  if (typeof id !== 'string' || typeof text !== 'string' || !isPoint(from)) return false;
  if (!markKinds.some((one) => one === kind)) return false;
  return kind === 'note' ? to === undefined || isPoint(to) : isPoint(to);
}

function isPoint(point: unknown): point is MarkPoint {
  if (typeof point !== 'object' || point === null) return false;
  const { x, y, by } = point as Partial<Record<keyof MarkPoint, unknown>>;
  return isLength(x) && isLength(y) && (by === undefined || isBy(by));
}

function isBy(by: unknown): boolean {
  if (typeof by !== 'object' || by === null) return false;
  const { kind, id, dx, dy } = by as Record<string, unknown>;
  return (kind === 'element' || kind === 'bus') && typeof id === 'string' && isLength(dx) && isLength(dy);
}

const FARTHEST = 1e6;

function isLength(value: unknown): boolean {
  return typeof value === 'number' && Math.abs(value) <= FARTHEST;
}
