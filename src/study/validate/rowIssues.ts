import type { HarmonicRow } from '../types.ts';
import { errorIssue, type Issue, type PathStep, warningIssue } from './issue.ts';

/**
 * Two rows of one order are an error, in the study's own and in inline spectra alike. Rows at h = 1 and
 * above maxOrder take no part in the solution: a warning.
 */
export function rowIssues(
  rows: readonly HarmonicRow[],
  path: readonly PathStep[],
  maxOrder: number,
): Issue[] {
  const seen = new Set<number>();
  return rows.flatMap((row, index): Issue[] => {
    const at = [...path, index, 'h'];
    const found: Issue[] = [];
    if (seen.has(row.h))
      found.push(
        errorIssue(
          'duplicate-order',
          at,
          row.h,
          `order ${row.h} stands in two rows; allowed is one row for each order`,
        ),
      );
    seen.add(row.h);
    if (row.h === 1)
      found.push(
        warningIssue(
          'ignored-row',
          at,
          row.h,
          'the row of order 1 is ignored: the fundamental follows from kW or setpoint',
        ),
      );
    if (row.h > maxOrder)
      found.push(
        warningIssue(
          'ignored-row',
          at,
          row.h,
          `the row of order ${row.h} is ignored: the highest order of the study is ${maxOrder}`,
        ),
      );
    return found;
  });
}
