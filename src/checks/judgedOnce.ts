import { casesOf, isOn, type Study, studyInCase } from '../study/index.ts';
import type { CheckContext } from './CheckContext.ts';

/** Checks of nameplates and settings, said in the first case alone: in another case their absence says nothing. */
export const nameplateChecks: ReadonlySet<string> = new Set([
  'background',
  'controller',
  'discharge',
  'feeder',
  'inrush',
  'reconnection',
  'self-excitation',
]);

const first = new WeakMap<Study, Map<string, string>>();

/**
 * Whether this is the first case in which a part is in service: the case in which its nameplate and settings
 * are judged, which no loading changes, so that a study of many cases says them once.
 */
export function judgedOnce(context: CheckContext, element: string): boolean {
  const known = first.get(context.base) ?? firstCases(context.base);
  first.set(context.base, known);
  return known.get(element) === context.caseId;
}

/** Whether this is the study's first case: the one in which what no case changes is asked for. */
export function isFirstCase({ base, caseId }: CheckContext): boolean {
  return casesOf(base)[0]?.id === caseId;
}

function firstCases(base: Study): Map<string, string> {
  const found = new Map<string, string>();
  for (const { id } of casesOf(base)) {
    for (const part of studyInCase(base, id).elements) {
      if (isOn(part) && !found.has(part.id)) found.set(part.id, id);
    }
  }
  return found;
}
