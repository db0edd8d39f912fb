import { markName, marksAmong, marksOf } from '../marksOf.ts';
import type { DrawingMark, Edit, MarkPoint, Study } from '../types.ts';
import { withView } from './drawnEdits.ts';
import { freshId, makeEdit, sameData } from './edit.ts';

export interface MarkEdit extends Edit {
  markId: string;
}

const drawn = { note: 'write', cloud: 'draw', box: 'draw', arrow: 'draw' } as const;

/** Puts a new mark on the drawing. */
export function addMark(study: Study, mark: Omit<DrawingMark, 'id'>): MarkEdit {
  const id = freshId(marksOf(study), mark.kind);
  const words = `${drawn[mark.kind]} ${markName({ ...mark, id })}`;
  const edit = makeEdit('mark.add', words, (current) => {
    if (marksOf(current).some((other) => other.id === id)) return current;
    return withMarks(current, [...listed(current), { ...mark, id }]);
  });
  return { ...edit, markId: id };
}

/** Gives a mark other words. A note left without any is taken away. */
export function setMarkText(study: Study, id: string, text: string): Edit {
  const mark = marksOf(study).find((one) => one.id === id);
  const empty = mark?.kind === 'note' && text.trim() === '';
  if (empty) return removeMark(study, id);
  return makeEdit('mark.text', `reword ${mark ? markName(mark) : id}`, (current) =>
    withMark(current, id, (one) => (one.text === text ? one : { ...one, text })),
  );
}

/** Moves a mark, or one end or corner of it. */
export function moveMark(study: Study, id: string, places: { from?: MarkPoint; to?: MarkPoint }): Edit {
  const mark = marksOf(study).find((one) => one.id === id);
  return makeEdit('mark.move', `move ${mark ? markName(mark) : id}`, (current) =>
    withMark(current, id, (one) => ({ ...one, ...places })),
  );
}

/** Takes a mark off the drawing. */
export function removeMark(study: Study, id: string): Edit {
  const mark = marksOf(study).find((one) => one.id === id);
  return makeEdit('mark.remove', `remove ${mark ? markName(mark) : id}`, (current) => {
    const gone = marksOf(current).find((one) => one.id === id);
    if (!gone) return current;
    return withMarks(
      current,
      listed(current).filter((one) => one !== gone),
    );
  });
}

/** The marks after parts and busbars are gone: what followed one of them stays where it last stood. */
export function marksLeftBy(
  marks: readonly DrawingMark[],
  elements: ReadonlySet<string>,
  buses: ReadonlySet<string>,
): DrawingMark[] {
  const gone = ({ by }: MarkPoint): boolean =>
    by !== undefined && (by.kind === 'element' ? elements : buses).has(by.id);
  const left = (point: MarkPoint): MarkPoint => (gone(point) ? { x: point.x, y: point.y } : point);
  const known = new Set(marksAmong(marks));
  return marks.map((mark) => {
    if (!known.has(mark)) return mark;
    const from = left(mark.from);
    const to = mark.to && left(mark.to);
    if (from === mark.from && to === mark.to) return mark;
    return { ...mark, from, ...(to ? { to } : {}) };
  });
}

/** Every entry of the list, also those that cannot be drawn. */
function listed(study: Study): DrawingMark[] {
  return study.view?.marks ?? [];
}

function withMarks(study: Study, marks: readonly DrawingMark[]): Study {
  return withView(study, { marks: marks.length > 0 ? marks : undefined });
}

function withMark(study: Study, id: string, change: (mark: DrawingMark) => DrawingMark): Study {
  const before = marksOf(study).find((one) => one.id === id);
  if (!before) return study;
  const after = change(before);
  if (sameData(before, after)) return study;
  return withMarks(
    study,
    listed(study).map((one) => (one === before ? after : one)),
  );
}
