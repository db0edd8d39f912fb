import type { DrawnItem, StudyElement } from '../../study/index.ts';

type Drawn = ReadonlySet<DrawnItem>;

/** Whether a part's rated amperes are known, so that its current is told as a share of them as well. */
export function hasRatedCurrent(part: StudyElement): boolean {
  return (
    part.kind === 'transformer' ||
    part.kind === 'bank' ||
    (part.kind === 'cable' && part.ratedA !== undefined)
  );
}

/** Kinds read by their reactive power alone, and kinds whose power factor says nothing. */
export const reactiveKinds: ReadonlySet<string> = new Set(['bank', 'filter']);
const plainKinds: ReadonlySet<string> = new Set(['bank', 'filter', 'coupler', 'reactor']);

export function hasPowerFactor(part: StudyElement): boolean {
  return !plainKinds.has(part.kind);
}

/**
 * Cells kept for a part's live readings: the most that any reading mode fills, so that changing the mode or
 * scrubbing the order moves nothing. Words such as "out of service" take one cell's line at least.
 */
export function readingRoom(part: StudyElement, drawn: Drawn): number {
  const rated = hasRatedCurrent(part) ? 1 : 0;
  const reactive = reactiveKinds.has(part.kind);
  const current = drawn.has('current') ? 1 : 0;
  const power = drawn.has('power') ? 1 : 0;
  const factor = drawn.has('powerFactor') && hasPowerFactor(part) ? 1 : 0;
  const fundamental = current * (1 + rated) + power * (reactive ? 1 : 2) + factor;
  const rms = current * (2 + rated) + power + factor;
  const order = current * 2 + power * (reactive ? 0 : 1);
  return Math.max(1, fundamental, rms, order);
}
