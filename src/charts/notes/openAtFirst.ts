import type { Verdict } from '../../checks/index.ts';

const READING_PX = 200;
/** What verdicts keep of the column under the readings. */
const VERDICTS_PX = 220;

/** How many readings begin as cards in a column of a height; the others begin as one line each. */
export function openReadings(columnPx: number): number {
  return Math.max(2, Math.floor((columnPx - VERDICTS_PX) / READING_PX));
}

/** Of so many verdicts the working is shown at first where they have a column of their own. */
const OPEN_BESIDE = 4;

/**
 * Which verdicts begin opened: the first where it fails; in a column of their own, where nothing else would
 * fill it, the first few that fail or want watching.
 */
export function openVerdicts(listed: readonly Verdict[], beside: boolean): string[] {
  const telling = listed.filter(({ verdict }) => verdict === 'fail' || (beside && verdict === 'watch'));
  return telling.slice(0, beside ? OPEN_BESIDE : 1).map(({ key }) => key);
}
